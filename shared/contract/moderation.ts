import { z } from 'zod';
import { EditionState, HazardKind, SignalWord } from './vocabulary.js';
import { Id, IdText, Instant, PageQuery, line, pageOf, passage } from './primitives.js';
import { moderators, route } from './route.js';
import { Caution, EditionComparison, EditionView, PersonRef } from './write-ups.js';

export const DeskLine = z.object({
  editionId: Id,
  number: z.number().int(),
  title: z.string(),
  author: PersonRef,
  submittedAt: Instant,
  changeNote: z.string(),
  /** Hazards named in the text that no caution answers yet. */
  openHazards: z.number().int(),
});
export type DeskLine = z.infer<typeof DeskLine>;

/** A hazard that the rule list found in a text, with the words that gave it away. */
export const FoundHazard = z.object({
  hazard: HazardKind,
  /** The fix whose text names it; null: the write-up's own text. */
  fixKey: z.string().nullable(),
  fixTitle: z.string().nullable(),
  words: z.array(z.string()),
  answered: z.boolean(),
});
export type FoundHazard = z.infer<typeof FoundHazard>;

export const LibraryCaution = z.object({
  id: Id,
  name: z.string(),
  signalWord: SignalWord,
  hazards: z.array(HazardKind),
  hazard: z.string(),
  consequence: z.string(),
  avoidance: z.string(),
});
export type LibraryCaution = z.infer<typeof LibraryCaution>;

export const DeskEdition = z.object({
  editionId: Id,
  writeUpId: Id,
  slug: z.string().nullable(),
  number: z.number().int(),
  state: EditionState,
  author: PersonRef,
  submittedAt: Instant.nullable(),
  changeNote: z.string(),
  view: EditionView,
  /** Against the edition that is published now; null for a first edition. */
  comparison: EditionComparison.nullable(),
  hazards: z.array(FoundHazard),
  cautions: z.array(Caution),
});
export type DeskEdition = z.infer<typeof DeskEdition>;

const CautionWords = {
  signalWord: SignalWord,
  hazards: z.array(HazardKind).max(12),
  hazard: line(200, 3),
  consequence: line(300, 3),
  avoidance: line(500, 3),
};

export const PlaceCaution = z.strictObject({
  editionId: Id,
  fixKey: z.string().min(8).max(36).nullable(),
  /** The library entry it was taken from, if any. */
  libraryId: Id.nullable(),
  ...CautionWords,
});
export type PlaceCaution = z.infer<typeof PlaceCaution>;

const idParams = z.object({ id: IdText });
const tag = 'desk';

export const deskRoutes = {
  readDesk: route({
    method: 'get',
    path: '/api/desk',
    tag,
    access: moderators,
    summary: 'Editions that wait, the longest wait first',
    query: PageQuery,
    response: pageOf(DeskLine),
  }),
  readDeskEdition: route({
    method: 'get',
    path: '/api/desk/editions/:id',
    tag,
    access: moderators,
    summary: 'One edition on the desk: view, difference, hazards, cautions',
    params: idParams,
    response: DeskEdition,
  }),
  listLibraryCautions: route({
    method: 'get',
    path: '/api/desk/caution-library',
    tag,
    access: moderators,
    summary: 'The library of cautions',
    response: z.object({ items: z.array(LibraryCaution) }),
  }),
  placeCaution: route({
    method: 'post',
    path: '/api/desk/cautions',
    tag,
    access: moderators,
    status: 201,
    summary: 'Place a caution on a write-up or one of its fixes',
    body: PlaceCaution,
    response: Caution,
  }),
  changeCaution: route({
    method: 'patch',
    path: '/api/desk/cautions/:id',
    tag,
    access: moderators,
    summary: 'Word a caution anew',
    params: idParams,
    body: z.strictObject(CautionWords),
    response: Caution,
  }),
  removeCaution: route({
    method: 'delete',
    path: '/api/desk/cautions/:id',
    tag,
    access: moderators,
    summary: 'Take a caution off; refused while a published fix needs it',
    params: idParams,
    problems: ['caution-missing'],
  }),
  publishEdition: route({
    method: 'post',
    path: '/api/desk/editions/:id/publish',
    tag,
    access: moderators,
    summary: 'Publish; impossible while a hazard has no caution',
    params: idParams,
    body: z.strictObject({ note: passage(2000) }),
    response: z.object({ slug: z.string(), number: z.number().int() }),
    problems: ['caution-missing', 'edition-state', 'not-complete'],
  }),
  returnEdition: route({
    method: 'post',
    path: '/api/desk/editions/:id/return',
    tag,
    access: moderators,
    summary: 'Return to the author with a reason',
    params: idParams,
    body: z.strictObject({ reason: passage(2000, 10) }),
    problems: ['edition-state'],
  }),
};
