import { z } from 'zod';
import { Id, Instant, PageQuery, line, pageOf } from './primitives.js';
import { administrators, anyone, route, signedIn } from './route.js';
import { AccountRole } from './vocabulary.js';

export const Email = z.string().trim().max(254).pipe(z.email('is not a complete e-mail address'));
/** Length is the rule (NIST SP 800-63B, 5.1.1.2); the upper bound keeps hashing affordable. */
export const Password = z
  .string()
  .min(12, 'takes at least 12 characters')
  .max(200, 'takes at most 200 characters');
export const DisplayName = line(60, 2);
const Token = z.string().min(20).max(100);

/** When mail about what somebody watches comes. */
export const MailRhythm = z.enum(['at-once', 'daily', 'weekly', 'none']);
export type MailRhythm = z.infer<typeof MailRhythm>;

export const Account = z.object({
  id: Id,
  email: z.string(),
  displayName: z.string(),
  role: AccountRole,
  /** Whether the desk's word on their own editions and proposals is mailed. */
  noticeMail: z.boolean(),
  /** When mail about what they watch comes. */
  mailRhythm: MailRhythm,
  /** Whether a caution on a fix they tried is mailed, at once and whatever the rhythm. */
  safetyMail: z.boolean(),
  /** Whether they are told of what changes on their bench; null until they have answered. */
  benchWatch: z.boolean().nullable(),
  /** Since when mail to them comes back, and so none but account mail is sent. */
  mailRefusedAt: Instant.nullable(),
  units: z.enum(['mm', 'in']),
  createdAt: Instant,
  /** When it is deleted, as its owner asked; null: it stays. */
  deletionAt: Instant.nullable(),
});
export type Account = z.infer<typeof Account>;

export const Session = z.object({ account: Account.nullable() });
export type Session = z.infer<typeof Session>;

export const SignUp = z.strictObject({ email: Email, displayName: DisplayName, password: Password });
export const SignIn = z.strictObject({ email: Email, password: z.string().min(1, 'is needed').max(200) });

export const AccountRow = z.object({
  id: Id,
  email: z.string(),
  displayName: z.string(),
  role: AccountRole,
  confirmed: z.boolean(),
  createdAt: Instant,
});
export type AccountRow = z.infer<typeof AccountRow>;

const tag = 'accounts';
export const accountRoutes = {
  session: route({
    method: 'get',
    path: '/api/account/session',
    tag,
    access: anyone,
    summary: 'Who is signed in',
    response: Session,
  }),
  signUp: route({
    method: 'post',
    path: '/api/account/sign-up',
    tag,
    access: anyone,
    status: 202,
    summary:
      'Ask for an account; a link to confirm the address is mailed (the answer is the same whether or not the address is known)',
    body: SignUp,
    response: z.object({ mailed: z.literal(true) }),
    problems: ['too-many-requests'],
  }),
  confirmEmail: route({
    method: 'post',
    path: '/api/account/confirm-email',
    tag,
    access: anyone,
    summary: 'Confirm the address with the mailed token and sign in',
    body: z.strictObject({ token: Token }),
    response: Session,
    problems: ['token-not-valid', 'too-many-requests'],
  }),
  resendConfirmation: route({
    method: 'post',
    path: '/api/account/resend-confirmation',
    tag,
    access: anyone,
    status: 202,
    summary: 'Mail the confirmation link again',
    body: z.strictObject({ email: Email }),
    response: z.object({ mailed: z.literal(true) }),
    problems: ['too-many-requests'],
  }),
  signIn: route({
    method: 'post',
    path: '/api/account/sign-in',
    tag,
    access: anyone,
    summary: 'Sign in with e-mail address and password',
    body: SignIn,
    response: Session,
    problems: ['sign-in-refused', 'email-not-confirmed', 'too-many-requests'],
  }),
  signOut: route({
    method: 'post',
    path: '/api/account/sign-out',
    tag,
    access: anyone,
    summary: 'End the session',
  }),
  requestPasswordReset: route({
    method: 'post',
    path: '/api/account/request-password-reset',
    tag,
    access: anyone,
    status: 202,
    summary: 'Mail a link to set a new password',
    body: z.strictObject({ email: Email }),
    response: z.object({ mailed: z.literal(true) }),
    problems: ['too-many-requests'],
  }),
  resetPassword: route({
    method: 'post',
    path: '/api/account/reset-password',
    tag,
    access: anyone,
    summary: 'Set a new password with the mailed token; ends every session of the account',
    body: z.strictObject({ token: Token, password: Password }),
    problems: ['token-not-valid', 'too-many-requests'],
  }),
  changeProfile: route({
    method: 'patch',
    path: '/api/account/profile',
    tag,
    access: signedIn,
    limitedMay: true,
    summary: 'Change name, units or mail preference',
    body: z.strictObject({
      displayName: DisplayName.optional(),
      units: z.enum(['mm', 'in']).optional(),
      noticeMail: z.boolean().optional(),
      mailRhythm: MailRhythm.optional(),
      safetyMail: z.boolean().optional(),
      benchWatch: z.boolean().optional(),
    }),
    response: Session,
  }),
  confirmAddressAgain: route({
    method: 'post',
    path: '/api/account/confirm-again',
    tag,
    access: signedIn,
    limitedMay: true,
    status: 202,
    summary: 'Mail a link to confirm the own address, after mail to it came back',
    response: z.object({ mailed: z.literal(true) }),
    problems: ['too-many-requests'],
  }),
  unsubscribe: route({
    method: 'post',
    path: '/api/mail/unsubscribe',
    tag,
    access: anyone,
    csrfExempt: true,
    summary: 'One-click unsubscribe (RFC 8058): the token in the address is the proof; the body is ignored',
    query: z.object({ token: Token }),
    problems: ['token-not-valid'],
  }),
  openUnsubscribe: route({
    method: 'get',
    path: '/api/mail/unsubscribe',
    tag,
    access: anyone,
    status: 303,
    summary:
      'The address of the one-click unsubscribe opened in a browser: leads to the page that asks first and changes nothing',
    query: z.object({ token: Token }),
  }),
  listAccounts: route({
    method: 'get',
    path: '/api/admin/accounts',
    tag: 'administration',
    access: administrators,
    summary: 'Accounts, newest first',
    query: PageQuery.extend({ q: line(100).optional() }),
    response: pageOf(AccountRow),
  }),
  changeRole: route({
    method: 'patch',
    path: '/api/admin/accounts/:id',
    tag: 'administration',
    access: administrators,
    summary: 'Give an account another role',
    params: z.object({ id: z.coerce.number().int().positive() }),
    body: z.strictObject({ role: AccountRole }),
    response: AccountRow,
  }),
};
