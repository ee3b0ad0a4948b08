import { z } from 'zod';
import { Email } from './accounts.js';
import { Id, IdText, Instant, line } from './primitives.js';
import { route, signedIn } from './route.js';

/** Days between asking and the deletion, in which signing in is enough to call it off. */
export const graceDays = 7;
/** Days for which an offer to hand write-ups over can be taken. */
export const offerDays = 14;
/** What has to be typed, so that nobody deletes by a slip. */
export const deletionWords = 'delete my account';

/** How much goes and how much stays, counted now. */
export const WhatGoes = z.object({
  benchItems: z.int(),
  ownStock: z.int(),
  drafts: z.int(),
  /** Write-ups with a published edition of this person. */
  writeUps: z.int(),
  readings: z.int(),
  trials: z.int(),
  fitReports: z.int(),
  questions: z.int(),
  replies: z.int(),
});
export type WhatGoes = z.infer<typeof WhatGoes>;

export const HandOverState = z.enum(['waiting', 'taken', 'declined', 'called-off', 'run-out', 'done']);
export type HandOverState = z.infer<typeof HandOverState>;

/** The offer of somebody who leaves, as they see it. */
export const HandOver = z.object({
  /** Name or address as it was written. */
  addressedTo: z.string(),
  state: HandOverState,
  offeredAt: Instant,
  /** It can be taken before this instant. */
  endsAt: Instant,
});
export type HandOver = z.infer<typeof HandOver>;

export const Deletion = z.object({
  /** From this instant on the account is deleted; null while nothing was asked for. */
  deletionAt: Instant.nullable(),
  /** The only administrator has to name another one first. */
  lastAdministrator: z.boolean(),
  counts: WhatGoes,
  handOver: HandOver.nullable(),
});
export type Deletion = z.infer<typeof Deletion>;

const Person = line(254, 2).refine((words) => !words.includes('@') || Email.safeParse(words).success, {
  message: 'is not a complete e-mail address',
});

export const AskForDeletion = z.strictObject({
  password: z.string().min(1, 'is needed').max(200),
  words: z.string().max(60),
  /** Display name or e-mail address of the member who is to look after the write-ups; null: nobody. */
  handOverTo: Person.nullable(),
});
export type AskForDeletion = z.infer<typeof AskForDeletion>;

/** An offer as the one who may take it sees it. */
export const OfferedHandOver = z.object({
  id: Id,
  from: z.string(),
  writeUps: z.array(z.object({ slug: z.string(), title: z.string() })),
  state: HandOverState,
  offeredAt: Instant,
  endsAt: Instant,
});
export type OfferedHandOver = z.infer<typeof OfferedHandOver>;

const tag = 'accounts';
const idParams = z.object({ id: IdText });
export const deletionRoutes = {
  readDeletion: route({
    method: 'get',
    path: '/api/account/deletion',
    tag,
    access: signedIn,
    summary: 'What deleting my account would take away, what would stay, and whether it is asked for',
    response: Deletion,
  }),
  askForDeletion: route({
    method: 'post',
    path: '/api/account/deletion',
    tag,
    access: signedIn,
    limitedMay: true,
    status: 202,
    summary: `Have my account deleted in ${graceDays} days; the words are “${deletionWords}”`,
    body: AskForDeletion,
    response: Deletion,
    problems: ['sign-in-refused', 'already-there', 'too-many-requests'],
  }),
  callDeletionOff: route({
    method: 'delete',
    path: '/api/account/deletion',
    tag,
    access: signedIn,
    limitedMay: true,
    status: 200,
    summary: 'Keep my account after all; an offer of my write-ups is called off with it',
    response: Deletion,
  }),
  listHandOvers: route({
    method: 'get',
    path: '/api/my/hand-overs',
    tag,
    access: signedIn,
    summary: 'Write-ups that somebody who leaves wants me to look after, the newest offer first',
    response: z.object({ items: z.array(OfferedHandOver) }),
  }),
  takeHandOver: route({
    method: 'post',
    path: '/api/my/hand-overs/:id/taken',
    tag,
    access: signedIn,
    summary: 'Agree to look after the write-ups once the other one has left',
    params: idParams,
    response: z.object({ items: z.array(OfferedHandOver) }),
  }),
  declineHandOver: route({
    method: 'post',
    path: '/api/my/hand-overs/:id/declined',
    tag,
    access: signedIn,
    summary: 'Decline the offer',
    params: idParams,
    response: z.object({ items: z.array(OfferedHandOver) }),
  }),
};
