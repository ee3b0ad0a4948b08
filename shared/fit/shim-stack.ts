import { coverage95 } from './dimension.js';

/** One kind of stock. Lengths in mm; diameters null where it is cut to size. */
export interface StockKind {
  readonly id: string;
  readonly name: string;
  readonly family:
    'coin' | 'washer' | 'shim-ring' | 'feeler-leaf' | 'sheet' | 'tape' | 'printed-layer' | 'own';
  readonly thickness: number;
  /** Standard uncertainty of one piece's thickness. */
  readonly uncertainty: number;
  readonly outerDiameter: number | null;
  readonly innerDiameter: number | null;
  /** Pieces at hand; absent: as many as wanted. */
  readonly available?: number;
  readonly source: string;
}

export interface ShimQuestion {
  /** Gap to fill and its standard uncertainty, mm. */
  readonly gap: number;
  readonly gapUncertainty: number;
  /** How far the stack may miss the gap, mm. */
  readonly tolerance: number;
  readonly stock: readonly StockKind[];
  /** Pieces on top of each other, 1 to 8. */
  readonly mostPieces: number;
  /** Stacks wanted back. */
  readonly wanted: number;
  /** Equal stacks needed: 1 for a ring, 3 for three points. */
  readonly copies: 1 | 3;
}

export interface ShimStack {
  readonly pieces: readonly { readonly stock: StockKind; readonly count: number }[];
  readonly count: number;
  readonly thickness: number;
  /** Thickness minus gap. */
  readonly error: number;
  /** Standard uncertainty of the error: the stack's and the gap's. */
  readonly uncertainty: number;
  readonly interval: readonly [number, number];
  readonly withinTolerance: boolean;
}

/**
 * The best stacks for a gap, exact: every multiset of up to `mostPieces` pieces is either looked at or shown to be worse
 * than those kept. Stacks within tolerance come first, of fewer pieces before more, then by the size of the error; the
 * others follow by error alone. Pieces of one kind share their deviation, so n of them have n times its uncertainty;
 * kinds add as root sum of squares.
 *
 * Method: for each count of pieces a depth-first walk over kinds by falling thickness, cut off where the pieces still to
 * come cannot reach closer than the worst stack kept; the last piece is found by bisection. Cost: about
 * C(kinds + pieces − 2, pieces − 1) steps at most, a few milliseconds for 40 kinds and 5 pieces.
 * Throws RangeError for a gap outside (0, 100] mm, a tolerance outside [0, 10] mm, other counts than said, or stock whose
 * thickness is not over 0.
 */
export function bestStacks(question: ShimQuestion): ShimStack[] {
  check(question);
  const kinds = question.stock
    .filter((kind) => limitOf(kind, question.copies) > 0)
    .sort((one, other) => other.thickness - one.thickness || one.uncertainty - other.uncertainty);
  const found: ShimStack[] = [];
  for (let count = 1; count <= question.mostPieces; count += 1)
    found.push(...bestOfCount(kinds, count, question));
  return found.sort(byWorth).slice(0, question.wanted);
}

function byWorth(one: ShimStack, other: ShimStack): number {
  if (one.withinTolerance !== other.withinTolerance) return one.withinTolerance ? -1 : 1;
  const count = one.withinTolerance ? one.count - other.count : 0;
  return (
    count ||
    Math.abs(one.error) - Math.abs(other.error) ||
    one.count - other.count ||
    one.uncertainty - other.uncertainty
  );
}

