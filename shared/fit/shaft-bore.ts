import type { Process } from '../statistics/consensus.js';
import { checkDimension, figure, type Dimension, type Figure } from './dimension.js';
import { nearestFit, type IsoFit } from './iso-286.js';
import { defaultSnugLimit } from './seat.js';
import { chancePositive, verdictOf, type SeatVerdict } from './verdict.js';

export type DriveForm = 'round' | 'flat' | 'key';

export interface ShaftSide {
  readonly diameter: Dimension | null;
  /** Across the flat (shaft: from flat to the far side; bore: likewise), or the width of the key; mm. */
  readonly driveSize: Dimension | null;
  readonly form: DriveForm | null;
}

export interface ShaftBoreResult {
  readonly verdict: SeatVerdict;
  readonly trouble: 'diameter' | 'drive-size' | 'drive-form' | null;
  readonly clearance: Figure | null;
  /** Bore minus shaft across the flat or key, mm. */
  readonly driveClearance: Figure | null;
  readonly chance: number | null;
  /** Play of the hub on the shaft, degrees: how far it turns before flat or key carries; null for a round pair. */
  readonly playDegrees: number | null;
  readonly isoFit: IsoFit | null;
  readonly missing: readonly string[];
}

/**
 * A bore on a shaft: diameter as for a seat, then the flat or key. A bore with a flat on a round shaft, or a key without a
 * keyway, does not go on; a round bore goes on a shaft with a flat and is held by its screw.
 * Play: a flat at distance h from the axis with clearance c turns by about c / half the flat's width. Lengths mm.
 */
export function judgeShaftBore(shaft: ShaftSide, bore: ShaftSide, process: Process): ShaftBoreResult {
  const drives = bore.form !== null && bore.form !== 'round';
  const needed: Record<string, unknown> = {
    'shaft.diameter': shaft.diameter,
    'bore.diameter': bore.diameter,
    'shaft.form': shaft.form,
    'bore.form': bore.form,
    ...(drives ? { 'shaft.driveSize': shaft.driveSize, 'bore.driveSize': bore.driveSize } : {}),
  };
  const missing = Object.entries(needed).flatMap(([name, value]) => (value === null ? [name] : []));
  const nothing = { clearance: null, driveClearance: null, playDegrees: null, isoFit: null, missing };
  if (drives && shaft.form !== null && shaft.form !== bore.form) {
    return { verdict: 'will-not-seat', trouble: 'drive-form', chance: 0, ...nothing };
  }
  if (
    !shaft.diameter ||
    !bore.diameter ||
    shaft.form === null ||
    bore.form === null ||
    (drives && (!shaft.driveSize || !bore.driveSize))
  ) {
    return { verdict: 'not-known', trouble: null, chance: null, ...nothing };
  }
  checkDimension(shaft.diameter, 'the shaft');
  checkDimension(bore.diameter, 'the bore');
  const clearance = difference(bore.diameter, shaft.diameter);
  const driveClearance = drives ? difference(bore.driveSize!, shaft.driveSize!) : null;
  const enters = chancePositive(clearance);
  const driveEnters = driveClearance ? chancePositive(driveClearance) : 1;
  const chance = enters * driveEnters;
  return {
    verdict: verdictOf(chance, clearance.value, defaultSnugLimit[process]),
    trouble: chance >= 0.5 ? null : enters <= driveEnters ? 'diameter' : 'drive-size',
    clearance,
    driveClearance,
    chance,
    playDegrees:
      driveClearance && driveClearance.value > 0 ? playOf(bore.form, shaft, driveClearance.value) : null,
    isoFit:
      process === 'machined' && enters >= 0.5 ? nearestFit(shaft.diameter.value, clearance.value) : null,
    missing,
  };
}

function difference(outer: Dimension, inner: Dimension): Figure {
  return figure(outer.value - inner.value, Math.hypot(outer.uncertainty, inner.uncertainty));
}

function playOf(form: DriveForm, shaft: ShaftSide, clearance: number): number {
  const radius = shaft.diameter!.value / 2;
  const flatDistance = shaft.driveSize!.value - radius;
  const halfWidth = form === 'flat' ? Math.sqrt(Math.max(0, radius ** 2 - flatDistance ** 2)) : radius;
  return halfWidth > 0 ? (Math.atan(clearance / halfWidth) * 180) / Math.PI : 0;
}
