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
