import type { WorksheetInputs, WorksheetRecord } from '../../shared/contract/worksheet.js';
import { summarise } from '../../shared/fit/worksheet.js';

/** By how much the readings of those who worked it out themselves differ from the author's, in mm. */
const ownReadings = [0.02, -0.03, 0.05];

/** The author's worksheet as the `index`th trier (from 0) ran it with a reading of their own; null for most triers. */
export function ownWorksheet(authors: WorksheetRecord | null, index: number): WorksheetRecord | null {
  const by = index % 2 === 0 ? ownReadings[index / 2] : undefined;
  if (authors === null || by === undefined) return null;
  return runAgain(authors.kind, { ...authors.inputs, ...movedReading(authors, by) }, authors.version);
}

function movedReading(authors: WorksheetRecord, by: number): object {
  const moved = (value: number | null): number | null =>
    value === null ? null : Math.round((value + by) * 100) / 100;
  return authors.kind === 'shim'
    ? { gap: moved(authors.inputs.gap) }
    : { bossDiameter: moved(authors.inputs.bossDiameter) };
}

function runAgain(
  kind: WorksheetRecord['kind'],
  inputs: WorksheetRecord['inputs'],
  version: WorksheetRecord['version'],
): WorksheetRecord {
  const { result } = summarise(kind, inputs as WorksheetInputs[typeof kind]);
  if (!result)
    throw new Error(`The demo's ${kind} worksheet comes to no result with ${JSON.stringify(inputs)}.`);
  return { kind, version, inputs, result } as WorksheetRecord;
}
