import type { Figure } from './dimension.js';
import type { AngleInterval } from './envelope.js';
import type { IsoFit } from './iso-286.js';
import type { Tilt } from './tilt.js';
import type { SeatVerdict } from './verdict.js';

/** A dimension or attribute nobody has read yet, and how to read it. */
export interface MissingReading {
  readonly side: 'a' | 'b';
  readonly name: string;
  readonly label: string;
  readonly howTo: string;
}

export interface JointVerdict {
  readonly verdict: SeatVerdict;
  /** Room in the direction that decides, mm; negative is overlap. */
  readonly margin: Figure | null;
  readonly marginOf: string;
  readonly chance: number | null;
  /** What touches instead, in words; null where it seats. */
  readonly touches: string | null;
  readonly gap: Figure | null;
  readonly tilt: { readonly best: Tilt; readonly worst: Tilt | null } | null;
  /** Angles that stay free for the second body; only for envelopes. */
  readonly freeAngles: readonly AngleInterval[] | null;
  /** Turn that would clear it, degrees. */
  readonly turnNeeded: number | null;
  readonly isoFit: IsoFit | null;
  readonly sentence: string;
  readonly missing: readonly MissingReading[];
}
