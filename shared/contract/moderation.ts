import { z } from 'zod';
import { EditionState, HazardKind, SignalWord } from './vocabulary.js';
import { Id, IdText, Instant, line, passage } from './primitives.js';
import { moderators, route } from './route.js';
import { Opinion } from './proposed-editions.js';
import { Caution, EditionComparison, EditionLine, EditionView, PersonRef } from './write-ups.js';

/** A hazard that the rule list found in a text, with the words that gave it away. */
export const FoundHazard = z.object({
  hazard: HazardKind,
  /** The fix whose text names it; null: the write-up's own text. */
  fixKey: z.string().nullable(),
  fixTitle: z.string().nullable(),
  /** The step of that fix whose text names it, and which it is from 1; null: another text of the fix, or of the write-up. */
  stepKey: z.string().nullable(),
  step: z.number().int().nullable(),
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
  /** The published edition it builds on; null for a first edition. */
  base: EditionLine.nullable(),
  /** Published since, without its knowing: it cannot be published before its author has merged the two. */
  overtakenBy: EditionLine.nullable(),
  /** Who wrote the published editions; where its author is not among them, it is a proposal. */
  writtenBy: z.array(PersonRef),
  /** What they told the desk of it. */
  opinions: z.array(Opinion),
  hazards: z.array(FoundHazard),
  cautions: z.array(Caution),
});
export type DeskEdition = z.infer<typeof DeskEdition>;

export const CautionWords = {
  signalWord: SignalWord,
  hazards: z.array(HazardKind).max(12),
  hazard: line(200, 3),
  consequence: line(300, 3),
  avoidance: line(500, 3),
};

export const PlaceCaution = z.strictObject({
  editionId: Id,
  fixKey: z.string().min(8).max(36).nullable(),
  /** One step of that fix; null: all of it. */
  stepKey: z.string().min(8).max(36).nullable().default(null),
  /** The library entry it was taken from, if any. */
  libraryId: Id.nullable(),
  ...CautionWords,
});
export type PlaceCaution = z.infer<typeof PlaceCaution>;

const idParams = z.object({ id: IdText });
const tag = 'desk';

export const deskRoutes = {
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
  moveCaution: route({
    method: 'put',
    path: '/api/desk/cautions/:id/place',
    tag,
    access: moderators,
    summary: 'Move a caution to another place of an edition: a step, a fix, or the whole write-up',
    params: idParams,
    body: z.strictObject({
      editionId: Id,
      fixKey: z.string().min(8).max(36).nullable(),
      stepKey: z.string().min(8).max(36).nullable(),
    }),
    response: Caution,
    problems: ['caution-missing'],
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
    problems: ['caution-missing', 'claimed-by-another', 'edition-moved-on', 'edition-state', 'not-complete'],
  }),
  returnEdition: route({
    method: 'post',
    path: '/api/desk/editions/:id/return',
    tag,
    access: moderators,
    summary: 'Return to the author with a reason',
    params: idParams,
    body: z.strictObject({ reason: passage(2000, 10) }),
    problems: ['claimed-by-another', 'edition-state'],
  }),
};
