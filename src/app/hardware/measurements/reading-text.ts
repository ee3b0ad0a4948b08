import type { DimensionConsensus, Measurement } from '../../../../shared/contract/measurements';
import { coverage95, millimetresPerInch } from '../../../../shared/fit/dimension';
import type { DimensionSpec } from '../../../../shared/fit/feature-dimensions';

export type ShownUnit = 'mm' | 'in' | 'deg' | 'count';

/** The unit that a dimension is shown in: inches only for lengths, and only on wish. */
export function shownUnit(spec: Pick<DimensionSpec, 'unit'>, wish: 'mm' | 'in'): ShownUnit {
  return spec.unit === 'mm' ? wish : spec.unit;
}

/** A figure stored in mm, degrees or pieces, as a number in the unit shown. */
export function inUnit(value: number, unit: ShownUnit): number {
  return unit === 'in' ? value / millimetresPerInch : value;
}

/** Value ± half width of its 95 % interval to the digits it allows, with the unit: "19.50 ± 0.04 mm". */
export function withInterval(value: number, uncertainty: number, unit: ShownUnit): string {
  const half = inUnit(coverage95 * uncertainty, unit);
  if (unit === 'count') return minus(value.toFixed(Math.abs(value - Math.round(value)) < 0.05 ? 0 : 2));
  const digits = unit === 'in' ? 4 : unit === 'deg' ? 1 : half < 0.02 ? 3 : 2;
  const symbol = unit === 'deg' ? '°' : ` ${unit}`;
  return `${minus(inUnit(value, unit).toFixed(digits))} ± ${half.toFixed(digits)}${symbol}`;
}

export function consensusText(consensus: DimensionConsensus, unit: ShownUnit): string {
  return withInterval(consensus.mean, consensus.uncertainty, unit);
}

/** Readings in words: "1 reading", "5 readings". */
export function countText(count: number): string {
  return count === 1 ? '1 reading' : `${count} readings`;
}

/** What was typed, where it was not a single figure in the unit shown: "0.767, 0.768 in". */
export function enteredText({ entered }: Pick<Measurement, 'entered'>): string {
  const symbol = { mm: ' mm', in: ' in', deg: '°', count: '' }[entered.unit];
  return `${entered.values.map((value) => minus(String(value))).join(', ')}${symbol}`;
}

/** What became of a reading: set aside, a likely slip of the unit, or how much say it has. */
export function sayText(reading: Pick<Measurement, 'setAside' | 'unitSlip' | 'weight'>): string {
  if (reading.setAside) return 'set aside';
  if (reading.unitSlip) return 'probably inch and mm confused; no say';
  if (reading.weight === 0) return 'too far off; no say';
  return reading.weight < 0.995 ? `say cut to ${Math.round(reading.weight * 100)} %` : 'full say';
}

function minus(text: string): string {
  return text.replace('-', '−');
}
