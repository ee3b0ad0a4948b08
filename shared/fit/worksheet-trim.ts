import type { TrimInputs, WorksheetFigure, WorksheetSummary } from '../contract/worksheet.js';
import type { Dimension, Figure } from './dimension.js';
import { usualUncertainty } from './instruments.js';
import { leastWall, sizeTrim, type TrimResult } from './trim.js';
import { InputCheck, ranges, type Outcome } from './worksheet-range.js';

/** What is taken off beyond the bare need, and the clearance on diameter, where nothing is typed; mm, common practice, no source. */
export const usualAllowance = 0.2;
export const usualClearance = 0.2;

export interface TrimSheet {
  readonly bossDiameter: Dimension;
  readonly bossHeight: Dimension;
  readonly recessDiameter: Dimension;
  readonly recessDepth: Dimension | null;
  readonly trim: TrimResult;
  /** Wall under which a warning is given, mm. */
  readonly leastWall: number;
  readonly summary: WorksheetSummary;
}

/** The trim sheet. Out-of-range inputs are named, and then there is no result. */
export function runTrim(inputs: TrimInputs): Outcome<TrimSheet> {
  const check = new InputCheck(inputs.unit);
  const usual = usualUncertainty(inputs.instrument, 'mm');
  const read = (name: DimensionField, label: string | null): Dimension | null => {
    const value = label
      ? check.neededLength(name, label, inputs[name], ranges.dimension)
      : check.length(name, inputs[name], ranges.dimension);
    const own = check.length(`${name}Uncertainty`, inputs[`${name}Uncertainty` as const], ranges.uncertainty);
    return value === null ? null : { value, uncertainty: own ?? usual, source: { kind: 'own-reading' } };
  };
  const bossDiameter = read('bossDiameter', 'diameter of the boss');
  const bossHeight = read('bossHeight', 'height of the boss');
  const recessDiameter = read('recessDiameter', 'diameter of the recess');
  const recessOuter = read('recessOuter', null);
  const depth = check.length('recessDepth', inputs.recessDepth, ranges.dimension);
  const allowance = check.length('allowance', inputs.allowance, ranges.allowance) ?? usualAllowance;
  const clearanceWanted =
    check.length('clearanceWanted', inputs.clearanceWanted, ranges.allowance) ?? usualClearance;
  if (recessOuter && recessDiameter && recessOuter.value <= recessDiameter.value)
    check.tell('recessOuter', 'Out of range: has to be larger than the recess it goes round.');
  if (!bossDiameter || !bossHeight || !recessDiameter || !check.isClear)
    return check.outcome<TrimSheet>(null);
  const trim = sizeTrim({
    bossDiameter,
    bossHeight,
    recessDiameter,
    recessOuter,
    process: inputs.process,
    allowance,
    clearanceWanted,
  });
  return check.outcome<TrimSheet>({
    bossDiameter,
    bossHeight,
    recessDiameter,
    recessDepth:
      depth === null ? null : { value: depth, uncertainty: usual, source: { kind: 'own-reading' } },
    trim,
    leastWall: leastWall[inputs.process],
    summary: { sentence: sentenceOf(trim, leastWall[inputs.process]), figures: figuresOf(trim) },
  });
}

type DimensionField = 'bossDiameter' | 'bossHeight' | 'recessDiameter' | 'recessOuter';

function sentenceOf(trim: TrimResult, least: number): string {
  if (!trim.offDiameter)
    return 'The boss clears the recess already with the clearance wanted: nothing has to come off.';
  const wall = trim.wallLeft
    ? trim.wallLeft.value <= 0
      ? ' Opening the recess that far would cut through its wall.'
      : ` Opening it leaves a wall of ${trim.wallLeft.value.toFixed(2)} mm${trim.wallTooThin ? `, thinner than the ${least} mm below which such walls often break` : ''}.`
    : '';
  return `Either take ${trim.offHeight.value.toFixed(2)} mm off the boss's height, or open the recess by ${trim.offDiameter.value.toFixed(2)} mm on diameter.${wall}`;
}

function figuresOf(trim: TrimResult): WorksheetFigure[] {
  const length = (name: string, label: string, value: Figure | null): WorksheetFigure[] =>
    value ? [{ name, label, value: value.value, uncertainty: value.uncertainty, unit: 'mm' }] : [];
  if (!trim.offDiameter) return [];
  return [
    ...length('offHeight', "Off the boss's height, allowance included", trim.offHeight),
    ...length('offDiameter', 'Or: open the recess by, on diameter', trim.offDiameter),
    ...length('newRecess', 'New diameter of the recess', trim.newRecess),
    ...length('wallLeft', 'Wall left round it', trim.wallLeft),
  ];
}
