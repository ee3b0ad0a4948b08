import { millimetresPerInch } from '../../../shared/fit/dimension.js';
import { stored, type Reading } from './readings.js';

interface Slip {
  /** What was typed instead, or null where this slip cannot happen to it. */
  readonly typed: (reading: Reading) => Pick<Reading, 'entered' | 'unit'> | null;
  readonly reason: string;
}

const slips: readonly Slip[] = [
  {
    reason: 'Typed in inches with mm chosen: the photo shows the caliper’s display in inches.',
    typed: (reading) => ({
      unit: 'mm',
      entered: reading.entered.map((value) => Number((value / millimetresPerInch).toFixed(3))),
    }),
  },
  {
    reason: 'A digit was lost in typing; the member has been written to and agrees.',
    typed: (reading) =>
      reading.value < 10
        ? null
        : { unit: 'mm', entered: reading.entered.map((value) => Number(String(value).slice(1))) },
  },
  {
    reason: 'The chamfer was read instead of the wall: off by what the chamfer measures.',
    typed: (reading) => ({
      unit: 'mm',
      entered: reading.entered.map((value) => Number((value + 1.2).toFixed(3))),
    }),
  },
  {
    reason: 'Millimetres typed with inch chosen.',
    typed: (reading) => (reading.value > 39 ? null : { unit: 'in', entered: reading.entered }),
  },
];

/** Readings of a place below which a wrong one would carry the consensus away. */
const fewest = 5;

/**
 * Makes about one reading in sixty-five wrong in the ways people get them wrong, at most one of a dimension, and has the
 * moderator set the first `setAside` of them aside. The list keeps its order.
 */
export function withWrongEntries(
  readings: readonly Reading[],
  setAside: number,
  next: () => number,
): Reading[] {
  const placeOf = (reading: Reading): string => `${reading.feature}/${reading.letter}/${reading.spec.name}`;
  const sizes = new Map<string, number>();
  for (const reading of readings) sizes.set(placeOf(reading), (sizes.get(placeOf(reading)) ?? 0) + 1);
  const spoilt = new Set<string>();
  let made = 0;
  return readings.map((reading) => {
    const place = placeOf(reading);
    const fitting =
      reading.unit === 'mm' && reading.value > 3 && sizes.get(place)! >= fewest && !spoilt.has(place);
    if (!fitting || next() > 0.042) return reading;
    const slip = slips[made % slips.length]!;
    const typed = slip.typed(reading);
    if (!typed || typed.entered.some((value) => !(value > 0))) return reading;
    spoilt.add(place);
    made += 1;
    const wrong = { ...reading, ...typed };
    return { ...wrong, ...stored(wrong), setAsideReason: made <= setAside ? slip.reason : null };
  });
}
