import type { Callout } from '../../shared/contract/callouts.js';
import type { Acceptance } from '../../shared/contract/edition-content.js';
import type {
  Afterwards,
  FixKind,
  Instrument,
  Permanence,
  ReadingUnit,
  TrialOutcome,
} from '../../shared/contract/vocabulary.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';
import { worksheetOfLink } from '../../shared/fit/worksheet-link.js';

/** A side of a joint: `holds` and `not` are letters of revisions with blanks between them; the rest is not mentioned. */
export interface DemoSide {
  readonly part: string;
  readonly feature: string;
  readonly holds: string;
  readonly not: string;
}
export interface DemoJoint {
  readonly a: DemoSide;
  readonly b: DemoSide;
}
export interface DemoReading {
  /** `part:letter`, or empty where it belongs to no revision. */
  readonly of: string;
  readonly dimension: string;
  readonly value: number;
  readonly unit: ReadingUnit;
  readonly instrument: Instrument;
  readonly uncertainty: number | null;
}
export interface DemoTrial {
  readonly outcome: TrialOutcome;
  readonly figure: number | null;
}
export interface DemoFix {
  readonly key: string;
  readonly title: string;
  readonly kind: FixKind;
  readonly permanence: Permanence;
  readonly why: string;
  readonly tools: readonly string[];
  readonly materials: readonly string[];
  readonly steps: readonly string[];
  /** Steps (from 0) that show a drawing of the write-up (from 0). */
  readonly stepDrawings: Readonly<Record<number, number>>;
  /** `part:letters`, several joined by blanks; empty where it holds for all. */
  readonly only: readonly string[];
  readonly afterwards: readonly Afterwards[];
  readonly afterwardsNote: string;
  readonly acceptance: Acceptance | null;
  readonly worksheet: WorksheetRecord | null;
  /** Slugs of the caution library. */
  readonly cautions: readonly string[];
  readonly trials: readonly DemoTrial[];
  /** `part:letter` of the revision from which the maker has corrected the part. */
  readonly madeRight: string | null;
}
export interface DemoDrawing {
  readonly svg: string;
  readonly alt: string;
  readonly caption: string;
  readonly callouts: readonly Callout[];
}
export interface DemoContent {
  readonly title: string;
  readonly summary: string;
  readonly joints: readonly DemoJoint[];
  readonly symptoms: readonly string[];
  readonly noticed: string;
  readonly cause: string;
  readonly readings: readonly DemoReading[];
  readonly fixes: readonly DemoFix[];
  readonly drawings: readonly DemoDrawing[];
  readonly sources: string;
}
export interface DemoEdition {
  readonly by: string;
  readonly daysAgo: number;
  readonly note: string;
  readonly change: (earlier: DemoContent) => DemoContent;
  readonly state: 'draft' | 'submitted' | 'returned' | 'published';
  readonly returnReason: string | null;
}
export interface DemoWriteUp {
  /** Null for one that was never published. */
  readonly slug: string | null;
  readonly by: string;
  readonly daysAgo: number;
  readonly state: DemoEdition['state'];
  readonly returnReason: string | null;
  readonly content: DemoContent;
  readonly later: readonly DemoEdition[];
  /** Library cautions on the whole write-up. */
  readonly cautions: readonly string[];
}

/** `side('tarn-m1', 'recess round the shaft', 'C D', 'A')`. */
export const side = (part: string, feature: string, holds: string, not = ''): DemoSide => ({
  part,
  feature,
  holds,
  not,
});
export const joint = (a: DemoSide, b: DemoSide): DemoJoint => ({ a, b });

/** A reading in millimetres with a caliper (standard uncertainty 0.02 mm) unless said otherwise. */
export const read = (
  of: string,
  dimension: string,
  value: number,
  unit: ReadingUnit = 'mm',
  instrument: Instrument = 'caliper',
  uncertainty: number | null = unit === 'mm' && instrument === 'caliper' ? 0.02 : null,
): DemoReading => ({ of, dimension, value, unit, instrument, uncertainty });

export const atMost = (quantity: string, value: number, unit: ReadingUnit): Acceptance => ({
  quantity,
  comparison: 'at-most',
  value,
  unit,
});
export const atLeast = (quantity: string, value: number, unit: ReadingUnit): Acceptance => ({
  quantity,
  comparison: 'at-least',
  value,
  unit,
});

