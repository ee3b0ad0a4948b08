import type { Callout, CalloutKind, PhotoPoint } from '../contract/callouts.js';
import { readingUnitSymbols } from '../contract/vocabulary.js';

export const calloutKindWords: Record<CalloutKind, string> = {
  arrow: 'arrow',
  ring: 'ring',
  dimension: 'dimension',
};

/** The value of a dimension with its unit, "22.5 mm"; empty where it has none, and for what is no dimension. */
export function calloutFigure(callout: Callout): string {
  if (callout.kind !== 'dimension' || callout.value === null) return '';
  const unit = readingUnitSymbols[callout.unit];
  return callout.unit === 'deg' ? `${callout.value}${unit}` : `${callout.value} ${unit}`;
}

/** A callout as it is read out: `ring “lip”`, `dimension 22.5 mm “across the lip”`. */
export function calloutWords(callout: Callout): string {
  const label = callout.label.trim();
  return [calloutKindWords[callout.kind], calloutFigure(callout), label && `“${label}”`]
    .filter(Boolean)
    .join(' ');
}

/** Where a callout stands, in per cent of the photo from its left and upper edge; for comparing two editions. */
export function calloutPlace(callout: Callout): string {
  if (callout.kind === 'ring') {
    return `at ${place(callout.centre)}, radius ${percent(callout.radius)} % of the width`;
  }
  return `from ${place(callout.from)} to ${place(callout.to)}`;
}

function place({ x, y }: PhotoPoint): string {
  return `${percent(x)} % across, ${percent(y)} % down`;
}

function percent(share: number): number {
  return Math.round(share * 1000) / 10;
}
