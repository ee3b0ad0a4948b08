import type { Reading } from '../../shared/contract/edition-content.js';
import { readingUnitSymbols } from '../../shared/contract/vocabulary.js';

const millimetresPerInch = 25.4;

/**
 * Figures the way the index has them: decimal point, no needless zeros, unit and diameter sign apart.
 * "ø22,50mm lip" becomes "22.5 mm lip". Words without figures stay as they are.
 */
export function withPlainFigures(text: string): string {
  return text
    .replace(/[ø⌀∅](?=\s*\d)/giu, ' ')
    .replace(/(\d),(?=\d{1,2}(?!\d))/g, '$1.')
    .replace(/(\d+\.\d*?)0+(?!\d)/g, '$1')
    .replace(/(\d)\.(?!\d)/g, '$1')
    .replace(/(\d)\s*(mm|um|µm|μm|deg|in|inch|inches|steps)(?![\p{L}\d])/giu, '$1 $2')
    .replace(/(\d)\s*[″"]/g, '$1 in')
    .replace(/(\d)\s*°/g, '$1 deg')
    .replace(/\s+/g, ' ')
    .trim();
}

/** Figures in a text that are written otherwise than they are looked for, in plain form: "22.50 mm" gives "22.5 mm". */
export function plainFiguresOf(text: string): string[] {
  const figures = text.match(/[ø⌀∅]?\s*\d+(?:[.,]\d+)?\s*(?:mm|um|µm|deg|in|°|″|")?(?![\p{L}\d])/giu) ?? [];
  return figures.map(withPlainFigures).filter((figure) => !text.includes(figure));
}

/** One reading in words, lengths in millimetres and inches: "lip diameter 22.5 mm 0.886 in". */
export function wordsOfReading({
  dimension,
  value,
  unit,
}: Pick<Reading, 'dimension' | 'value' | 'unit'>): string {
  if (value === null) return dimension;
  const others =
    unit === 'mm'
      ? ` ${rounded(value / millimetresPerInch, 3)} in`
      : unit === 'in'
        ? ` ${rounded(value * millimetresPerInch, 2)} mm`
        : '';
  return `${withPlainFigures(dimension)} ${value} ${readingUnitSymbols[unit] === '°' ? 'deg' : readingUnitSymbols[unit]}${others}`;
}

function rounded(value: number, digits: number): number {
  return Number(value.toFixed(digits));
}
