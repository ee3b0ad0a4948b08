import { z } from 'zod';
import { DeskReason, TakenDownKind } from './taken-down.js';
import { Id, IdText, Instant, PageQuery, line } from './primitives.js';
import { moderators, route } from './route.js';
import { PersonRef } from './write-ups.js';

/** What can lie on the desk. */
export const deskItemKinds = ['edition', 'proposal', 'maker-request', 'flag', 'first-post', 'photo'] as const;
export const DeskItemKind = z.enum(deskItemKinds);
export type DeskItemKind = z.infer<typeof DeskItemKind>;

export const deskItemWords: Record<DeskItemKind, { one: string; many: string }> = {
  edition: { one: 'edition', many: 'Editions' },
  proposal: { one: 'hardware proposal', many: 'Hardware' },
  'maker-request': { one: 'maker request', many: 'Makers' },
  flag: { one: 'told to the desk', many: 'Told to the desk' },
  'first-post': { one: 'first post', many: 'First posts' },
  photo: { one: 'photo', many: 'Photos' },
};

/** Who has an item in hand, until when. */
export const Claim = z.object({ person: PersonRef, until: Instant });
export type Claim = z.infer<typeof Claim>;

export const DeskItem = z.object({
  kind: DeskItemKind,
  id: Id,
  title: z.string(),
  /** Who wrote it; of something told to the desk, who wrote the thing. */
  person: PersonRef,
  /** Since when it waits. */
  since: Instant,
  /** Of editions: hazards named in the text that no caution answers yet; null for anything else. */
  openHazards: z.number().int().nullable(),
  /** A claim that has not run out; null: nobody has it in hand. */
  claim: Claim.nullable(),
  /** Whether the claim is the caller's. */
  mine: z.boolean(),
  /** Page on which it is decided. */
  path: z.string(),
});
export type DeskItem = z.infer<typeof DeskItem>;

export const DeskQuery = PageQuery.extend({
  kind: DeskItemKind.optional(),
  claim: z.enum(['free', 'mine']).optional(),
  /** Words of the title or the name of whoever wrote it. */
  words: line(100).optional(),
});

export const DeskQueue = z.object({
  items: z.array(DeskItem),
  next: z.string().nullable(),
  /** How many of each kind wait, whatever the list is kept to. */
  counts: z.record(DeskItemKind, z.number().int()),
});
export type DeskQueue = z.infer<typeof DeskQueue>;

const itemParams = z.object({ kind: DeskItemKind, id: IdText });
const tag = 'desk';

export const deskQueueRoutes = {
  readDesk: route({
    method: 'get',
    path: '/api/desk',
    tag,
    access: moderators,
    summary: 'All that waits at the desk, the longest wait first',
    query: DeskQuery,
    response: DeskQueue,
  }),
  readClaim: route({
    method: 'get',
    path: '/api/desk/claims/:kind/:id',
    tag,
    access: moderators,
    summary: 'Who has an item in hand',
    params: itemParams,
    response: z.object({ claim: Claim.nullable() }),
  }),
  claimItem: route({
    method: 'put',
    path: '/api/desk/claims/:kind/:id',
    tag,
    access: moderators,
    summary:
      'Take an item in hand for 20 minutes, or renew that; `takeOverFrom` names the moderator from whom it is taken over',
    params: itemParams,
    body: z.strictObject({ takeOverFrom: Id.nullable() }),
    response: Claim,
    problems: ['claimed-by-another'],
  }),
  giveUpClaim: route({
    method: 'delete',
    path: '/api/desk/claims/:kind/:id',
    tag,
    access: moderators,
    summary: 'Give an item up that I have in hand; doing so twice is harmless',
    params: itemParams,
  }),
  takeDown: route({
    method: 'post',
    path: '/api/desk/subjects/:kind/:id/take-down',
    tag,
    access: moderators,
    summary: 'Take something a member wrote off the pages, with a reason that goes to its writer',
    params: z.object({ kind: TakenDownKind, id: IdText }),
    body: z.strictObject({ reason: DeskReason }),
    problems: ['already-there'],
  }),
  putBack: route({
    method: 'post',
    path: '/api/desk/subjects/:kind/:id/put-back',
    tag,
    access: moderators,
    summary: 'Put something that was taken down back on the pages, with a reason that goes to its writer',
    params: z.object({ kind: TakenDownKind, id: IdText }),
    body: z.strictObject({ reason: DeskReason }),
    problems: ['already-there'],
  }),
};
