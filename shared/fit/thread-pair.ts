import { figure, checkDimension, type Dimension, type Figure } from './dimension.js';
import { chancePositive, type SeatVerdict } from './verdict.js';

/** ISO metric thread as written on drawings: M, nominal diameter, pitch (both mm). */
export interface MetricThread {
  readonly diameter: number;
  readonly pitch: number;
  /** d2 = d − 0.6495191·P (ISO 724). */
  readonly pitchDiameter: number;
  /** D1 = d − 1.0825318·P (ISO 724), the least inner diameter of the nut. */
  readonly minorDiameter: number;
}

/** Coarse pitches (ISO 262), taken where a designation names none. */
const coarsePitch: Record<string, number> = {
  '2': 0.4,
  '2.5': 0.45,
  '3': 0.5,
  '4': 0.7,
  '5': 0.8,
  '6': 1,
  '8': 1.25,
  '10': 1.5,
  '12': 1.75,
};

/**
 * Reads "M48x0.75", "M48 × 0,75" or "M3" (coarse pitch by ISO 262 for M2 to M12).
 * RangeError for anything else.
 */
export function readMetricThread(designation: string): MetricThread {
  const match = /^\s*M\s*(\d+(?:[.,]\d+)?)\s*(?:[x×*]\s*(\d+(?:[.,]\d+)?))?\s*$/i.exec(designation);
  const diameter = match ? Number(match[1]!.replace(',', '.')) : NaN;
  const pitch = match?.[2] ? Number(match[2].replace(',', '.')) : coarsePitch[String(diameter)];
  if (!match || pitch === undefined || !(pitch > 0) || !(diameter > pitch * 1.0825318)) {
    throw new RangeError(
      `“${designation}” is not a metric thread such as M48x0.75, or its pitch is missing.`,
    );
  }
  return {
    diameter,
    pitch,
    pitchDiameter: diameter - 0.6495191 * pitch,
    minorDiameter: diameter - 1.0825318 * pitch,
  };
}

export interface ThreadSide {
  readonly designation: string | null;
  readonly sex: 'male' | 'female' | null;
  /** Length of a male thread, depth of a female one, mm. */
  readonly length: Dimension | null;
}

export interface ThreadPairResult {
  readonly verdict: SeatVerdict;
  readonly trouble: 'other-diameter' | 'other-pitch' | 'same-sex' | 'bottoms' | null;
  /** Turns of thread in mesh times pitch: the smaller of male length and female depth, mm. */
  readonly engagement: Figure | null;
  /** Female depth minus male length, mm; negative when it bottoms. */
  readonly depthSpare: Figure | null;
  /** Stand-off between the shoulders when it bottoms, mm. */
  readonly standOff: Figure | null;
  readonly chance: number | null;
  /** Fewer than three turns in mesh hold badly; common practice, no source. */
  readonly fewTurns: boolean;
  readonly missing: readonly (
    'a.designation' | 'b.designation' | 'a.sex' | 'b.sex' | 'a.length' | 'b.length'
  )[];
}

/**
 * Two metric threads: same diameter and pitch, one male and one female, and whether the male one bottoms before the
 * shoulders meet. Without lengths the pair is judged on the designation alone and the lengths are named in `missing`.
 * RangeError for a designation that cannot be read.
 */
export function judgeThreadPair(a: ThreadSide, b: ThreadSide): ThreadPairResult {
  const missing = (
    [
      ['a.designation', a.designation],
      ['b.designation', b.designation],
      ['a.sex', a.sex],
      ['b.sex', b.sex],
      ['a.length', a.length],
      ['b.length', b.length],
    ] as const
  ).flatMap(([name, value]) => (value === null ? [name] : []));
  const nothing = { engagement: null, depthSpare: null, standOff: null, fewTurns: false, missing };
  if (a.designation === null || b.designation === null || a.sex === null || b.sex === null) {
    return { verdict: 'not-known', trouble: null, chance: null, ...nothing };
  }
  const [one, other] = [readMetricThread(a.designation), readMetricThread(b.designation)];
  const trouble =
    a.sex === b.sex
      ? 'same-sex'
      : one.diameter !== other.diameter
        ? 'other-diameter'
        : one.pitch !== other.pitch
          ? 'other-pitch'
          : null;
  if (trouble) return { verdict: 'will-not-seat', trouble, chance: 0, ...nothing };
  const [male, female] = a.sex === 'male' ? [a.length, b.length] : [b.length, a.length];
  if (!male || !female) return { verdict: 'seats-with-room', trouble: null, chance: 1, ...nothing };
  checkDimension(male, 'the length of the male thread');
  checkDimension(female, 'the depth of the female thread');
  const depthSpare = figure(female.value - male.value, Math.hypot(female.uncertainty, male.uncertainty));
  const shorter = male.value <= female.value ? male : female;
  const chance = chancePositive(depthSpare);
  const bottoms = chance < 0.5;
  return {
    verdict: chance >= 0.95 ? 'seats-with-room' : chance <= 0.05 ? 'will-not-seat' : 'tight',
    trouble: bottoms ? 'bottoms' : null,
    engagement: figure(shorter.value, shorter.uncertainty),
    depthSpare,
    standOff: bottoms ? figure(-depthSpare.value, depthSpare.uncertainty) : figure(0, 0),
    chance,
    fewTurns: shorter.value < 3 * one.pitch,
    missing,
  };
}
