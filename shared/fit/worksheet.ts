import type {
  WorksheetInputs,
  WorksheetKind,
  WorksheetRecord,
  WorksheetSummary,
} from '../contract/worksheet.js';
import type { Outcome } from './worksheet-range.js';
import { runSeat } from './worksheet-seat.js';
import { runShim } from './worksheet-shim.js';
import { runTrim } from './worksheet-trim.js';

export interface WorksheetRun extends Outcome<WorksheetSummary> {
  /** Whether it came to something else than the record says: the computation has been mended since, or the record was changed. */
  readonly differs: boolean;
}

const runners: {
  [K in WorksheetKind]: (inputs: WorksheetInputs[K]) => Outcome<{ summary: WorksheetSummary }>;
} = {
  seat: runSeat,
  shim: runShim,
  trim: runTrim,
};

/** Runs inputs of a kind; the summary is null where an input is out of range or missing. */
export function summarise<K extends WorksheetKind>(
  kind: K,
  inputs: WorksheetInputs[K],
): Outcome<WorksheetSummary> {
  const outcome = runners[kind](inputs);
  return { ...outcome, result: outcome.result && outcome.result.summary };
}

/** Runs a worksheet that was attached anew, from its inputs alone. Pure; a few milliseconds at most for a usual shim stack. */
export function runWorksheet(record: WorksheetRecord): WorksheetRun {
  const outcome = summarise(record.kind, record.inputs as WorksheetInputs[typeof record.kind]);
  return { ...outcome, differs: !sameSummary(outcome.result, record.result) };
}

/** Figures agree to a thousandth of a micrometre, so that another engine's last digit is no difference. */
function sameSummary(one: WorksheetSummary | null, other: WorksheetSummary): boolean {
  if (one?.figures.length !== other.figures.length) return false;
  return one.figures.every((figure, index) => {
    const told = other.figures[index]!;
    return figure.name === told.name && Math.abs(figure.value - told.value) < 1e-6;
  });
}
