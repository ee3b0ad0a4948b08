import { checkDimension, figure, type Dimension, type Figure } from './dimension.js';
import { chancePositive, type SeatVerdict } from './verdict.js';

export interface ClampRingResult {
  readonly verdict: SeatVerdict;
  readonly trouble: 'barrel-too-large' | 'barrel-too-small' | null;
  /** Distance of the barrel from the nearer end of the split's range, on diameter, mm; negative outside it. */
  readonly margin: Figure | null;
  readonly chance: number | null;
  /** What a strip round the barrel must be thick to bring it into the range, mm; null where none is needed. */
  readonly sleeve: Figure | null;
  readonly missing: readonly ('clamp.open' | 'clamp.closed' | 'barrel.diameter')[];
}

/**
 * A split ring holds every barrel between its diameter with the screw slack and with the split closed.
 * Chance = P(open − barrel ≥ 0) · P(barrel − closed ≥ 0), both ends taken as independent. Diameters mm.
 * RangeError when closed is not smaller than open.
 */
export function judgeClampRing(
  clamp: { open: Dimension | null; closed: Dimension | null },
  barrel: Dimension | null,
): ClampRingResult {
  const missing = (
    [
      ['clamp.open', clamp.open],
      ['clamp.closed', clamp.closed],
      ['barrel.diameter', barrel],
    ] as const
  ).flatMap(([name, value]) => (value === null ? [name] : []));
  if (!clamp.open || !clamp.closed || !barrel) {
    return { verdict: 'not-known', trouble: null, margin: null, chance: null, sleeve: null, missing };
  }
  checkDimension(clamp.open, 'the open diameter');
  checkDimension(clamp.closed, 'the closed diameter');
  checkDimension(barrel, 'the barrel');
  if (clamp.closed.value >= clamp.open.value)
    throw new RangeError('The closed diameter must be smaller than the open one.');
  const enters = figure(
    clamp.open.value - barrel.value,
    Math.hypot(clamp.open.uncertainty, barrel.uncertainty),
  );
  const grips = figure(
    barrel.value - clamp.closed.value,
    Math.hypot(clamp.closed.uncertainty, barrel.uncertainty),
  );
  const chance = chancePositive(enters) * chancePositive(grips);
  const margin = enters.value <= grips.value ? enters : grips;
  const trouble = chance >= 0.5 ? null : enters.value < grips.value ? 'barrel-too-large' : 'barrel-too-small';
  // Aimed at the middle of the range, so that reading errors cost as little as they can.
  const middle = (clamp.open.value + clamp.closed.value) / 2;
  const sleeve =
    trouble === 'barrel-too-small' ? figure((middle - barrel.value) / 2, grips.uncertainty / 2) : null;
  return {
    verdict: chance >= 0.95 ? 'seats-with-room' : chance <= 0.05 ? 'will-not-seat' : 'tight',
    trouble,
    margin,
    chance,
    sleeve,
    missing,
  };
}