interface FixParts {
  why: string;
  tools?: string;
  materials?: string;
  steps: string[];
  shows?: Record<number, number>;
  only?: string[];
  after?: Afterwards[];
  note?: string;
  accept?: Acceptance;
  /** Address of a worksheet, which is run when the demo is made. */
  sheet?: string;
  cautions?: string;
  /** Trials as words: h held, w held for a while, n did not help, each with its figure if there is one: "h0.05 h w n1.2". */
  trials?: string;
  madeRight?: string;
}

/** A remedy; lists of tools and materials are split at semicolons, cautions at blanks. */
export function fix(
  key: string,
  title: string,
  kind: FixKind,
  permanence: Permanence,
  parts: FixParts,
): DemoFix {
  return {
    key,
    title,
    kind,
    permanence,
    why: parts.why,
    tools: listed(parts.tools, ';'),
    materials: listed(parts.materials, ';'),
    steps: parts.steps,
    stepDrawings: parts.shows ?? {},
    only: parts.only ?? [],
    afterwards: parts.after ?? [],
    afterwardsNote: parts.note ?? '',
    acceptance: parts.accept ?? null,
    worksheet: parts.sheet === undefined ? null : sheet(parts.sheet),
    cautions: listed(parts.cautions, ' '),
    trials: listed(parts.trials, ' ').map(trial),
    madeRight: parts.madeRight ?? null,
  };
}

function sheet(link: string): WorksheetRecord {
  const read = worksheetOfLink(link);
  if (!('record' in read)) throw new Error(`The demo's worksheet ${link}: ${read.refusal}`);
  return read.record;
}

const outcomes: Record<string, TrialOutcome> = { h: 'held', w: 'held-for-a-while', n: 'did-not-help' };
function trial(word: string): DemoTrial {
  const outcome = outcomes[word.charAt(0)];
  if (!outcome) throw new Error(`A trial starts with h, w or n, not “${word}”.`);
  return { outcome, figure: word.length > 1 ? Number(word.slice(1)) : null };
}
const listed = (text: string | undefined, separator: string): string[] =>
  (text ?? '')
    .split(separator)
    .map((item) => item.trim())
    .filter((item) => item !== '');

/** A drawing of the write-up with what is drawn on it in turn. */
export const drawing = (
  svg: string,
  alt: string,
  caption: string,
  callouts: readonly Callout[] = [],
): DemoDrawing => ({ svg, alt, caption, callouts });

interface WriteUpParts extends Omit<DemoContent, 'title' | 'symptoms' | 'sources'> {
  by: string;
  daysAgo: number;
  symptoms: string;
  sources?: string;
  later?: DemoEdition[];
  cautions?: string;
}

const practice = 'Figures: the author’s own readings. Method: common practice, no source.';

/** A published write-up; `symptoms` and `cautions` are slugs with blanks between them. */
export function writeUp(slug: string, title: string, parts: WriteUpParts): DemoWriteUp {
  return { slug, state: 'published', returnReason: null, ...shared(title, parts) };
}

/** One that has not been published: a draft, on the desk, or returned with a reason. */
export function unpublished(
  state: 'draft' | 'submitted' | 'returned',
  title: string,
  parts: WriteUpParts,
  returnReason: string | null = null,
): DemoWriteUp {
  return { slug: null, state, returnReason, ...shared(title, parts) };
}

function shared(
  title: string,
  parts: WriteUpParts,
): Pick<DemoWriteUp, 'by' | 'daysAgo' | 'content' | 'later' | 'cautions'> {
  const { by, daysAgo, later, cautions, symptoms, sources, ...rest } = parts;
  return {
    by,
    daysAgo,
    later: later ?? [],
    cautions: listed(cautions, ' '),
    content: { ...rest, title, symptoms: listed(symptoms, ' '), sources: sources ?? practice },
  };
}

/** A later edition, made from the one before it. */
export const edition = (
  by: string,
  daysAgo: number,
  note: string,
  change: DemoEdition['change'],
  state: DemoEdition['state'] = 'published',
): DemoEdition => ({ by, daysAgo, note, change, state, returnReason: null });

/** The same content with one fix written anew; throws when there is no such fix. */
export function withFix(content: DemoContent, key: string, change: Partial<DemoFix>): DemoContent {
  if (!content.fixes.some((item) => item.key === key))
    throw new Error(`There is no fix “${key}” in “${content.title}”.`);
  return {
    ...content,
    fixes: content.fixes.map((item) => (item.key === key ? { ...item, ...change } : item)),
  };
}
