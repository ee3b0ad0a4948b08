import { lettersOf } from './resolve-content.js';
import { pick, shuffled } from './random.js';
import { bracketQuestions } from './questions/brackets.js';
import { cameraQuestions } from './questions/cameras.js';
import { driveQuestions } from './questions/drives.js';
import type { QuestionFamily } from './questions/family.js';
import { spacerQuestions } from './questions/spacers.js';
import { unansweredQuestions, type SingleQuestion } from './questions/unanswered.js';
import type { DemoReading, DemoWriteUp } from './write-up-shape.js';
import type { QuestionReading } from '../../shared/contract/questions.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';

export const questionFamilies: readonly QuestionFamily[] = [
  ...driveQuestions,
  ...bracketQuestions,
  ...cameraQuestions,
  ...spacerQuestions,
];

export interface PlannedReply {
  readonly by: string;
  readonly text: string;
  readonly worksheet: WorksheetRecord | null;
  /** After the question, in hours. */
  readonly after: number;
}

export interface PlannedQuestion {
  readonly by: string;
  readonly title: string;
  readonly text: string;
  /** `part:letter`, or the part alone where the revision is not known. */
  readonly parts: readonly string[];
  readonly symptoms: readonly string[];
  readonly readings: readonly QuestionReading[];
  readonly daysAgo: number;
  /** The fix of the write-up that settled it. */
  readonly settledBy: { readonly writeUp: string; readonly fixKey: string } | null;
  readonly replies: readonly PlannedReply[];
}

const openings = [
  'Bought used last month, so I cannot say what was done to it before.',
  'Second night with the new parts.',
  'It worked on the old telescope and does not on this one.',
  'I have read the leaflet twice.',
  'For a friend, who has the telescope; I have the caliper.',
];
const thanks = [
  'That was it. Thank you, I have an evening back.',
  'Done as you say, and it holds so far.',
  'Tried it on the bench first, then outside: settled.',
  'It took half an hour. I should have asked earlier.',
];
const longestAgo = 700;
/** Of the questions on a write-up; with those on which nothing is written some six in ten of all are settled. */
const settledShare = 0.7;

/** Every question of the demo, the oldest first; the same in every run. `people` may ask and reply. */
export function planQuestions(
  writeUps: readonly DemoWriteUp[],
  people: readonly string[],
  next: () => number,
): PlannedQuestion[] {
  const onWriteUps = questionFamilies.flatMap((family) => {
    const writeUp = writeUps.find(({ slug }) => slug === family.writeUp);
    if (!writeUp) throw new Error(`The demo asks about “${family.writeUp}”, which nobody has written.`);
    return family.titles.map((_, index) => plan(family, index, writeUp, people, next));
  });
  const others = unansweredQuestions.map((question) => planSingle(question, people, next));
  return [...onWriteUps, ...others].sort((one, other) => other.daysAgo - one.daysAgo);
}

function plan(
  family: QuestionFamily,
  index: number,
  writeUp: DemoWriteUp,
  people: readonly string[],
  next: () => number,
): PlannedQuestion {
  const [asker, helper, third] = shuffled(
    people.filter((key) => key !== writeUp.by),
    next,
  ) as [string, string, string];
  const [fixKey, answer] = pick(Object.entries(family.answers), next);
  const settled = next() < settledShare;
  const answered = settled || next() < 0.5;
  const fix = writeUp.content.fixes.find(({ key }) => key === fixKey);
  if (!fix) throw new Error(`The demo answers with “${fixKey}”, which is no fix of “${family.writeUp}”.`);
  const replies: PlannedReply[] = [];
  const say = (by: string, text: string, worksheet: WorksheetRecord | null = null): void => {
    const after = (replies.at(-1)?.after ?? 0) + 2 + 60 * next();
    replies.push({ by, text, worksheet, after });
  };
  if (!settled || next() < 0.5) say(third, family.asides[index % family.asides.length]!);
  if (answered) say(next() < 0.4 ? writeUp.by : helper, answer, fix.worksheet);
  if (settled && next() < 0.7) say(asker, pick(thanks, next));
  return {
    by: asker,
    title: family.titles[index]!,
    text: textOf(family, index, next),
    parts: partsOf(writeUp, next),
    symptoms: writeUp.content.symptoms.slice(0, 1 + (index % 2)),
    readings: writeUp.content.readings.slice(0, 3).map((reading) => readAgain(reading, next)),
    daysAgo: Math.min(longestAgo, writeUp.daysAgo) * (0.02 + 0.9 * next()),
    settledBy: settled ? { writeUp: family.writeUp, fixKey } : null,
    replies,
  };
}

function planSingle(
  question: SingleQuestion,
  people: readonly string[],
  next: () => number,
): PlannedQuestion {
  const [asker, ...others] = shuffled(people, next) as [string, ...string[]];
  return {
    by: asker,
    title: question.title,
    text: question.text,
    parts: question.parts,
    symptoms: question.symptoms.split(' '),
    readings: question.reading
      ? [{ dimension: question.reading[0], value: question.reading[1], unit: 'mm', instrument: 'caliper' }]
      : [],
    daysAgo: 2 + 400 * next(),
    settledBy: null,
    replies: question.replies.map((text, index) => ({
      by: others[index]!,
      text,
      worksheet: null,
      after: 5 + 40 * (index + next()),
    })),
  };
}

function textOf(family: QuestionFamily, index: number, next: () => number): string {
  const opening = next() < 0.4 ? [pick(openings, next)] : [];
  const notice = family.notices[index % family.notices.length]!;
  const tried = family.tried[index % family.tried.length]!;
  return `${[...opening, notice].join(' ')}\n\n${tried}`;
}

/** Both sides of the write-up's joint, with a revision for which it holds; some askers do not know theirs. */
function partsOf(writeUp: DemoWriteUp, next: () => number): string[] {
  const { a, b } = writeUp.content.joints[0]!;
  return [a, b].map(({ part, holds }) => (next() < 0.2 ? part : pick(lettersOf(`${part}:${holds}`), next)));
}

/** The author's reading as the asker took it: a few hundredths off in mm, a few per cent else. */
function readAgain({ dimension, value, unit, instrument }: DemoReading, next: () => number): QuestionReading {
  const off = next() - 0.5;
  const read = unit === 'mm' ? value + 0.08 * off : value * (1 + 0.08 * off);
  const digits = unit === 'steps' || unit === 'um' || value >= 200 ? 0 : unit === 'mm' ? 2 : 1;
  return { dimension, value: Number(read.toFixed(digits)), unit, instrument };
}
