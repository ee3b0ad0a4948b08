import { z } from 'zod';
import { Callout } from './callouts.js';
import { EditionContent, Acceptance } from './edition-content.js';
import { PartRef, RevisionRef, Symptom } from './hardware.js';
import { Photo } from './photos.js';
import { TakenDown } from './taken-down.js';
import { WorksheetRecord } from './worksheet.js';
import { Id, IdText, Instant, PageQuery, Slug, line, pageOf, passage } from './primitives.js';
import { anyone, route, signedIn } from './route.js';
import {
  Afterwards,
  EditionState,
  FixKind,
  HazardKind,
  Instrument,
  Permanence,
  ReadingUnit,
  SignalWord,
  Standing,
  TrialOutcome,
} from './vocabulary.js';

export const PersonRef = z.object({ id: Id, displayName: z.string() });
export type PersonRef = z.infer<typeof PersonRef>;

/** Markdown as written, and as cleaned HTML made by shared/text. */
export const RichText = z.object({ source: z.string(), html: z.string() });
export type RichText = z.infer<typeof RichText>;

/** A moderator's safety notice. `fixKey` null: placed on the whole write-up; `stepKey` null: on all of the fix. Texts are plain. */
export const Caution = z.object({
  id: Id,
  fixKey: z.string().nullable(),
  stepKey: z.string().nullable(),
  signalWord: SignalWord,
  /** The hazards this caution answers. */
  hazards: z.array(HazardKind),
  hazard: z.string(),
  consequence: z.string(),
  avoidance: z.string(),
});
export type Caution = z.infer<typeof Caution>;

export const Trial = z.object({
  id: Id,
  fixKey: z.string(),
  person: PersonRef,
  outcome: TrialOutcome,
  revisions: z.array(RevisionRef.extend({ partName: z.string() })),
  note: z.string(),
  /** The figure reached, in the unit of the fix's acceptance figure. */
  figure: z.number().nullable(),
  worksheet: WorksheetRecord.nullable(),
  createdAt: Instant,
  /** Only its writer and moderators are given a trial that is taken down. */
  takenDown: TakenDown.nullable(),
});
export type Trial = z.infer<typeof Trial>;

/** What somebody tells of a fix that they tried. */
export const TrialReport = z.strictObject({
  fixKey: z.string().min(8).max(36),
  outcome: TrialOutcome,
  revisionIds: z.array(Id).max(8),
  note: passage(2000),
  /** In the unit of the fix's acceptance figure. */
  figure: z.number().finite().min(-100_000).max(100_000).nullable(),
  worksheet: WorksheetRecord.nullable().default(null),
});
export type TrialReport = z.infer<typeof TrialReport>;

export const MarkedRevision = RevisionRef.extend({ holds: z.boolean() });
export const JointSideView = z.object({
  part: PartRef,
  feature: z.string(),
  /** Every revision of the part that the author has marked, oldest first. */
  revisions: z.array(MarkedRevision),
  /** Revisions of the part that the write-up does not mention. */
  notKnown: z.array(RevisionRef),
});
export type JointSideView = z.infer<typeof JointSideView>;

/** A photo as a write-up shows it: with the words for those who cannot see it, and with what is drawn on it. */
export const PhotoShown = z.object({ photo: Photo, alt: z.string(), callouts: z.array(Callout) });
export type PhotoShown = z.infer<typeof PhotoShown>;

export const FixView = z.object({
  key: z.string(),
  title: z.string(),
  kind: FixKind.nullable(),
  permanence: Permanence.nullable(),
  standing: Standing,
  madeRightFrom: RevisionRef.nullable(),
  why: RichText,
  tools: z.array(z.string()),
  materials: z.array(z.string()),
  steps: z.array(
    z.object({
      key: z.string(),
      text: RichText,
      photo: PhotoShown.nullable(),
      /** Those that stand on this step; they are shown above it. */
      cautions: z.array(Caution),
    }),
  ),
  revisions: z.array(RevisionRef.extend({ partName: z.string() })),
  afterwards: z.array(Afterwards),
  afterwardsNote: z.string(),
  acceptance: Acceptance.nullable(),
  worksheet: WorksheetRecord.nullable(),
  cautions: z.array(Caution),
  trialCounts: z.object({
    held: z.number().int(),
    heldForAWhile: z.number().int(),
    didNotHelp: z.number().int(),
  }),
});
export type FixView = z.infer<typeof FixView>;

