import type { Acceptance } from '../../../shared/contract/edition-content';
import { readingUnitSymbols, type ReadingUnit } from '../../../shared/contract/vocabulary';

/** Figure with its unit, angle signs close to it: "19.48 mm", "1.5°". */
export function withUnit(value: number, unit: ReadingUnit): string {
  const symbol = readingUnitSymbols[unit];
  return unit === 'deg' || unit === 'arcmin' ? `${signed(value)}${symbol}` : `${signed(value)} ${symbol}`;
}

/**
 * Value with its standard uncertainty, both to the same number of decimals: "19.50 ± 0.02 mm". Decimals are those of
 * whichever was written with more.
 */
export function readingText(value: number, uncertainty: number | null, unit: ReadingUnit): string {
  if (uncertainty === null) return withUnit(value, unit);
  const decimals = Math.max(decimalsOf(value), decimalsOf(uncertainty));
  return `${minus(value.toFixed(decimals))} ± ${uncertainty.toFixed(decimals)} ${readingUnitSymbols[unit]}`;
}

/** What a trial must reach, in words and figure: "tilt at most", "0.05 mm". */
export function acceptanceParts(acceptance: Acceptance): { words: string; figure: string } {
  const comparison = acceptance.comparison === 'at-most' ? 'at most' : 'at least';
  return {
    words: `${acceptance.quantity} ${comparison}`,
    figure: withUnit(acceptance.value, acceptance.unit),
  };
}

function signed(value: number): string {
  return minus(String(value));
}

function minus(text: string): string {
  return text.replace('-', '−');
}

function decimalsOf(value: number): number {
  return Math.min(6, String(value).split('.')[1]?.length ?? 0);
}
