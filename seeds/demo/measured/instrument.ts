import type { DimensionSpec } from '../../../shared/fit/feature-dimensions.js';
import type { Instrument } from '../../../shared/contract/vocabulary.js';
import type { Process } from '../../../shared/statistics/consensus.js';

/** Smallest step that a person types, mm or degrees. */
const steps: Partial<Record<Instrument, number>> = {
  caliper: 0.01,
  micrometer: 0.002,
  ruler: 0.5,
  'makers-drawing': 0.1,
  'print-model': 0.05,
};

/** What somebody reaches for: mostly a caliper. Size in mm. */
export function instrumentFor(
  spec: DimensionSpec,
  size: number,
  process: Process,
  next: () => number,
): Instrument {
  if (spec.unit === 'count') return 'count';
  if (spec.unit === 'deg') return 'other';
  const draw = next();
  const round = spec.name === 'diameter' || spec.name === 'closedDiameter';
  if (round && process === 'machined' && size < 60 && draw < 0.2) return 'micrometer';
  if (process === 'printed' && draw < 0.08) return 'print-model';
  if (!round && size > 40 && draw < 0.15) return 'ruler';
  if (draw > 0.96) return 'makers-drawing';
  return 'caliper';
}

/** The figure as it would be typed, in the unit of the dimension. */
export function asTyped(value: number, instrument: Instrument, unit: DimensionSpec['unit']): number {
  const step = unit === 'deg' ? 0.5 : unit === 'count' ? 1 : (steps[instrument] ?? 0.01);
  return Number((Math.round(value / step) * step).toFixed(3));
}
