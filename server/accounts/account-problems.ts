import type { PostingLimit } from '../http/caller.js';
import { termInWords } from '../http/term-words.js';
import { ProblemError } from '../http/problems.js';

export class SignInRefused extends ProblemError {
  constructor() {
    super(
      'sign-in-refused',
      401,
      'E-mail address and password do not match.',
      'Check both, or have a link mailed to set a new password.',
    );
  }
}

export class EmailNotConfirmed extends ProblemError {
  constructor() {
    super(
      'email-not-confirmed',
      403,
      'The e-mail address is not confirmed yet.',
      'Follow the link in the mail, or have it sent again.',
    );
  }
}

/** The desk has blocked the account for a term. */
export class AccountBlocked extends ProblemError {
  constructor({ reason, until }: PostingLimit) {
    super(
      'account-blocked',
      403,
      `This account is blocked ${termInWords(until)}. The desk’s reason: ${reason}`,
      'Answer the mail that told you of it if you think this is wrong.',
    );
  }
}

export class TokenNotValid extends ProblemError {
  constructor() {
    super(
      'token-not-valid',
      422,
      'The link is used up, expired or not complete.',
      'Have a new link mailed and use it within its time.',
    );
  }
}
