import { checkDimension, figure, type Dimension, type Figure } from './dimension.js';
import { chancePositive, verdictOf, type SeatVerdict } from './verdict.js';

/** Clearance holes by ISO 273, mm: fine (H12), medium (H13), coarse (H14). */
export const clearanceHoles: Record<
  string,
  { readonly screw: number; readonly fine: number; readonly medium: number; readonly coarse: number }
> = {
  M2: { screw: 2, fine: 2.2, medium: 2.4, coarse: 2.6 },
  'M2.5': { screw: 2.5, fine: 2.7, medium: 2.9, coarse: 3.1 },
  M3: { screw: 3, fine: 3.2, medium: 3.4, coarse: 3.6 },
  M4: { screw: 4, fine: 4.3, medium: 4.5, coarse: 4.8 },
  M5: { screw: 5, fine: 5.3, medium: 5.5, coarse: 5.8 },
  M6: { screw: 6, fine: 6.4, medium: 6.6, coarse: 7.0 },
  M8: { screw: 8, fine: 8.4, medium: 9.0, coarse: 10.0 },
};

export interface HolePatternSide {
  readonly count: number | null;
  readonly circle: Dimension | null;
}

export interface HolePatternInput {
  /** The plate with clearance holes, or with slots that run along the radius or along the circle. */
  readonly holes: HolePatternSide & {
    readonly holeDiameter: Dimension | null;
    readonly slotTravel: Dimension | null;
    readonly slotAlong: 'radius' | 'circle' | null;
  };
  /** The tapped side. */
  readonly tapped: HolePatternSide & { readonly screw: string | null };
}

export interface HolePatternResult {
  readonly verdict: SeatVerdict;
  readonly trouble: 'count' | 'circle' | 'screw' | null;
  /** Radial play of a screw in its hole, slots included, minus the radius by which the circles differ, mm. */
  readonly margin: Figure | null;
  readonly chance: number | null;
  /** Radius by which the circles differ, mm. */
  readonly circleError: Figure | null;
  /** Angle through which slots along the circle let the plate turn, degrees. */
  readonly freeTurn: number | null;
  /** What ISO 273 would give the hole, mm. */
  readonly standard: { readonly fine: number; readonly medium: number; readonly coarse: number } | null;
  readonly missing: readonly string[];
}

/**
 * Screws through holes on a circle: all of them enter when (hole − screw) / 2 reaches the difference of the circle radii;
 * a slot along the radius adds half its travel, one along the circle lets the plate turn instead. Counts must be equal,
 * or the tapped count a multiple of the hole count. Lengths mm. RangeError for a screw outside M2 to M8.
 */
export function judgeHolePattern({ holes, tapped }: HolePatternInput): HolePatternResult {
  const missing = Object.entries({
    'holes.circle': holes.circle,
    'holes.holeDiameter': holes.holeDiameter,
    'holes.count': holes.count,
    'tapped.circle': tapped.circle,
    'tapped.screw': tapped.screw,
    'tapped.count': tapped.count,
  }).flatMap(([name, value]) => (value === null ? [name] : []));
  const standard = tapped.screw === null ? null : standardOf(tapped.screw);
  const nothing = { margin: null, circleError: null, freeTurn: null, standard, missing };
  if (holes.count !== null && tapped.count !== null && tapped.count % holes.count !== 0) {
    return { verdict: 'will-not-seat', trouble: 'count', chance: 0, ...nothing };
  }
  if (!holes.circle || !holes.holeDiameter || !tapped.circle || standard === null)
    return { verdict: 'not-known', trouble: null, chance: null, ...nothing };
  checkDimension(holes.circle, 'the hole circle');
  checkDimension(holes.holeDiameter, 'the hole diameter');
  checkDimension(tapped.circle, 'the tapped circle');
  const along = holes.slotTravel ? holes.slotAlong : null;
  const radialSlot = along === 'radius' ? holes.slotTravel! : null;
  const difference = (holes.circle.value - tapped.circle.value) / 2;
  const differenceUncertainty = Math.hypot(holes.circle.uncertainty, tapped.circle.uncertainty) / 2;
  const play = (holes.holeDiameter.value - standard.screw) / 2 + (radialSlot?.value ?? 0) / 2;
  const playUncertainty = Math.hypot(holes.holeDiameter.uncertainty, radialSlot?.uncertainty ?? 0) / 2;
  const margin = figure(play - Math.abs(difference), Math.hypot(playUncertainty, differenceUncertainty));
  const chance = chancePositive(margin);
  return {
    verdict: verdictOf(chance, margin.value, 0.1),
    trouble: chance >= 0.5 ? null : play < 0 ? 'screw' : 'circle',
    margin,
    chance,
    circleError: figure(Math.abs(difference), differenceUncertainty),
    freeTurn:
      along === 'circle' ? ((holes.slotTravel!.value / (tapped.circle.value / 2)) * 180) / Math.PI : null,
    standard,
    missing,
  };
}

function standardOf(screw: string): (typeof clearanceHoles)[string] {
  const found = clearanceHoles[screw.trim().toUpperCase()];
  if (!found) throw new RangeError('Screws from M2 to M8 (M2, M2.5, M3, M4, M5, M6, M8) are known here.');
  return found;
}