function bestOfCount(kinds: readonly StockKind[], count: number, question: ShimQuestion): ShimStack[] {
  const thickness = Float64Array.from(kinds, (kind) => kind.thickness);
  const limits = kinds.map((kind) => limitOf(kind, question.copies));
  const smallest = thickness.at(-1) ?? 0;
  const chosen = new Int32Array(count);
  const kept: { error: number; chosen: Int32Array }[] = [];
  let worst = Infinity;

  const keep = (error: number): void => {
    const size = Math.abs(error);
    if (kept.length === question.wanted && size >= worst) return;
    const place = kept.findIndex((stack) => Math.abs(stack.error) > size);
    kept.splice(place < 0 ? kept.length : place, 0, { error, chosen: Int32Array.from(chosen) });
    if (kept.length > question.wanted) kept.pop();
    if (kept.length === question.wanted) worst = Math.abs(kept.at(-1)!.error);
  };

  const walk = (depth: number, from: number, used: number, rest: number): void => {
    const left = count - depth;
    if (left === 1) {
      lastPiece(from, used, rest);
      return;
    }
    for (let index = from; index < kinds.length; index += 1) {
      const mostFromHere = thickness[index]! * left;
      // Kinds only get thinner from here: too little now is too little for all that follow.
      if (rest - mostFromHere > worst) return;
      // This kind alone overshoots with the thinnest pieces added; a thinner one may not.
      if (thickness[index]! + smallest * (left - 1) - rest > worst) continue;
      const usedOfThis = index === from ? used : 0;
      if (usedOfThis >= limits[index]!) continue;
      chosen[depth] = index;
      walk(depth + 1, index, usedOfThis + 1, rest - thickness[index]!);
    }
  };

  const lastPiece = (from: number, used: number, rest: number): void => {
    let low = from;
    let high = kinds.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (thickness[middle]! > rest) low = middle + 1;
      else high = middle;
    }
    const take = (index: number): boolean => {
      const error = thickness[index]! - rest;
      if (kept.length === question.wanted && Math.abs(error) >= worst) return false;
      if ((index === from ? used : 0) < limits[index]!) {
        chosen[count - 1] = index;
        keep(error);
      }
      return true;
    };
    for (let index = low; index < kinds.length && take(index); index += 1);
    for (let index = low - 1; index >= from && take(index); index -= 1);
  };

  if (kinds.length > 0) walk(0, 0, 0, question.gap);
  return kept.map((stack) => describe(stack.chosen, kinds, question));
}

function describe(chosen: Int32Array, kinds: readonly StockKind[], question: ShimQuestion): ShimStack {
  const counts = new Map<number, number>();
  for (const index of chosen) counts.set(index, (counts.get(index) ?? 0) + 1);
  const pieces = [...counts].map(([index, count]) => ({ stock: kinds[index]!, count }));
  const thickness = pieces.reduce((total, piece) => total + piece.count * piece.stock.thickness, 0);
  const own = Math.hypot(...pieces.map((piece) => piece.count * piece.stock.uncertainty));
  const uncertainty = Math.hypot(own, question.gapUncertainty);
  const error = thickness - question.gap;
  return {
    pieces,
    count: chosen.length,
    thickness,
    error,
    uncertainty,
    interval: [error - coverage95 * uncertainty, error + coverage95 * uncertainty],
    // A gap and a tolerance typed as decimals must not fail by the last bit of their binary forms.
    withinTolerance: Math.abs(error) <= question.tolerance + 1e-9,
  };
}

function limitOf(kind: StockKind, copies: number): number {
  return kind.available === undefined ? Infinity : Math.floor(kind.available / copies);
}

function check(question: ShimQuestion): void {
  const { gap, tolerance, mostPieces, wanted, stock, gapUncertainty } = question;
  if (!(gap > 0 && gap <= 100)) throw new RangeError('The gap must lie over 0 and up to 100 mm.');
  if (!(tolerance >= 0 && tolerance <= 10)) throw new RangeError('The tolerance must lie from 0 to 10 mm.');
  if (!(gapUncertainty >= 0 && Number.isFinite(gapUncertainty)))
    throw new RangeError('The uncertainty of the gap must be zero or more.');
  if (!Number.isInteger(mostPieces) || mostPieces < 1 || mostPieces > 8)
    throw new RangeError('From 1 to 8 pieces can be stacked.');
  if (!Number.isInteger(wanted) || wanted < 1 || wanted > 100)
    throw new RangeError('From 1 to 100 stacks can be asked for.');
  if (stock.some((kind) => !(kind.thickness > 0 && Number.isFinite(kind.thickness))))
    throw new RangeError('Every piece of stock needs a thickness over 0 mm.');
}

export interface ThreePoints {
  /** Least distance of the stacks from the centre, mm. */
  readonly leastRadius: number;
  /** Root-mean-square tilt from the spread of the stacks' thickness at that radius, degrees. */
  readonly residualTilt: number;
}

/**
 * Where three equal stacks stand at 120° and how true they keep the axis: at least 0.6 of the bolt circle's radius from
 * the centre. A plane over three points at radius r whose heights scatter by u has slopes of variance 2u²/(3r²) along
 * both axes, hence a root-mean-square tilt of atan(2u / (√3 r)). Bolt circle diameter and u in mm, both > 0 and ≥ 0.
 */
export function threePoints(boltCircle: number, stackSpread: number): ThreePoints {
  if (!(boltCircle > 0) || !(stackSpread >= 0))
    throw new RangeError('The bolt circle must be over 0 mm and the spread zero or more.');
  const leastRadius = 0.6 * (boltCircle / 2);
  return {
    leastRadius,
    residualTilt: (Math.atan((2 * stackSpread) / (Math.sqrt(3) * leastRadius)) * 180) / Math.PI,
  };
}
