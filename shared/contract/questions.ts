import { z } from 'zod';
import { ItemKey } from './edition-content.js';
import { PartRef, RevisionRef, Symptom } from './hardware.js';
import { Id, Instant, PageQuery, Slug, line, pageOf, passage } from './primitives.js';
import { anyone, route, signedIn } from './route.js';
import { Instrument, ReadingUnit } from './vocabulary.js';
import { TakenDown } from './taken-down.js';
import { WorksheetRecord } from './worksheet.js';
import { PersonRef, RichText } from './write-ups.js';

/** A reading as the asker took it, in the unit in which it was taken. */
export const QuestionReading = z.strictObject({
  dimension: line(120, 1),
  value: z.number().finite().min(-100_000).max(100_000),
  unit: ReadingUnit,
  instrument: Instrument,
});
export type QuestionReading = z.infer<typeof QuestionReading>;

/** The fix that helped, as it was called when the asker named it. */
export const SettledBy = z.object({
  writeUpSlug: Slug,
  writeUpTitle: z.string(),
  fixKey: z.string(),
  fixTitle: z.string(),
});
export type SettledBy = z.infer<typeof SettledBy>;

/** A part that a question is about; the revision is null where the asker does not know it. */
export const QuestionPart = z.object({ part: PartRef, revision: RevisionRef.nullable() });
export type QuestionPart = z.infer<typeof QuestionPart>;

export const QuestionLine = z.object({
  slug: Slug,
  title: z.string(),
  parts: z.array(QuestionPart),
  person: PersonRef,
  createdAt: Instant,
  replyCount: z.number().int(),
  settledBy: SettledBy.nullable(),
});
export type QuestionLine = z.infer<typeof QuestionLine>;

export const Reply = z.object({
  id: Id,
  text: RichText,
  worksheet: WorksheetRecord.nullable(),
  person: PersonRef,
  createdAt: Instant,
  /** Only its writer and moderators are given a reply that is taken down. */
  takenDown: TakenDown.nullable(),
});
export type Reply = z.infer<typeof Reply>;

export const QuestionPage = QuestionLine.extend({
  text: RichText,
  symptoms: z.array(Symptom),
  readings: z.array(QuestionReading),
  worksheet: WorksheetRecord.nullable(),
  /** Oldest first. */
  replies: z.array(Reply),
  /** Only its asker and moderators are given a question that is taken down; others get 410. */
  takenDown: TakenDown.nullable(),
});
export type QuestionPage = z.infer<typeof QuestionPage>;

export const AskQuestion = z.strictObject({
  title: line(140, 8),
  /** Markdown. */
  text: passage(6000, 20),
  parts: z
    .array(z.strictObject({ partId: Id, revisionId: Id.nullable() }))
    .min(1, 'takes at least one part')
    .max(8, 'takes at most 8 parts'),
  symptoms: z.array(Slug).max(6, 'takes at most 6 symptoms'),
  readings: z.array(QuestionReading).max(20, 'takes at most 20 readings'),
  worksheet: WorksheetRecord.nullable(),
});
export type AskQuestion = z.infer<typeof AskQuestion>;

export const AddReply = z.strictObject({
  /** Markdown. */
  text: passage(4000).refine((text) => text.trim() !== '', 'is needed'),
  worksheet: WorksheetRecord.nullable(),
});
export type AddReply = z.infer<typeof AddReply>;

export const Settle = z.strictObject({ writeUpSlug: Slug, fixKey: ItemKey });
export type Settle = z.infer<typeof Settle>;

const tag = 'questions';
const bySlug = z.object({ slug: Slug });

export const questionRoutes = {
  listQuestions: route({
    method: 'get',
    path: '/api/questions',
    tag,
    access: anyone,
    summary: 'Questions, the newest first; `open` true: those that nothing has settled, false: the others',
    query: PageQuery.extend({ part: Slug.optional(), open: z.enum(['true', 'false']).optional() }),
    response: pageOf(QuestionLine),
  }),
  readQuestion: route({
    method: 'get',
    path: '/api/questions/:slug',
    tag,
    access: anyone,
    summary: 'One question with its replies, the oldest first',
    params: bySlug,
    response: QuestionPage,
    problems: ['taken-down'],
  }),
  askQuestion: route({
    method: 'post',
    path: '/api/questions',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Ask about parts of mine',
    body: AskQuestion,
    response: QuestionPage,
    problems: ['too-many-requests'],
  }),
  addReply: route({
    method: 'post',
    path: '/api/questions/:slug/replies',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Reply to a question',
    params: bySlug,
    body: AddReply,
    response: Reply,
    problems: ['too-many-requests'],
  }),
  settleQuestion: route({
    method: 'post',
    path: '/api/questions/:slug/settled',
    tag,
    access: signedIn,
    summary: 'Say which fix settled my question; the fix stands in the published edition',
    params: bySlug,
    body: Settle,
    response: QuestionPage,
  }),
  reopenQuestion: route({
    method: 'delete',
    path: '/api/questions/:slug/settled',
    tag,
    access: signedIn,
    summary: 'Say that my question is open again',
    params: bySlug,
    response: QuestionPage,
  }),
};
