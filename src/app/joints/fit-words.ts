import type { FitChance } from '../../../shared/contract/joints';
import { millimetreToInch, type Figure } from '../../../shared/fit/dimension';
import type { Tilt } from '../../../shared/fit/tilt';

export type LengthUnit = 'mm' | 'in';

/** A chance in whole per cent; what is not certain is never rounded to 0 or 100. */
export function percent(chance: number): string {
  if (chance < 0.005) return 'under 1 %';
  if (chance > 0.995) return 'over 99 %';
  return `${Math.round(chance * 100)} %`;
}

/** Prior, counts and what they come to: "predicted 3 %, 4 say it sat, 1 says not → 61 % (30 to 85 %)". */
export function chanceWords(chance: FitChance): string {
  const { predicted, sat, didNotSit } = chance;
  const voices = sat + didNotSit;
  const prior = predicted === null ? 'no prediction' : `predicted ${percent(predicted)}`;
  if (voices === 0) return predicted === null ? 'no prediction, no reports' : `${prior}, no reports yet`;
  const counted = [
    sat > 0 ? `${sat} ${sat === 1 ? 'says' : 'say'} it sat` : '',
    didNotSit > 0 ? `${didNotSit} ${didNotSit === 1 ? 'says' : 'say'} ${sat > 0 ? 'not' : 'it did not'}` : '',
  ].filter((words) => words !== '');
  const after = chance.chance === null ? '' : ` → ${percent(chance.chance)}${intervalWords(chance)}`;
  return `${[prior, ...counted].join(', ')}${after}`;
}

/** Nothing where both ends come to the same words. */
function intervalWords({ interval }: FitChance): string {
  if (!interval) return '';
  const [low, high] = [percent(interval[0]), percent(interval[1])];
  return low === high ? '' : ` (${low.replace(' %', '')} to ${high})`;
}

/** The counts of a table's cell: "4 sat, 1 did not". */
export function countWords({ sat, didNotSit }: Pick<FitChance, 'sat' | 'didNotSit'>): string {
  if (sat + didNotSit === 0) return 'no reports';
  return [sat > 0 ? `${sat} sat` : '', didNotSit > 0 ? `${didNotSit} did not` : '']
    .filter(Boolean)
    .join(', ');
}

/** A length (mm) to the digits its uncertainty allows, in the reader's unit. */
export function lengthText(millimetres: number, uncertainty: number, unit: LengthUnit): string {
  const fine = uncertainty > 0 && uncertainty < 0.02;
  const text =
    unit === 'mm' ? millimetres.toFixed(fine ? 3 : 2) : millimetreToInch(millimetres).toFixed(fine ? 4 : 3);
  return text.replace('-', '−').replace(/^−(0\.?0*)$/, '$1');
}

/** Figure with its 95 % interval: "−3.00 mm (−3.12 to −2.88)". */
export function figureText(figure: Figure, unit: LengthUnit): string {
  const at = (value: number): string => lengthText(value, figure.uncertainty, unit);
  if (figure.uncertainty === 0) return `${at(figure.value)} ${unit}`;
  return `${at(figure.value)} ${unit} (${at(figure.interval[0])} to ${at(figure.interval[1])})`;
}

/** An angle in degrees and arc minutes. */
export function tiltText(tilt: Tilt): string {
  const minutes = tilt.arcMinutes < 10 ? tilt.arcMinutes.toFixed(1) : Math.round(tilt.arcMinutes).toString();
  return `${tilt.degrees.toFixed(tilt.degrees < 1 ? 2 : 1)}° (${minutes}′)`;
}
