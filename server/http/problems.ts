import type { PostingLimit } from './caller.js';
import { termInWords } from './term-words.js';
import {
  problemTypes,
  type FieldProblem,
  type Problem,
  type ProblemType,
} from '../../shared/contract/problem.js';

/** An error that knows how it is told to the caller (RFC 9457). */
export class ProblemError extends Error {
  constructor(
    readonly type: ProblemType,
    readonly status: number,
    readonly detail: string,
    readonly remedy?: string,
    readonly extras: Partial<Pick<Problem, 'fields' | 'current' | 'base' | 'changed' | 'withdrawal'>> & {
      retryAfterSeconds?: number;
    } = {},
  ) {
    super(detail);
    this.name = new.target.name;
  }

  toProblem(requestId: string): Problem {
    const { retryAfterSeconds: _, ...members } = this.extras;
    return {
      type: `/problems/${this.type}`,
      title: problemTypes[this.type],
      status: this.status,
      detail: this.detail,
      ...(this.remedy === undefined ? {} : { remedy: this.remedy }),
      requestId,
      ...members,
    };
  }
}

export class NotValid extends ProblemError {
  constructor(fields: FieldProblem[], detail = 'Some fields cannot be taken as they are.') {
    super('not-valid', 422, detail, 'Mend the fields named and send it again.', { fields });
  }
}

/** One field that points at something that is not there or does not belong. */
export class FieldNotValid extends NotValid {
  constructor(path: string, message: string, remedy?: string) {
    super([{ path, message, ...(remedy === undefined ? {} : { remedy }) }]);
  }
}

export class NotFound extends ProblemError {
  /** `fields`: what in the address cannot name anything. */
  constructor(
    what = 'There is nothing at this address.',
    remedy = 'Check the address, or search for it.',
    fields?: FieldProblem[],
  ) {
    super('not-found', 404, what, remedy, fields ? { fields } : {});
  }
}

export class NotSignedIn extends ProblemError {
  constructor() {
    super('not-signed-in', 401, 'This needs an account.', 'Sign in and try again.');
  }
}

export class NotAllowed extends ProblemError {
  constructor(detail = 'Your role does not cover this.', remedy = 'Ask somebody whose role covers it.') {
    super('not-allowed', 403, detail, remedy);
  }
}

/** The desk has limited the account: it reads, but does not post. */
export class PostingLimited extends ProblemError {
  constructor(limit: PostingLimit) {
    super(
      'posting-limited',
      403,
      `You may read, but not post, ${termInWords(limit.until)}. The desk’s reason: ${limit.reason}`,
      'Your account page says what holds. Your bench, your watches and what you wrote stay yours.',
    );
  }
}

/** What the desk has taken down is gone for readers, and they are told why. */
export class TakenDownByDesk extends ProblemError {
  constructor(what: string, reason: string | null) {
    super(
      'taken-down',
      410,
      reason === null
        ? `${what} was taken down by the desk.`
        : `${what} was taken down by the desk: ${reason}`,
      'Look for another one.',
    );
  }
}

export class AlreadyThere extends ProblemError {
  constructor(detail: string, remedy?: string) {
    super('already-there', 409, detail, remedy);
  }
}

export class TooManyRequests extends ProblemError {
  constructor(retryAfterSeconds: number) {
    super(
      'too-many-requests',
      429,
      'That was tried too often in a short time.',
      `Wait ${retryAfterSeconds} seconds and try again.`,
      {
        retryAfterSeconds,
      },
    );
  }
}
