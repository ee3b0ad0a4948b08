import type { EditionContent, JointSide } from '../../shared/contract/edition-content.js';
import { emptyContent } from '../../shared/contract/edition-content.js';
import type { QuestionReading } from '../../shared/contract/questions.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';

export interface AnsweredQuestion {
  readonly slug: string;
  readonly title: string;
  readonly text: string;
  readonly askedBy: string;
  readonly parts: readonly { readonly partId: number; readonly revisionId: number | null }[];
  readonly symptoms: readonly string[];
  readonly readings: readonly QuestionReading[];
}

export interface AnsweringReply {
  readonly text: string;
  readonly worksheet: WorksheetRecord | null;
  readonly repliedBy: string;
  /** Calendar day, ISO 8601. */
  readonly day: string;
  /** Photos that the draft's author may use, with their alternative texts. */
  readonly photos: readonly { readonly photoId: number; readonly alt: string }[];
}

/**
 * The text of a draft as far as a question and the reply to it give it: the first two parts are the sides of its joint, what
 * the reply says first is taken for the cause, what follows for the fix; a reply of one paragraph is all fix. `newKey` makes
 * keys of readings and fixes. The rest is the author's to write.
 */
export function draftContent(
  question: AnsweredQuestion,
  reply: AnsweringReply,
  newKey: () => string,
): EditionContent {
  const [first, ...following] = paragraphsOf(reply.text);
  const onlyOne = following.length === 0;
  return {
    ...emptyContent,
    title: question.title,
    joints: jointsOf(question.parts),
    symptoms: [...question.symptoms],
    noticed: question.text,
    cause: onlyOne ? '' : first!,
    readings: question.readings.map((reading) => ({
      key: newKey(),
      revisionId: null,
      dimension: reading.dimension,
      value: reading.value,
      unit: reading.unit,
      instrument: reading.instrument,
      uncertainty: null,
    })),
    fixes: [
      {
        key: newKey(),
        title: '',
        kind: null,
        permanence: null,
        why: onlyOne ? (first ?? '') : following.join('\n\n'),
        tools: [],
        materials: [],
        steps: [],
        revisionIds: [],
        afterwards: [],
        afterwardsNote: '',
        acceptance: null,
        worksheet: reply.worksheet,
      },
    ],
    photos: reply.photos.map(({ photoId, alt }) => ({ photoId, alt, caption: '', callouts: [] })),
    sources: creditOf(question, reply),
  };
}

function creditOf(question: AnsweredQuestion, reply: AnsweringReply): string {
  const link = `[${escaped(question.title)}](/questions/${question.slug})`;
  return `From the reply of ${escaped(reply.repliedBy)} (${reply.day}) to the question ${link}. What is noticed and the readings: ${escaped(question.askedBy)}.`;
}

/** Names and titles are plain text: nothing in them is Markdown. */
function escaped(text: string): string {
  return text.replace(/[\\`*_{}[\]()<>#+.!|~&-]/g, '\\$&');
}

function paragraphsOf(text: string): string[] {
  return text
    .replace(/\r\n?/g, '\n')
    .split(/\n[ \t]*\n+/)
    .map((paragraph) => paragraph.trim())
    .filter((paragraph) => paragraph !== '');
}

function jointsOf(parts: AnsweredQuestion['parts']): EditionContent['joints'] {
  const each = new Map<number, JointSide>();
  for (const { partId, revisionId } of parts) {
    const side = each.get(partId) ?? { partId, feature: '', revisions: [] };
    const marks = revisionId === null ? [] : [{ revisionId, holds: true }];
    each.set(partId, { ...side, revisions: [...side.revisions, ...marks] });
  }
  const [a, b] = [...each.values()];
  if (!a) return [];
  return [{ a, b: b ?? { partId: null, feature: '', revisions: [] } }];
}
