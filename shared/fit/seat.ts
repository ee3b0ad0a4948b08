import type { Process } from '../statistics/consensus.js';
import { checkDimension, figure, type Dimension, type Figure } from './dimension.js';
import { nearestFit, type IsoFit } from './iso-286.js';
import { tiltOf, type Tilt } from './tilt.js';
import { chancePositive, verdictOf, type SeatVerdict } from './verdict.js';

/** What is to mate: a boss that enters a recess (or a barrel a bore). Any dimension may be missing (null). Lengths in mm. */
export interface SeatInput {
  readonly bossDiameter: Dimension | null;
  readonly bossHeight: Dimension | null;
  readonly recessDiameter: Dimension | null;
  readonly recessDepth: Dimension | null;
  /** The rougher of the two processes; sets the snug limit where none is given. */
  readonly process: Process;
  /** Clearance on diameter up to which a seat counts as snug, mm. */
  readonly snugLimit?: number;
  /** Width of the plate round the boss, mm: with it, the tilt when pulled on one side is told. */
  readonly plateWidth?: number;
}

export type SeatDimensionName = 'bossDiameter' | 'bossHeight' | 'recessDiameter' | 'recessDepth';

export interface SeatResult {
  readonly verdict: SeatVerdict;
  /** Recess minus boss on diameter. */
  readonly clearance: Figure | null;
  readonly chanceEnters: number | null;
  /** Depth minus height; negative when the boss bottoms. */
  readonly depthSpare: Figure | null;
  readonly chanceFaceMeets: number | null;
  /** Chance of both, taken as independent. */
  readonly chanceSeats: number | null;
  /** What carries the load: the faces as meant, the boss's end on the face round the recess, or on the recess's floor. */
  readonly carriedBy: 'faces' | 'boss-on-face' | 'boss-on-floor' | null;
  /** Gap left between the faces when screws are pulled evenly; zero when it seats. */
  readonly gap: Figure | null;
  /** Tilt of the axis: none when pulled evenly, `worst` when pulled on one side until the plate's edge touches. */
  readonly tilt: { readonly best: Tilt; readonly worst: Tilt | null } | null;
  /** The nearest preferred ISO 286 fit; only for machined pairs that enter. */
  readonly isoFit: IsoFit | null;
  /** Dimensions without any reading, which would settle it. */
  readonly missing: readonly SeatDimensionName[];
}

/** Snug limits on diameter by process, mm; 0.10 for prints, common practice, no source. */
export const defaultSnugLimit: Record<Process, number> = { machined: 0.05, printed: 0.1, cast: 0.2 };

/**
 * Whether a boss seats in a recess, and what happens when it does not.
 *
 * Clearance c = D_recess − D_boss with u(c)² the sum of both variances; the chance that it enters is Φ(c / u(c)), and
 * likewise for depth − height. Seats with room from 0.95 with c above the snug limit, snugly up to it, will not seat
 * below 0.05, tight in between. When it does not enter, the faces stay apart by the boss's height; when it bottoms, by
 * height − depth. Screws pulled on one side tip the plate over the boss's rim until its edge touches:
 * tilt = asin(gap / L) with L = (plate width − boss diameter) / 2, from the rim to that edge.
 * A missing height or depth leaves the seat judged on diameter alone and is named in `missing`.
 * Throws RangeError for a dimension outside (0, 1000] mm. Cost: constant.
 */
export function judgeSeat(input: SeatInput): SeatResult {
  const { bossDiameter, bossHeight, recessDiameter, recessDepth } = input;
  const dimensions = { bossDiameter, recessDiameter, bossHeight, recessDepth };
  const missing: SeatDimensionName[] = [];
  for (const [name, dimension] of Object.entries(dimensions) as [SeatDimensionName, Dimension | null][]) {
    if (dimension) checkDimension(dimension, name);
    else missing.push(name);
  }
  const clearance = difference(recessDiameter, bossDiameter);
  const depthSpare = difference(recessDepth, bossHeight);
  const chanceEnters = clearance && chancePositive(clearance);
  const chanceFaceMeets = depthSpare && chancePositive(depthSpare);
  if (clearance === null || chanceEnters === null) {
    return {
      verdict: 'not-known',
      clearance,
      chanceEnters,
      depthSpare,
      chanceFaceMeets,
      chanceSeats: null,
      carriedBy: null,
      gap: null,
      tilt: null,
      isoFit: null,
      missing,
    };
  }
  const chanceSeats = chanceEnters * (chanceFaceMeets ?? 1);
  const snugLimit = input.snugLimit ?? defaultSnugLimit[input.process];
  const verdict = verdictOf(chanceSeats, clearance.value, snugLimit);
  const carriedBy =
    chanceEnters < 0.5 ? 'boss-on-face' : (chanceFaceMeets ?? 1) < 0.5 ? 'boss-on-floor' : 'faces';
  const gap = gapLeft(carriedBy, bossHeight, depthSpare);
  return {
    verdict,
    clearance,
    chanceEnters,
    depthSpare,
    chanceFaceMeets,
    chanceSeats,
    carriedBy,
    gap,
    tilt: gap && { best: tiltOf(0, 1), worst: worstTilt(gap.value, input.plateWidth, bossDiameter!.value) },
    isoFit:
      input.process === 'machined' && carriedBy !== 'boss-on-face'
        ? nearestFit(bossDiameter!.value, clearance.value)
        : null,
    missing,
  };
}

function difference(outer: Dimension | null, inner: Dimension | null): Figure | null {
  return (
    outer && inner && figure(outer.value - inner.value, Math.hypot(outer.uncertainty, inner.uncertainty))
  );
}

function gapLeft(
  carriedBy: SeatResult['carriedBy'],
  bossHeight: Dimension | null,
  depthSpare: Figure | null,
): Figure | null {
  if (carriedBy === 'faces') return figure(0, 0);
  if (carriedBy === 'boss-on-floor') return depthSpare && figure(-depthSpare.value, depthSpare.uncertainty);
  return bossHeight && figure(bossHeight.value, bossHeight.uncertainty);
}

function worstTilt(gap: number, plateWidth: number | undefined, bossDiameter: number): Tilt | null {
  if (plateWidth === undefined || plateWidth <= bossDiameter) return null;
  return tiltOf(gap, (plateWidth - bossDiameter) / 2);
}
