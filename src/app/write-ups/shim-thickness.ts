import type { WorksheetKind } from '../../../shared/contract/worksheet';
import type { EditionView, FixView } from '../../../shared/contract/write-ups';

const filler = /coin|washer|shim|leaf|foil|card|strip|disc/i;
const figure = /(\d+(?:\.\d+)?)(?:\s*(?:to|and|–)\s*(\d+(?:\.\d+)?))?\s*mm\b/g;
const thickest = 10;

/**
 * Thickness (mm) of the shim that a fix lays in, where the edition tells it: its worksheet, a reading, or one figure beside the
 * thing that fills ("three coins of 1.65 to 1.75 mm", "washers 3 × 6 × 0.3 mm"). Null where it tells none or several.
 */
export function shimThickness(view: EditionView, fix: FixView): number | null {
  if (fix.kind !== 'shim') return null;
  const sized = figureOf(fix, 'shim', 'thickness');
  if (sized !== null) return sized;
  const read = view.readings.filter(
    ({ dimension, unit, value }) =>
      unit === 'mm' && value !== null && filler.test(dimension) && /thick/i.test(dimension),
  );
  const told = read.length === 1 ? read[0]!.value! : thicknessIn(fix.materials);
  return told !== null && told > 0 && told <= thickest ? told : null;
}

function thicknessIn(materials: readonly string[]): number | null {
  const told = materials
    .flatMap((item) => item.split(/[;,]/))
    .filter((item) => filler.test(item))
    .flatMap((item) => [...item.matchAll(figure)])
    .map(([, from, to]) => (to === undefined ? Number(from) : (Number(from) + Number(to)) / 2));
  return told.length === 1 ? told[0]! : null;
}

/** Height (mm) that a trim takes off, where its worksheet tells it; null otherwise. */
export function trimHeight(fix: FixView): number | null {
  return figureOf(fix, 'trim', 'offHeight');
}

function figureOf(fix: FixView, kind: WorksheetKind, name: string): number | null {
  if (fix.worksheet?.kind !== kind) return null;
  return fix.worksheet.result.figures.find((figure) => figure.name === name)?.value ?? null;
}
