import type { DimensionConsensus } from '../../../shared/contract/measurements.js';
import type { Process } from '../../../shared/statistics/consensus.js';
import { dimensionConsensus } from '../../../server/measurements/consensus.js';
import type { Reading } from './readings.js';

export interface PlaceConsensus {
  readonly feature: string;
  readonly letter: string;
  readonly dimension: string;
  readonly consensus: DimensionConsensus;
}

/** Consensus of every dimension that has a reading with a say, from readings in the order in which they are stored. */
export function consensusOfReadings(
  readings: readonly Reading[],
  process: (feature: string) => Process,
): PlaceConsensus[] {
  const places = new Map<string, Reading[]>();
  for (const reading of readings) {
    if (reading.setAsideReason !== null) continue;
    const place = `${reading.feature}/${reading.letter}/${reading.spec.name}`;
    places.set(place, [...(places.get(place) ?? []), reading]);
  }
  return [...places.values()].flatMap((counted) => {
    const { feature, letter, spec } = counted[0]!;
    const consensus = dimensionConsensus(counted, spec.unit, process(feature));
    return consensus ? [{ feature, letter, dimension: spec.name, consensus }] : [];
  });
}
