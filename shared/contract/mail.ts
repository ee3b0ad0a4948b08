import { z } from 'zod';
import { MailRhythm } from './accounts.js';
import { Id } from './primitives.js';
import { anyone, route } from './route.js';
import { WatchKey, WatchSubject } from './watches.js';

/** What a mail came from: a watch such as `part/12`, or the bench. */
const MailSource = z.union([z.literal('bench'), WatchKey]);
const Token = z.string().min(20).max(100);
const tag = 'mail';

export const mailRoutes = {
  readMailChoices: route({
    method: 'get',
    path: '/api/mail/choices',
    tag,
    access: anyone,
    summary: 'What the link at the foot of a mail can change; the token in it is the proof',
    query: z.object({ token: Token, watch: MailSource.optional() }),
    response: z.object({
      rhythm: MailRhythm,
      benchWatch: z.boolean(),
      /** The watch the mail came from, while it is there. */
      watch: z.object({ subject: WatchSubject, id: Id, name: z.string() }).nullable(),
    }),
    problems: ['token-not-valid'],
  }),
  makeMailChoice: route({
    method: 'post',
    path: '/api/mail/choices',
    tag,
    access: anyone,
    summary: 'End the watch a mail came from, or have less mail; a token never makes it more',
    body: z.discriminatedUnion('choice', [
      z.strictObject({ token: Token, choice: z.literal('end-watch'), watch: MailSource }),
      z.strictObject({ token: Token, choice: z.literal('weekly') }),
      z.strictObject({ token: Token, choice: z.literal('none') }),
    ]),
    problems: ['token-not-valid'],
  }),
  takeBounce: route({
    method: 'post',
    path: '/api/mail/bounces',
    tag,
    access: anyone,
    csrfExempt: true,
    summary:
      'For the mail server only: a delivery report (RFC 3464) as message/rfc822. Taken with the secret of the hook, and only where the address it came back to was signed by this site',
    problems: ['token-not-valid'],
  }),
};
