/**
 * ISO 286 limits for nominal sizes up to 120 mm and the classes met between turned telescope parts.
 * Source of the figures: ISO 286-2:2010 as reprinted in JIS B 0401 tables (Miki Pulley "Fitting Tolerances",
 * Sakagami "Regular fit tolerance") and Machine Drawing, table 15.2. Deviations in µm, sizes in mm.
 */

/** Upper ends of the size steps; a step reads "over … up to and including …". */
const steps = [3, 6, 10, 18, 30, 50, 80, 120] as const;

/** Standard tolerances IT5 to IT11 for each step, µm (ISO 286-1:2010, table 1). */
const grades: Record<number, readonly number[]> = {
  5: [4, 5, 6, 8, 9, 11, 13, 15],
  6: [6, 8, 9, 11, 13, 16, 19, 22],
  7: [10, 12, 15, 18, 21, 25, 30, 35],
  8: [14, 18, 22, 27, 33, 39, 46, 54],
  9: [25, 30, 36, 43, 52, 62, 74, 87],
  10: [40, 48, 58, 70, 84, 100, 120, 140],
  11: [60, 75, 90, 110, 130, 160, 190, 220],
};

/** Fundamental deviations of shafts by size step, µm: upper deviation for d to h, lower for k to s. */
const shaftDeviations: Record<string, readonly number[]> = {
  d: [-20, -30, -40, -50, -65, -80, -100, -120],
  e: [-14, -20, -25, -32, -40, -50, -60, -72],
  f: [-6, -10, -13, -16, -20, -25, -30, -36],
  g: [-2, -4, -5, -6, -7, -9, -10, -12],
  h: [0, 0, 0, 0, 0, 0, 0, 0],
  k: [0, 1, 1, 1, 2, 2, 2, 3],
  m: [2, 4, 6, 7, 8, 9, 11, 13],
  n: [4, 8, 10, 12, 15, 17, 20, 23],
  p: [6, 12, 15, 18, 22, 26, 32, 37],
};
/** s is split at 65 and 100 mm. */
const sSteps = [3, 6, 10, 18, 30, 50, 65, 80, 100, 120] as const;
const sDeviations = [14, 19, 23, 28, 35, 43, 53, 59, 71, 79] as const;

export interface Deviations {
  /** Upper and lower deviation from the nominal size, µm. */
  readonly upper: number;
  readonly lower: number;
}

/** Standard tolerance of a grade (5 to 11) at a nominal size over 0 up to 120 mm, µm. RangeError outside. */
export function standardTolerance(nominal: number, grade: number): number {
  const row = grades[grade];
  if (!row) throw new RangeError('Grades IT5 to IT11 are known here.');
  return row[stepOf(nominal, steps)]!;
}

/** Deviations of a shaft class such as "g6" at a nominal size, µm. RangeError for a class or size not known here. */
export function shaftDeviation(nominal: number, tolerance: string): Deviations {
  const { letter, grade } = parseClass(tolerance, /^([defghkmnps])(\d{1,2})$/);
  const width = standardTolerance(nominal, grade);
  if (letter === 's') {
    const lower = sDeviations[stepOf(nominal, sSteps)]!;
    return { upper: lower + width, lower };
  }
  const deviation = shaftDeviations[letter]![stepOf(nominal, steps)]!;
  return letter <= 'h'
    ? { upper: deviation, lower: deviation - width }
    : { upper: deviation + width, lower: deviation };
}

/** Deviations of a hole class such as "H7" or "D10" at a nominal size, µm. RangeError for a class or size not known here. */
export function holeDeviation(nominal: number, tolerance: string): Deviations {
  const { letter, grade } = parseClass(tolerance, /^([DEFGH])(\d{1,2})$/);
  // Holes D to H mirror the shafts d to h about the zero line (ISO 286-1:2010, 4.3.2.5).
  // Subtracted from zero, since the H line is 0 and not −0.
  const lower = 0 - shaftDeviations[letter.toLowerCase()]![stepOf(nominal, steps)]!;
  return { upper: lower + standardTolerance(nominal, grade), lower };
}

export interface IsoFit {
  readonly hole: string;
  readonly shaft: string;
  readonly kind: 'clearance' | 'transition' | 'interference';
  /** Largest and smallest clearance, µm; negative is interference. */
  readonly largestClearance: number;
  readonly smallestClearance: number;
}

/** The fit of two classes at a nominal size (mm), clearances in µm. */
export function isoFit(nominal: number, hole: string, shaft: string): IsoFit {
  const h = holeDeviation(nominal, hole);
  const s = shaftDeviation(nominal, shaft);
  const largestClearance = h.upper - s.lower;
  const smallestClearance = h.lower - s.upper;
  const kind = smallestClearance >= 0 ? 'clearance' : largestClearance <= 0 ? 'interference' : 'transition';
  return { hole, shaft, kind, largestClearance, smallestClearance };
}

/** Preferred hole-basis fits (ISO 286-1:2010, annex), from the loosest to the tightest. */
export const preferredFits = [
  ['H11', 'd9'],
  ['H9', 'e8'],
  ['H8', 'f7'],
  ['H7', 'g6'],
  ['H7', 'h6'],
  ['H7', 'k6'],
  ['H7', 'n6'],
  ['H7', 'p6'],
  ['H7', 's6'],
] as const;

/**
 * The preferred fit whose middle clearance lies nearest to a measured clearance (mm) at a nominal size (mm); null where
 * the clearance lies beyond the loosest or tightest of them, since then no standard fit describes the pair.
 */
export function nearestFit(nominal: number, clearance: number): IsoFit | null {
  if (!(nominal > 0 && nominal <= 120)) return null;
  const measured = clearance * 1000;
  const fits = preferredFits.map(([hole, shaft]) => isoFit(nominal, hole, shaft));
  const loosest = Math.max(...fits.map((fit) => fit.largestClearance));
  const tightest = Math.min(...fits.map((fit) => fit.smallestClearance));
  if (measured > loosest || measured < tightest) return null;
  const distance = (fit: IsoFit): number =>
    Math.abs((fit.largestClearance + fit.smallestClearance) / 2 - measured);
  return fits.reduce((best, fit) => (distance(fit) < distance(best) ? fit : best));
}

function stepOf(nominal: number, ends: readonly number[]): number {
  const index = nominal > 0 ? ends.findIndex((end) => nominal <= end) : -1;
  if (index < 0) throw new RangeError('Nominal sizes over 0 up to 120 mm are known here.');
  return index;
}

function parseClass(tolerance: string, pattern: RegExp): { letter: string; grade: number } {
  const match = pattern.exec(tolerance);
  if (!match) throw new RangeError(`Tolerance class ${tolerance} is not known here.`);
  return { letter: match[1]!, grade: Number(match[2]) };
}
