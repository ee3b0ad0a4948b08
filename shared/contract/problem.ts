import { z } from 'zod';

/** One field that cannot be taken as it is, and what to do about it. */
export const FieldProblem = z.object({
  /** Path in the body or query, such as `fixes.0.title`. */
  path: z.string(),
  message: z.string(),
  remedy: z.string().optional(),
});
export type FieldProblem = z.infer<typeof FieldProblem>;

/** Problem document by RFC 9457. */
export const Problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  /** What the caller can do next. */
  remedy: z.string().optional(),
  requestId: z.string().optional(),
  fields: z.array(FieldProblem).optional(),
  /**
   * For `edition-moved-on`: what stands there now and the top-level fields that differ. With 412 it is the draft, saved from
   * elsewhere; with 409 the edition that was published in the meantime, and `base` the one the draft began from.
   */
  current: z.unknown().optional(),
  base: z.unknown().optional(),
  changed: z.array(z.string()).optional(),
  /** For `withdrawn`: the notice that stands at the address, as `WithdrawalNotice` has it. */
  withdrawal: z.unknown().optional(),
});
export type Problem = z.infer<typeof Problem>;

/** Problem types; the `type` member is `/problems/<key>`. */
export const problemTypes = {
  'not-valid': 'The request has fields that cannot be taken as they are',
  'not-json': 'The body is not readable JSON',
  'body-too-large': 'The body is too large',
  'media-type-not-taken': 'The content type is not taken here',
  'not-signed-in': 'This needs an account',
  'not-allowed': 'Your role does not cover this',
  'not-found': 'There is nothing at this address',
  'sign-in-refused': 'E-mail address and password do not match',
  'email-not-confirmed': 'The e-mail address is not confirmed yet',
  'token-not-valid': 'The link is used up, expired or not complete',
  'csrf-token-missing': 'The request did not come from a page of this site',
  'too-many-requests': 'Too many tries in a short time',
  'precondition-needed': 'The version that was read must be named',
  'edition-moved-on': 'The text has moved on since it was read',
  'edition-state': 'The edition is not in a state for this',
  'not-complete': 'The write-up is not complete yet',
  'caution-missing': 'A hazard has no caution yet',
  'photo-refused': 'The photo cannot be taken',
  'already-there': 'That is there already',
  withdrawn: 'The desk has withdrawn this write-up',
  'moved-on': 'Somebody saved this in the meantime',
  'posting-limited': 'You may read, but not post, for now',
  'account-blocked': 'This account is blocked',
  'taken-down': 'The desk has taken this down',
  'claimed-by-another': 'Somebody else at the desk has this in hand',
  'search-unavailable': 'Search does not answer at the moment',
  internal: 'Something went wrong on our side',
} as const;
export type ProblemType = keyof typeof problemTypes;
