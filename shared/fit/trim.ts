import type { HazardKind } from '../contract/vocabulary.js';
import type { Process } from '../statistics/consensus.js';
import { figure, type Dimension, type Figure } from './dimension.js';

/** Wall left under which a warning is given, mm: three perimeters of a 0.4 mm nozzle; common practice, no source. */
export const leastWall: Record<Process, number> = { printed: 1.2, machined: 0.8, cast: 1.5 };

export interface TrimInput {
  readonly bossDiameter: Dimension;
  readonly bossHeight: Dimension;
  readonly recessDiameter: Dimension;
  /** Outer diameter of the wall round the recess, mm; null where it is not known. */
  readonly recessOuter: Dimension | null;
  readonly process: Process;
  /** What to take off beyond the bare need, mm. */
  readonly allowance: number;
  /** Clearance on diameter wanted after opening the recess, mm. */
  readonly clearanceWanted: number;
}

export interface TrimResult {
  /** Taking the boss off: its height and the allowance. */
  readonly offHeight: Figure;
  /** Turning the boss down, or opening the recess, by this much on diameter; null where it clears already. */
  readonly offDiameter: Figure | null;
  readonly newRecess: Figure | null;
  readonly wallLeft: Figure | null;
  /** The wall would be thinner than `leastWall`. */
  readonly wallTooThin: boolean;
  /** Hazards of the work, for which cautions are shown. */
  readonly hazards: readonly HazardKind[];
}

/**
 * What to take off so that a boss no longer holds its faces apart: the boss's whole height plus an allowance, or on
 * diameter −c + wanted clearance with c = recess − boss. Wall left = (outer − new recess) / 2. All mm.
 * RangeError for an allowance or clearance below zero.
 */
export function sizeTrim(input: TrimInput): TrimResult {
  if (!(input.allowance >= 0) || !(input.clearanceWanted >= 0))
    throw new RangeError('Allowance and clearance must be zero or more.');
  const spread = Math.hypot(input.bossDiameter.uncertainty, input.recessDiameter.uncertainty);
  const off = input.bossDiameter.value - input.recessDiameter.value + input.clearanceWanted;
  const offDiameter = off > 0 ? figure(off, spread) : null;
  // The recess is opened to the boss plus the wanted clearance, so only the boss's own uncertainty remains in it.
  const newRecess =
    offDiameter && figure(input.bossDiameter.value + input.clearanceWanted, input.bossDiameter.uncertainty);
  const wallLeft =
    newRecess && input.recessOuter
      ? figure(
          (input.recessOuter.value - newRecess.value) / 2,
          Math.hypot(input.recessOuter.uncertainty, newRecess.uncertainty) / 2,
        )
      : null;
  return {
    offHeight: figure(input.bossHeight.value + input.allowance, input.bossHeight.uncertainty),
    offDiameter,
    newRecess,
    wallLeft,
    wallTooThin: wallLeft !== null && wallLeft.value < leastWall[input.process],
    hazards: ['power-tool', 'blade', 'dust', 'swarf-near-optics'],
  };
}