/** An edition ready to be shown: the page and the preview are drawn from the same shape. */
export const EditionView = z.object({
  title: z.string(),
  summary: z.string(),
  joints: z.array(z.object({ a: JointSideView, b: JointSideView })),
  symptoms: z.array(Symptom),
  noticed: RichText,
  cause: RichText,
  readings: z.array(
    z.object({
      key: z.string(),
      part: z.string().nullable(),
      revision: RevisionRef.nullable(),
      dimension: z.string(),
      value: z.number().nullable(),
      unit: ReadingUnit,
      instrument: Instrument,
      uncertainty: z.number().nullable(),
    }),
  ),
  fixes: z.array(FixView),
  photos: z.array(PhotoShown.extend({ caption: z.string() })),
  sources: RichText,
  cautions: z.array(Caution),
});
export type EditionView = z.infer<typeof EditionView>;

/** One edition in a list. On the desk `publishedAt` is the day on which it was handed in, since it is not published yet. */
export const EditionLine = z.object({
  id: Id,
  number: z.number().int(),
  author: PersonRef,
  changeNote: z.string(),
  publishedAt: Instant,
  title: z.string(),
});
export type EditionLine = z.infer<typeof EditionLine>;

export const WriteUpPage = z.object({
  id: Id,
  slug: Slug,
  edition: EditionLine,
  editionCount: z.number().int(),
  firstPublishedAt: Instant,
  authors: z.array(PersonRef),
  view: EditionView,
  trials: z.array(Trial),
  /** Whether it is the caller's own to edit, as one of its authors or from the desk; others who are signed in propose an edition. */
  mayEdit: z.boolean(),
  /** The caller's open draft of it, if any. */
  myDraftId: Id.nullable(),
});
export type WriteUpPage = z.infer<typeof WriteUpPage>;

/** A run of words that both editions share, or only the earlier or the later one has. */
export const DifferencePiece = z.object({ kind: z.enum(['same', 'removed', 'added']), text: z.string() });
export type DifferencePiece = z.infer<typeof DifferencePiece>;
/** One field of the edition, such as "Cause" or "Fix “Coin behind the plate”, step 2". */
export const FieldDifference = z.object({
  field: z.string(),
  label: z.string(),
  pieces: z.array(DifferencePiece),
});
export type FieldDifference = z.infer<typeof FieldDifference>;

export const EditionComparison = z.object({
  from: EditionLine.nullable(),
  to: EditionLine,
  changed: z.array(FieldDifference),
  unchangedFields: z.number().int(),
});
export type EditionComparison = z.infer<typeof EditionComparison>;

export const Draft = z.object({
  id: Id,
  writeUpId: Id,
  slug: Slug.nullable(),
  number: z.number().int(),
  state: EditionState,
  author: PersonRef,
  changeNote: z.string(),
  content: EditionContent,
  /** Grows by one with each save; the ETag is `"<version>"`. */
  version: z.number().int(),
  updatedAt: Instant,
  /** Reason of the last return, if it came back from the desk. */
  returnReason: z.string().nullable(),
  /** Photos the content points at. */
  photos: z.array(Photo),
  /** The published edition whose text it was started from or last merged with; null for a first edition. */
  base: EditionLine.nullable(),
  /** The edition that has been published since; it has to be merged before the desk can take this one. */
  overtakenBy: EditionLine.nullable(),
  /** Who wrote the published editions, the first author first; empty for a first edition. */
  writtenBy: z.array(PersonRef),
});
export type Draft = z.infer<typeof Draft>;

export const MyWriteUp = z.object({
  editionId: Id,
  slug: Slug.nullable(),
  number: z.number().int(),
  state: EditionState,
  title: z.string(),
  updatedAt: Instant,
  returnReason: z.string().nullable(),
});
export type MyWriteUp = z.infer<typeof MyWriteUp>;

const slugParams = z.object({ slug: Slug });
const idParams = z.object({ id: IdText });
const tag = 'write-ups';
const changeNote = line(300);

