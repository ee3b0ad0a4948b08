import { normalDensity } from '../statistics/normal-distribution.js';

/** A revision as far as its chance before any question depends on it; days as ISO 8601. */
export interface KnownRevision {
  readonly id: number;
  readonly soldFrom: string | null;
  readonly soldTo: string | null;
}

/** A dimension whose consensus is known on some revisions; one unit throughout. */
export interface KnownDimension {
  readonly key: string;
  /** Standard uncertainty of one reading with the usual instrument, for weighing the question before it is asked. */
  readonly usualUncertainty: number;
  readonly revisions: readonly {
    readonly revisionId: number;
    readonly mean: number;
    readonly predictionSpread: number;
  }[];
}

/** Something that can be seen, and on which revisions. */
export interface KnownMark {
  readonly key: string;
  readonly revisions: readonly { readonly revisionId: number; readonly shows: boolean }[];
}

export interface RevisionKnowledge {
  readonly revisions: readonly KnownRevision[];
  readonly dimensions: readonly KnownDimension[];
  readonly marks: readonly KnownMark[];
  /** Up to which day a revision that is still sold counts. */
  readonly asOf: string;
}

/** What the reader said to a question, by the key of its mark or dimension. */
export type RevisionAnswer =
  | { readonly key: string; readonly shows: boolean }
  | { readonly key: string; readonly value: number; readonly uncertainty: number }
  | { readonly key: string; readonly cannotTell: true };

export interface WhichRevision {
  /** In the order of the revisions given; they add up to 1. */
  readonly chances: readonly { readonly revisionId: number; readonly chance: number }[];
  readonly prior: 'even' | 'months-sold';
  /** Key of the question that narrows most, and by how many bits it may be expected to; null where none would narrow. */
  readonly next: { readonly key: string; readonly bits: number } | null;
  /** Keys of readings that suit no revision: mistyped, or a revision that is not in the catalogue. */
  readonly strange: readonly string[];
}

/** Chance that somebody misreads a mark; common practice, no source. */
export const markSlip = 0.02;
/** From this chance on the revision counts as found; common practice, no source. */
export const foundAt = 0.95;
/** A question that is expected to narrow by less is not asked; common practice, no source. */
const leastBits = 0.01;
/** A reading further than this many scales from every revision is strange. */
const strangeAt = 4;
/** How closely the integral over a reading not yet taken is sampled: points a component, out to so many scales. */
const points = 49;
const reach = 6;

/**
 * Which revision somebody holds, by Bayes' theorem: P(r | answers) ∝ P(r) · Π L(answer | r).
 *
 * P(r), before any answer: by months sold where every revision's first day is known, since more months put more parts on
 * benches (no sales figures are known), at least one month each; even otherwise. L of a mark: 0.98 where the revision
 * is known to show what was answered, 0.02 where not. L of a reading y with standard uncertainty u: normal density at y with mean and
 * variance (predictionSpread² + u²) of the revision's consensus. Answers count as independent given the revision.
 *
 * A revision of which the catalogue does not know an answer is neither helped nor hurt by it: its L is the mean of the
 * others', weighted by their chances at that point, which leaves its chance where it was. Such answers therefore go in one after the other, those
 * that all revisions know first, else in the order of the questions given.
 *
 * Next question: the one with the largest expected loss of entropy H = −Σ p log₂ p, in bits (the information its answer gives
 * on the revision; D. V. Lindley, Annals of Mathematical Statistics 27 (1956), 986). A mark has two answers; a reading's is
 * integrated by the midpoint rule over each revision's density. Ties go to marks, then to the order given; so the
 * same answers always lead to the same question. Throws RangeError without revisions or for an uncertainty that is not
 * positive. Cost: O(questions · revisions² · 49).
 */
export function whichRevision(
  knowledge: RevisionKnowledge,
  answers: readonly RevisionAnswer[],
): WhichRevision {
  const { revisions } = knowledge;
  if (revisions.length === 0) throw new RangeError('At least one revision is needed.');
  const prior = priorOf(knowledge);
  const given = new Map(answers.map((answer) => [answer.key, answer]));
  const strange: string[] = [];
  const evidence: (readonly (number | null)[])[] = [];
  for (const mark of knowledge.marks) {
    const answer = given.get(mark.key);
    if (answer && 'shows' in answer) evidence.push(markLikelihoods(mark, revisions, answer.shows));
  }
  for (const dimension of knowledge.dimensions) {
    const answer = given.get(dimension.key);
    if (!answer || !('value' in answer)) continue;
    if (!(answer.uncertainty > 0)) throw new RangeError('The uncertainty of a reading is more than zero.');
    const scaled = likelihoodsOf(dimension, revisions, answer.value, answer.uncertainty);
    if (scaled.nearest > strangeAt) strange.push(dimension.key);
    evidence.push(scaled.likelihoods);
  }
  const complete = (likelihoods: readonly (number | null)[]): boolean => !likelihoods.includes(null);
  const inOrder = [...evidence.filter(complete), ...evidence.filter((entry) => !complete(entry))];
  const chances = inOrder.reduce<readonly number[]>(updated, prior.chances);
  return {
    chances: revisions.map(({ id }, index) => ({ revisionId: id, chance: chances[index]! })),
    prior: prior.kind,
    next: nextQuestion(knowledge, chances, given),
    strange,
  };
}

/** Entropy in bits; 0 where one chance is 1. */
export function entropyOf(chances: readonly number[]): number {
  return chances.reduce((sum, chance) => (chance > 0 ? sum - chance * Math.log2(chance) : sum), 0);
}

