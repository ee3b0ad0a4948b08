import { z } from 'zod';
import { DeskSubject } from './desk-subjects.js';
import { Id, IdText, Instant } from './primitives.js';
import { moderators, route } from './route.js';
import { DeskReason } from './taken-down.js';

/** Posts of a member that the desk looks at before it knows them. */
export const postsUntilKnown = 3;

const state = z.enum(['waiting', 'fine', 'taken-down']);

export const DeskFirstPost = z.object({
  id: Id,
  state,
  since: Instant,
  title: z.string(),
  subject: DeskSubject.nullable(),
  /** How many posts of its writer the desk has found fine so far. */
  fineSoFar: z.number().int(),
});
export type DeskFirstPost = z.infer<typeof DeskFirstPost>;

export const DeskPhoto = z.object({ id: Id, state, since: Instant, subject: DeskSubject });
export type DeskPhoto = z.infer<typeof DeskPhoto>;

const tag = 'desk';
const byId = z.object({ id: IdText });
const takingDown = z.strictObject({ reason: DeskReason });
const problems = ['already-there', 'claimed-by-another'] as const;

export const deskPostRoutes = {
  readFirstPost: route({
    method: 'get',
    path: '/api/desk/first-posts/:id',
    tag,
    access: moderators,
    summary: 'One of the first posts of a new member',
    params: byId,
    response: DeskFirstPost,
  }),
  findPostFine: route({
    method: 'post',
    path: '/api/desk/first-posts/:id/fine',
    tag,
    access: moderators,
    summary: 'Find a first post fine; after the third its writer is known',
    params: byId,
    problems,
  }),
  takePostDown: route({
    method: 'post',
    path: '/api/desk/first-posts/:id/take-down',
    tag,
    access: moderators,
    summary: 'Take a first post down with a reason that goes to its writer',
    params: byId,
    body: takingDown,
    problems,
  }),
  readDeskPhoto: route({
    method: 'get',
    path: '/api/desk/photos/:id',
    tag,
    access: moderators,
    summary: 'A photo used outside of editions that the desk has not looked at yet',
    params: byId,
    response: DeskPhoto,
  }),
  findPhotoFine: route({
    method: 'post',
    path: '/api/desk/photos/:id/fine',
    tag,
    access: moderators,
    summary: 'Find a photo fine',
    params: byId,
    problems,
  }),
  takePhotoDown: route({
    method: 'post',
    path: '/api/desk/photos/:id/take-down',
    tag,
    access: moderators,
    summary: 'Take a photo down with a reason that goes to its owner',
    params: byId,
    body: takingDown,
    problems,
  }),
};