export const writeUpRoutes = {
  readWriteUp: route({
    method: 'get',
    path: '/api/write-ups/:slug',
    tag,
    access: anyone,
    summary: 'The published edition with cautions and trials',
    params: slugParams,
    response: WriteUpPage,
  }),
  listEditions: route({
    method: 'get',
    path: '/api/write-ups/:slug/editions',
    tag,
    access: anyone,
    summary: 'Every published edition: who, when, why; newest first',
    params: slugParams,
    response: z.object({ items: z.array(EditionLine) }),
  }),
  readEdition: route({
    method: 'get',
    path: '/api/write-ups/:slug/editions/:number',
    tag,
    access: anyone,
    summary: 'One published edition as it was',
    params: z.object({ slug: Slug, number: IdText }),
    response: z.object({
      slug: Slug,
      edition: EditionLine,
      latestNumber: z.number().int(),
      view: EditionView,
    }),
  }),
  compareEditions: route({
    method: 'get',
    path: '/api/write-ups/:slug/comparison',
    tag,
    access: anyone,
    summary: 'Two published editions, word by word',
    params: slugParams,
    query: z.strictObject({ from: IdText, to: IdText }),
    response: EditionComparison,
  }),
  listMine: route({
    method: 'get',
    path: '/api/my/write-ups',
    tag,
    access: signedIn,
    summary: 'My editions, the last touched first',
    query: PageQuery.extend({ state: EditionState.optional() }),
    response: pageOf(MyWriteUp),
  }),
  startWriteUp: route({
    method: 'post',
    path: '/api/write-ups',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Start a write-up: an empty draft',
    body: z.strictObject({ title: line(140).optional() }),
    response: Draft,
  }),
  startEdition: route({
    method: 'post',
    path: '/api/write-ups/:slug/editions',
    tag,
    access: signedIn,
    status: 201,
    summary:
      'Start the next edition from the published one, on anybody’s write-up; an open draft of the caller is given back instead of a second one',
    params: slugParams,
    response: Draft,
  }),
  readDraft: route({
    method: 'get',
    path: '/api/drafts/:id',
    tag,
    access: signedIn,
    summary: 'A draft of mine; carries an ETag',
    params: idParams,
    response: Draft,
  }),
  saveDraft: route({
    method: 'put',
    path: '/api/drafts/:id',
    tag,
    access: signedIn,
    ifMatch: true,
    summary: 'Save a draft; a lost update is refused with what changed',
    params: idParams,
    body: z.strictObject({
      content: EditionContent,
      changeNote,
      /** The edition that is published now, once the text has been merged with it. */
      baseEditionId: Id.optional(),
    }),
    response: Draft,
    problems: ['edition-moved-on', 'precondition-needed', 'edition-state'],
  }),
  discardDraft: route({
    method: 'delete',
    path: '/api/drafts/:id',
    tag,
    access: signedIn,
    summary: 'Throw a draft or returned edition away; it can be brought back',
    params: idParams,
    problems: ['edition-state'],
  }),
  restoreDraft: route({
    method: 'post',
    path: '/api/drafts/:id/restore',
    tag,
    access: signedIn,
    summary: 'Bring a thrown-away draft back',
    params: idParams,
    response: Draft,
    problems: ['edition-state'],
  }),
  previewDraft: route({
    method: 'get',
    path: '/api/drafts/:id/preview',
    tag,
    access: signedIn,
    summary: 'The draft as its page would show it',
    params: idParams,
    response: z.object({ view: EditionView }),
  }),
  listDraftCautions: route({
    method: 'get',
    path: '/api/drafts/:id/cautions',
    tag,
    access: signedIn,
    summary: 'The cautions that stand on the write-up of a draft of mine; no edition drops them',
    params: idParams,
    response: z.object({ items: z.array(Caution) }),
  }),
  submitDraft: route({
    method: 'post',
    path: '/api/drafts/:id/submit',
    tag,
    access: signedIn,
    ifMatch: true,
    summary: 'Hand a draft to the desk; a later edition needs a change note',
    params: idParams,
    response: Draft,
    problems: ['edition-moved-on', 'precondition-needed', 'edition-state', 'not-complete'],
  }),
  recallDraft: route({
    method: 'post',
    path: '/api/drafts/:id/recall',
    tag,
    access: signedIn,
    summary: 'Take a submitted edition back from the desk',
    params: idParams,
    response: Draft,
    problems: ['edition-state'],
  }),
  reportTrial: route({
    method: 'post',
    path: '/api/write-ups/:slug/trials',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Report a trial of a fix; one per person and fix, a second replaces the first',
    params: slugParams,
    body: TrialReport,
    response: Trial,
  }),
};
