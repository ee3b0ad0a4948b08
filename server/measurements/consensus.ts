import type { DimensionConsensus } from '../../shared/contract/measurements.js';
import type { DimensionSpec } from '../../shared/fit/feature-dimensions.js';
import { consensusOf, defaultSpread, type Process } from '../../shared/statistics/consensus.js';

/** Usual spread between parts where it is no length: degrees, and counts that do not vary; common practice, no source. */
const otherSpread = { deg: 0.5, count: 1e-6 } as const;

/** Consensus of the readings of one dimension; null where no reading has a say. Units as in the dimension's spec. */
export function dimensionConsensus(
  readings: readonly { value: number; uncertainty: number }[],
  unit: DimensionSpec['unit'],
  process: Process,
): DimensionConsensus | null {
  if (readings.length === 0) return null;
  const spread = unit === 'mm' ? defaultSpread[process] : otherSpread[unit];
  const { count, mean, uncertainty, predictionSpread, interval, thin, unitSlips } = consensusOf(
    readings,
    spread,
  );
  return {
    count,
    mean,
    uncertainty,
    predictionSpread,
    low: interval[0],
    high: interval[1],
    thin,
    unitSlips: unitSlips.length,
  };
}
