import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { TooManyRequests } from './problems.js';

/** How often something may be tried: `points` times within `duration` seconds for one key. */
const limits = {
  /** Failed sign-ins for one address from one network address. */
  'sign-in': { points: 10, duration: 15 * 60 },
  /** Failed sign-ins from one network address, whatever the account. */
  'sign-in-anywhere': { points: 100, duration: 15 * 60 },
  'sign-up': { points: 30, duration: 60 * 60 },
  /** Mails that strangers can have sent to one address. */
  'account-mail': { points: 5, duration: 60 * 60 },
  /** Mailed tokens tried from one network address. */
  token: { points: 60, duration: 15 * 60 },
  /** Photos stored by one account. */
  photo: { points: 120, duration: 60 * 60 },
  /** Readings recorded by one account. */
  measurement: { points: 300, duration: 60 * 60 },
  /** Proposals for the catalogue by one account. */
  proposal: { points: 30, duration: 60 * 60 },
  /** Questions asked by one account. */
  question: { points: 20, duration: 60 * 60 },
  /** Things of which one account tells the desk. */
  flag: { points: 20, duration: 60 * 60 },
  /** Archives of one account's own data. */
  export: { points: 10, duration: 60 * 60 },
  /** Deletions asked for by one account: each tries a password. */
  deletion: { points: 10, duration: 60 * 60 },
  /** Requests to speak for a maker by one account. */
  'maker-request': { points: 10, duration: 60 * 60 },
  /** Answers and announcements in the name of makers by one account. */
  'maker-word': { points: 60, duration: 60 * 60 },
  /** Replies to questions by one account. */
  reply: { points: 60, duration: 60 * 60 },
} as const;
export type LimitName = keyof typeof limits;

export interface RateLimits {
  /** Counts one try. Throws TooManyRequests with the wait in seconds when there were too many. */
  take(name: LimitName, ...key: string[]): Promise<void>;
  /** Takes one try back, such as a sign-in that succeeded. */
  giveBack(name: LimitName, ...key: string[]): Promise<void>;
}

/** Limits counted in this process; two processes behind one balancer would each grant the full count. */
export function createRateLimits(): RateLimits {
  const limiters = new Map(
    Object.entries(limits).map(([name, limit]) => [
      name,
      new RateLimiterMemory({ keyPrefix: name, ...limit }),
    ]),
  );
  const keyOf = (key: readonly string[]): string => key.join('|').toLowerCase();
  return {
    async take(name, ...key) {
      try {
        await limiters.get(name)?.consume(keyOf(key));
      } catch (refusal) {
        if (!(refusal instanceof RateLimiterRes)) throw refusal;
        throw new TooManyRequests(Math.max(1, Math.ceil(refusal.msBeforeNext / 1000)));
      }
    },
    async giveBack(name, ...key) {
      await limiters.get(name)?.reward(keyOf(key));
    },
  };
}

export const noRateLimits: RateLimits = {
  take: () => Promise.resolve(),
  giveBack: () => Promise.resolve(),
};