function priorOf({ revisions, asOf }: RevisionKnowledge): {
  kind: WhichRevision['prior'];
  chances: readonly number[];
} {
  if (revisions.some((revision) => revision.soldFrom === null)) {
    return { kind: 'even', chances: revisions.map(() => 1 / revisions.length) };
  }
  const months = revisions.map(({ soldFrom, soldTo }) =>
    Math.max(1, monthsBetween(soldFrom!, soldTo !== null && soldTo < asOf ? soldTo : asOf)),
  );
  return { kind: 'months-sold', chances: normalized(months) };
}

/** Months of 365.25/12 days between two days; negative where the second comes first. */
function monthsBetween(from: string, to: string): number {
  return (Date.parse(to) - Date.parse(from)) / (86_400_000 * (365.25 / 12));
}

function markLikelihoods(
  mark: KnownMark,
  revisions: readonly KnownRevision[],
  answer: boolean,
): (number | null)[] {
  return revisions.map(({ id }) => {
    const known = mark.revisions.find((entry) => entry.revisionId === id);
    return known ? (known.shows === answer ? 1 - markSlip : markSlip) : null;
  });
}

/** Likelihoods relative to the largest, so that none is lost where all are tiny; and how many scales off the nearest is. */
function likelihoodsOf(
  dimension: KnownDimension,
  revisions: readonly KnownRevision[],
  value: number,
  uncertainty: number,
): { likelihoods: (number | null)[]; nearest: number } {
  let nearest = Infinity;
  const logs = revisions.map(({ id }) => {
    const known = dimension.revisions.find((entry) => entry.revisionId === id);
    if (!known) return null;
    const scale = Math.hypot(known.predictionSpread, uncertainty);
    const distance = Math.abs(value - known.mean) / scale;
    nearest = Math.min(nearest, distance);
    return -Math.log(scale) - (distance * distance) / 2;
  });
  const largest = Math.max(...logs.flatMap((log) => (log === null ? [] : [log])));
  return { likelihoods: logs.map((log) => (log === null ? null : Math.exp(log - largest))), nearest };
}

function updated(chances: readonly number[], likelihoods: readonly (number | null)[]): readonly number[] {
  let weight = 0;
  let total = 0;
  chances.forEach((chance, index) => {
    const likelihood = likelihoods[index] ?? null;
    if (likelihood === null) return;
    weight += chance;
    total += chance * likelihood;
  });
  // Every revision that the answer speaks of is ruled out already: it moves nothing.
  if (!(total > 0)) return chances;
  return normalized(chances.map((chance, index) => chance * (likelihoods[index] ?? total / weight)));
}

function normalized(weights: readonly number[]): number[] {
  const sum = weights.reduce((total, weight) => total + weight, 0);
  return weights.map((weight) => weight / sum);
}

function nextQuestion(
  { revisions, marks, dimensions }: RevisionKnowledge,
  chances: readonly number[],
  given: ReadonlyMap<string, RevisionAnswer>,
): WhichRevision['next'] {
  const open = <Question extends { key: string }>(list: readonly Question[]): Question[] =>
    list.filter((question) => !given.has(question.key));
  const questions = [
    ...open(marks).map((mark) => ({ key: mark.key, bits: bitsOfMark(mark, revisions, chances) })),
    ...open(dimensions).map((dimension) => ({
      key: dimension.key,
      bits: bitsOfReading(dimension, revisions, chances),
    })),
  ];
  let best: WhichRevision['next'] = null;
  for (const question of questions) {
    if (question.bits >= leastBits && question.bits > (best?.bits ?? 0) + 1e-9) best = question;
  }
  return best;
}

function bitsOfMark(
  mark: KnownMark,
  revisions: readonly KnownRevision[],
  chances: readonly number[],
): number {
  const expected = [true, false].map((answer) => {
    const likelihoods = markLikelihoods(mark, revisions, answer);
    return predictive(chances, likelihoods) * entropyOf(updated(chances, likelihoods));
  });
  return entropyOf(chances) - expected[0]! - expected[1]!;
}

/** Chance of an answer, from the revisions that are known to give it or not. */
function predictive(chances: readonly number[], likelihoods: readonly (number | null)[]): number {
  let weight = 0;
  let total = 0;
  chances.forEach((chance, index) => {
    const likelihood = likelihoods[index] ?? null;
    if (likelihood === null) return;
    weight += chance;
    total += chance * likelihood;
  });
  return weight > 0 ? total / weight : 1 / 2;
}

function bitsOfReading(
  dimension: KnownDimension,
  revisions: readonly KnownRevision[],
  chances: readonly number[],
): number {
  const components = dimension.revisions.flatMap(({ revisionId, mean, predictionSpread }) => {
    const index = revisions.findIndex((revision) => revision.id === revisionId);
    const scale = Math.hypot(predictionSpread, dimension.usualUncertainty);
    return index < 0 ? [] : [{ mean, scale, chance: chances[index]! }];
  });
  const known = components.reduce((sum, component) => sum + component.chance, 0);
  if (!(known > 0)) return 0;
  const step = (2 * reach) / points;
  let expected = 0;
  let mass = 0;
  for (const { mean, scale, chance } of components) {
    for (let point = 0; point < points; point += 1) {
      const z = -reach + (point + 0.5) * step;
      const weight = (chance / known) * normalDensity(z) * step;
      const { likelihoods } = likelihoodsOf(
        dimension,
        revisions,
        mean + z * scale,
        dimension.usualUncertainty,
      );
      expected += weight * entropyOf(updated(chances, likelihoods));
      mass += weight;
    }
  }
  return entropyOf(chances) - expected / mass;
}
