import { z } from 'zod';
import { PartRef, RevisionRef, Symptom } from './hardware.js';
import { JointRef } from './joints.js';
import { Photo } from './photos.js';
import { Id, IdText, Instant, ItemKey, PageQuery, Slug, line, pageOf, passage } from './primitives.js';
import { anyone, route, signedIn } from './route.js';
import { Instrument, ReadingUnit } from './vocabulary.js';
import { TakenDown } from './taken-down.js';
import { WorksheetRecord } from './worksheet.js';
import { PersonRef, RichText, TrialReport } from './write-ups.js';

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

export const WriteUpRef = z.object({ slug: Slug, title: z.string() });
export type WriteUpRef = z.infer<typeof WriteUpRef>;

export const Reply = z.object({
  id: Id,
  text: RichText,
  worksheet: WorksheetRecord.nullable(),
  photos: z.array(Photo),
  person: PersonRef,
  createdAt: Instant,
  /** When its writer last changed its words. */
  changedAt: Instant.nullable(),
  /** The write-up that was made from it, once that is published. */
  writeUp: WriteUpRef.nullable(),
  /** Only its writer and moderators are given a reply that is taken down. */
  takenDown: TakenDown.nullable(),
});
export type Reply = z.infer<typeof Reply>;

export const QuestionPage = QuestionLine.extend({
  id: Id,
  text: RichText,
  symptoms: z.array(Symptom),
  readings: z.array(QuestionReading),
  worksheet: WorksheetRecord.nullable(),
  photos: z.array(Photo),
  /** When its asker last changed its words or readings. */
  changedAt: Instant.nullable(),
  /**
   * Published write-ups on its parts: what settled it, what was made from a reply, then those on a joint of its parts (on
   * its one part) with a symptom of it, where it names symptoms.
   */
  writeUps: z.array(WriteUpRef),
  /** Oldest first. */
  replies: z.array(Reply),
  /** Only its asker and moderators are given a question that is taken down; others get 410. */
  takenDown: TakenDown.nullable(),
});
export type QuestionPage = z.infer<typeof QuestionPage>;

export const mostQuestionPhotos = 6;

/** Photos of the writer's own, by identity. */
const OwnPhotos = z
  .array(Id)
  .max(mostQuestionPhotos, `takes at most ${mostQuestionPhotos} photos`)
  .refine((ids) => new Set(ids).size === ids.length, 'names a photo twice')
  .default([]);

const title = line(140, 8);
/** Markdown. */
const askedText = passage(6000, 20);
/** Markdown. */
const replyText = passage(4000).refine((text) => text.trim() !== '', 'is needed');
const Readings = z.array(QuestionReading).max(20, 'takes at most 20 readings');

export const AskQuestion = z.strictObject({
  title,
  text: askedText,
  parts: z
    .array(z.strictObject({ partId: Id, revisionId: Id.nullable() }))
    .min(1, 'takes at least one part')
    .max(8, 'takes at most 8 parts'),
  symptoms: z.array(Slug).max(6, 'takes at most 6 symptoms'),
  readings: Readings,
  worksheet: WorksheetRecord.nullable(),
  photos: OwnPhotos,
});
export type AskQuestion = z.infer<typeof AskQuestion>;

export const AddReply = z.strictObject({
  text: replyText,
  worksheet: WorksheetRecord.nullable(),
  photos: OwnPhotos,
});
export type AddReply = z.infer<typeof AddReply>;

/** What its asker changes of a question; what is left out stays. */
export const ChangeQuestion = z.strictObject({
  title: title.optional(),
  text: askedText.optional(),
  readings: Readings.optional(),
});
export type ChangeQuestion = z.infer<typeof ChangeQuestion>;

export const ChangeReply = z.strictObject({ text: replyText });
export type ChangeReply = z.infer<typeof ChangeReply>;

export const Settle = z.strictObject({
  writeUpSlug: Slug,
  fixKey: ItemKey,
  /** The asker's own trial of that fix, reported in the same step. */
  trial: TrialReport.omit({ fixKey: true }).nullable().default(null),
});
export type Settle = z.infer<typeof Settle>;

const tag = 'questions';
const bySlug = z.object({ slug: Slug });
const byId = z.object({ id: IdText });

export const questionRoutes = {
  listQuestions: route({
    method: 'get',
    path: '/api/questions',
    tag,
    access: anyone,
    summary:
      'Questions, the newest first; `open` true: those that nothing has settled, false: the others; `q`: every word of it stands in the title or the text, or begins a word there',
    query: PageQuery.extend({
      part: Slug.optional(),
      q: line(200).optional(),
      open: z.enum(['true', 'false']).optional(),
    }),
    response: pageOf(QuestionLine),
  }),
  listAlike: route({
    method: 'get',
    path: '/api/question-alike',
    tag,
    access: anyone,
    summary:
      'What is like a question that is being written: questions by how many of its parts they share, then by how well their words match, then the newest; and the known joints between its parts',
    query: z.strictObject({
      q: z.string().trim().max(400, 'takes at most 400 characters').default(''),
      part: z.array(IdText).max(8, 'takes at most 8 parts').default([]),
    }),
    response: z.object({ questions: z.array(QuestionLine), joints: z.array(JointRef) }),
  }),
  listCovered: route({
    method: 'get',
    path: '/api/write-ups/:slug/questions',
    tag,
    access: anyone,
    summary: 'Questions that a write-up settled or was made from, the newest first',
    params: bySlug,
    response: z.object({ items: z.array(QuestionLine) }),
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
  changeQuestion: route({
    method: 'patch',
    path: '/api/questions/:slug',
    tag,
    access: signedIn,
    summary: 'Change the words or readings of my question',
    params: bySlug,
    body: ChangeQuestion,
    response: QuestionPage,
  }),
  changeReply: route({
    method: 'patch',
    path: '/api/replies/:id',
    tag,
    access: signedIn,
    summary: 'Change the words of my reply',
    params: byId,
    body: ChangeReply,
    response: Reply,
  }),
  draftFromReply: route({
    method: 'post',
    path: '/api/replies/:id/draft',
    tag,
    access: signedIn,
    status: 201,
    summary:
      'Start a write-up from a reply of mine (a moderator: from any), with the parts, symptoms and readings of the question and credit for both; a draft of it that is under way is given back instead of a second one',
    params: byId,
    response: z.object({ draftId: Id }),
    problems: ['already-there'],
  }),
  settleQuestion: route({
    method: 'post',
    path: '/api/questions/:slug/settled',
    tag,
    access: signedIn,
    summary:
      'Say which fix of a published edition settled my question and, if I wish, report my trial of it in the same step',
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
