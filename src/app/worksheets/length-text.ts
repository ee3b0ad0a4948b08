import type { LengthUnit, WorksheetFigure } from '../../../shared/contract/worksheet';
import { coverage95, millimetresPerInch } from '../../../shared/fit/dimension';

/** A length given in mm, in the unit wished, to the digits its standard uncertainty (mm) allows: "−3.00 mm", "0.0591 in". */
export function lengthText(millimetres: number, unit: LengthUnit, uncertainty = 0): string {
  return `${lengthDigits(millimetres, unit, uncertainty)} ${unit}`;
}

/** The 95 % interval of a figure, in its unit. */
export function intervalText(figure: WorksheetFigure, unit: LengthUnit): string {
  const { value, uncertainty } = figure;
  if (!uncertainty) return '';
  const [low, high] = [value - coverage95 * uncertainty, value + coverage95 * uncertainty];
  return figure.unit === 'deg'
    ? `${minus(low.toFixed(2))} to ${minus(high.toFixed(2))}°`
    : `${lengthDigits(low, unit, uncertainty)} to ${lengthText(high, unit, uncertainty)}`;
}

/** A worked-out figure with its unit; angles in degrees and arc minutes. */
export function figureText(figure: WorksheetFigure, unit: LengthUnit): string {
  if (figure.unit === 'chance') return chanceText(figure.value);
  if (figure.unit === 'mm') return lengthText(figure.value, unit, figure.uncertainty ?? 0);
  const minutes = figure.value * 60;
  return `${minus(figure.value.toFixed(2))}° (${minutes.toFixed(minutes < 10 ? 1 : 0)}′)`;
}

/** A chance in per cent, never as certain: "under 0.1 %", "over 99.9 %". */
export function chanceText(chance: number): string {
  if (chance < 0.001) return 'under 0.1 %';
  if (chance > 0.999) return 'over 99.9 %';
  const percent = chance * 100;
  return `${percent.toFixed(percent < 1 || percent > 99 ? 1 : 0)} %`;
}

/** A length in mm as it is handed on in an address: in the unit, to a ten-thousandth, without idle zeros. */
export function typedLength(millimetres: number, unit: LengthUnit): string {
  const value = unit === 'in' ? millimetres / millimetresPerInch : millimetres;
  return String(Number(value.toFixed(unit === 'in' ? 6 : 4)));
}

function lengthDigits(millimetres: number, unit: LengthUnit, uncertainty: number): string {
  const isFine = uncertainty > 0 && uncertainty < 0.02;
  return unit === 'in'
    ? minus((millimetres / millimetresPerInch).toFixed(4))
    : minus(millimetres.toFixed(isFine ? 3 : 2));
}

function minus(text: string): string {
  return /^-0\.?0*$/.test(text) ? text.slice(1) : text.replace('-', '−');
}
