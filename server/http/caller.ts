import type { Role } from '../../shared/contract/vocabulary.js';

/** Who makes the request. */
export type Caller = { readonly role: 'visitor'; readonly accountId: null } | MemberCaller;

export interface MemberCaller {
  readonly role: Exclude<Role, 'visitor'>;
  readonly accountId: number;
  /** What the desk has set on the account; blocked ones are visitors. */
  readonly limit?: PostingLimit | null;
}

/** Reading goes on; posting does not. */
export interface PostingLimit {
  readonly reason: string;
  /** It holds before this instant; null: until it is lifted. */
  readonly until: Date | null;
}

export const visitor: Caller = { role: 'visitor', accountId: null };

export function isModerator(caller: Caller): boolean {
  return caller.role === 'moderator' || caller.role === 'administrator';
}
