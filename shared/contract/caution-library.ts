import { z } from 'zod';
import { CautionWords, LibraryCaution } from './moderation.js';
import { Id, IdText, Instant, line } from './primitives.js';
import { moderators, route } from './route.js';
import { FieldDifference } from './write-ups.js';

/** An entry of the library as those see it who keep it. */
export const LibraryEntry = LibraryCaution.extend({
  /** Grows by one with each change; the ETag is `"<version>"`. */
  version: z.number().int(),
  /** Retired entries are offered no longer. */
  retired: z.boolean(),
  /** Cautions taken from it that stand on write-ups. */
  uses: z.number().int(),
});
export type LibraryEntry = z.infer<typeof LibraryEntry>;

export const LibraryChange = z.enum(['added', 'worded', 'retired', 'put-back']);
export type LibraryChange = z.infer<typeof LibraryChange>;

export const LibraryVersion = z.object({
  version: z.number().int(),
  change: LibraryChange,
  name: z.string(),
  /** Null: it was there before changes were kept. */
  by: z.object({ id: Id, displayName: z.string() }).nullable(),
  at: Instant,
  why: z.string(),
});
export type LibraryVersion = z.infer<typeof LibraryVersion>;

/** A caution that was taken from an entry and stands on a write-up. */
export const LibraryUse = z.object({
  cautionId: Id,
  writeUpId: Id,
  /** Null while the write-up was never published. */
  slug: z.string().nullable(),
  title: z.string(),
  published: z.boolean(),
  /** Where it was placed; null: on all of it. */
  fixTitle: z.string().nullable(),
  step: z.number().int().nullable(),
  /** Whether it says what the entry says now. */
  asEntry: z.boolean(),
  hazard: z.string(),
  consequence: z.string(),
  avoidance: z.string(),
});
export type LibraryUse = z.infer<typeof LibraryUse>;

/** Why the library is changed; it stands in its history. */
const why = line(500, 3);
const idParams = z.object({ id: IdText });
const tag = 'caution library';
const problems = ['moved-on', 'precondition-needed'] as const;

export const LibraryWords = z.strictObject({ name: line(120, 3), ...CautionWords, why });
export type LibraryWords = z.infer<typeof LibraryWords>;

export const cautionLibraryRoutes = {
  readCautionLibrary: route({
    method: 'get',
    path: '/api/desk/caution-library/entries',
    tag,
    access: moderators,
    summary: 'Every entry of the library in its order, the retired ones too',
    response: z.object({ items: z.array(LibraryEntry) }),
  }),
  readLibraryEntry: route({
    method: 'get',
    path: '/api/desk/caution-library/entries/:id',
    tag,
    access: moderators,
    summary: 'One entry; carries an ETag',
    params: idParams,
    response: LibraryEntry,
  }),
  addLibraryEntry: route({
    method: 'post',
    path: '/api/desk/caution-library/entries',
    tag,
    access: moderators,
    status: 201,
    summary: 'Add an entry, at the end',
    body: LibraryWords,
    response: LibraryEntry,
  }),
  changeLibraryEntry: route({
    method: 'put',
    path: '/api/desk/caution-library/entries/:id',
    tag,
    access: moderators,
    ifMatch: true,
    summary: 'Word an entry anew; what was taken from it stands as it is until it is worded anew there',
    params: idParams,
    body: LibraryWords,
    response: LibraryEntry,
    problems,
  }),
  retireLibraryEntry: route({
    method: 'post',
    path: '/api/desk/caution-library/entries/:id/retire',
    tag,
    access: moderators,
    ifMatch: true,
    summary: 'Offer an entry no longer',
    params: idParams,
    body: z.strictObject({ why }),
    response: LibraryEntry,
    problems,
  }),
  putBackLibraryEntry: route({
    method: 'post',
    path: '/api/desk/caution-library/entries/:id/put-back',
    tag,
    access: moderators,
    ifMatch: true,
    summary: 'Offer a retired entry again',
    params: idParams,
    body: z.strictObject({ why }),
    response: LibraryEntry,
    problems,
  }),
  orderCautionLibrary: route({
    method: 'put',
    path: '/api/desk/caution-library/order',
    tag,
    access: moderators,
    summary: 'Put the entries in another order; every one must be named once',
    body: z.strictObject({ ids: z.array(Id).min(1).max(1000) }),
    response: z.object({ items: z.array(LibraryEntry) }),
    problems: ['moved-on'],
  }),
  listLibraryVersions: route({
    method: 'get',
    path: '/api/desk/caution-library/entries/:id/versions',
    tag,
    access: moderators,
    summary: 'Every change of an entry: who, when, why; the newest first',
    params: idParams,
    response: z.object({ items: z.array(LibraryVersion) }),
  }),
  compareLibraryVersions: route({
    method: 'get',
    path: '/api/desk/caution-library/entries/:id/comparison',
    tag,
    access: moderators,
    summary: 'Two versions of an entry, word by word',
    params: idParams,
    query: z.strictObject({ from: IdText, to: IdText }),
    response: z.object({
      from: LibraryVersion,
      to: LibraryVersion,
      changed: z.array(FieldDifference),
    }),
  }),
  listLibraryUses: route({
    method: 'get',
    path: '/api/desk/caution-library/entries/:id/uses',
    tag,
    access: moderators,
    summary: 'The cautions taken from an entry that stand on write-ups',
    params: idParams,
    response: z.object({ items: z.array(LibraryUse) }),
  }),
  applyLibraryEntry: route({
    method: 'post',
    path: '/api/desk/caution-library/entries/:id/apply',
    tag,
    access: moderators,
    ifMatch: true,
    summary: 'Give chosen cautions the words that the entry has now, all of them or none',
    params: idParams,
    body: z.strictObject({ cautionIds: z.array(Id).min(1).max(500) }),
    response: z.object({ items: z.array(LibraryUse) }),
    problems: [...problems, 'caution-missing'],
  }),
};
