import type { Instrument } from '../contract/vocabulary.js';

/**
 * Usual standard uncertainty of one reading by instrument, mm: the limit of error as a rectangular distribution, a/√3
 * (JCGM 100:2008, 4.3.7). Limits: caliper ±0.03 (DIN 862, from memory), micrometer ±0.004 (DIN 863, from memory), ruler ±0.5,
 * feeler leaf ±0.01, print model value ±0.15 (shrinkage, first layer), maker's drawing ±0.1 (ISO 2768-m, sizes over 6 to 30,
 * is ±0.2; over 3 to 6 ±0.1; from memory), other ±0.2; the rest common practice, no source.
 */
const limits: Record<Instrument, number> = {
  caliper: 0.03,
  micrometer: 0.004,
  ruler: 0.5,
  'feeler-leaf': 0.01,
  'print-model': 0.15,
  'makers-drawing': 0.1,
  count: 0.01,
  other: 0.2,
};

/** Standard uncertainty in mm, or in degrees for an angle (a protractor's ±1°, common practice); a count is taken as told. */
export function usualUncertainty(instrument: Instrument, unit: 'mm' | 'deg' | 'count'): number {
  const limit = unit === 'mm' ? limits[instrument] : unit === 'deg' ? 1 : 0.01;
  return limit / Math.sqrt(3);
}
