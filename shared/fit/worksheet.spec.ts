import { describe, expect, it } from 'vitest';
import {
  emptySeat,
  emptyShim,
  emptyTrim,
  WorksheetRecord,
  type SeatInputs,
  type ShimInputs,
  type TrimInputs,
} from '../contract/worksheet.js';
import { bestStacks } from './shim-stack.js';
import { runSeat } from './worksheet-seat.js';
import { runShim } from './worksheet-shim.js';
import { runTrim } from './worksheet-trim.js';
import { runWorksheet, summarise } from './worksheet.js';

const lip: SeatInputs = {
  ...emptySeat,
  bossDiameter: 22.5,
  bossHeight: 1.5,
  recessDiameter: 19.5,
  recessDepth: 2,
};
const figure = (figures: readonly { name: string; value: number }[], name: string): number =>
  figures.find((one) => one.name === name)!.value;

describe('the seat sheet', () => {
  it('finds that a boss of 22.5 does not enter a recess of 19.5 and stands off by its height', () => {
    const { result } = runSeat(lip);
    expect(result?.verdict.verdict).toBe('will-not-seat');
    expect(result?.gap?.value).toBe(1.5);
    expect(figure(result!.summary.figures, 'clearance')).toBeCloseTo(-3, 12);
  });

  it('tells the tilt over the rim and what it means over a face width', () => {
    const { result } = runSeat({ ...lip, plateWidth: 60, faceWidth: 6 });
    const tilt = Math.asin(1.5 / 18.75);
    expect(result?.tilt?.value).toBeCloseTo((tilt * 180) / Math.PI, 10);
    expect(result?.outOfPlane).toBeCloseTo(6 * Math.sin(tilt), 10);
  });

  it('says the same for the same lengths in inches', () => {
    const inches = {
      ...lip,
      unit: 'in' as const,
      bossDiameter: 22.5 / 25.4,
      bossHeight: 1.5 / 25.4,
      recessDiameter: 19.5 / 25.4,
      recessDepth: 2 / 25.4,
    };
    expect(runSeat(inches).result?.summary.sentence).toBe(runSeat(lip).result?.summary.sentence);
  });

  it.each([
    ['bossDiameter', { bossDiameter: 0 }],
    ['recessDiameter', { recessDiameter: 1001 }],
    ['bossHeight', { bossHeight: -1 }],
    ['recessDepthUncertainty', { recessDepthUncertainty: 11 }],
    ['plateWidth', { plateWidth: 20 }],
  ])('names %s when it is out of range, and gives no result', (field, change) => {
    const outcome = runSeat({ ...lip, ...change });
    expect(outcome.problems.map((problem) => problem.field)).toEqual([field]);
    expect(outcome.result).toBeNull();
  });

  it('names what is needed while a diameter is missing', () => {
    expect(runSeat({ ...lip, recessDiameter: null })).toEqual({
      problems: [],
      needed: ['diameter of the recess'],
      result: null,
    });
  });
});

describe('the shim sheet', () => {
  const own = (name: string, thickness: number, available: number | null = null) => ({
    name,
    thickness,
    uncertainty: 0.005,
    available,
  });

  it('finds the US cent for a gap of 1.50 mm', () => {
    const { result } = runShim({ ...emptyShim, gap: 1.5 });
    expect(result?.chosen?.key).toBe('us-cent.1');
    expect(result?.chosen?.stack.error).toBeCloseTo(0.02, 12);
  });

  it('is not led astray by the piece that comes closest first', () => {
    // Largest first takes 1.00 and is then left with 0.30, which nothing fills; two of 0.65 fill it.
    const inputs: ShimInputs = {
      ...emptyShim,
      gap: 1.3,
      tolerance: 0.01,
      families: [],
      own: [own('thick', 1), own('middling', 0.65)],
    };
    const { result } = runShim(inputs);
    expect(result?.chosen?.stack.pieces).toMatchObject([{ stock: { name: 'middling' }, count: 2 }]);
  });

  it('asks for three equal stacks where they stand on three points', () => {
    const inputs: ShimInputs = {
      ...emptyShim,
      gap: 1,
      layout: 'three-points',
      boltCircle: 40,
      families: [],
      own: [own('two of it', 1, 2), own('six of it', 0.5, 6)],
    };
    const { result } = runShim(inputs);
    expect(result?.chosen?.stack.pieces).toMatchObject([{ stock: { name: 'six of it' }, count: 2 }]);
    expect(result?.chosen?.points?.leastRadius).toBe(12);
  });

  it('leaves out what is not to be used', () => {
    const { result } = runShim({ ...emptyShim, gap: 1.5, excluded: ['us-cent'] });
    expect(result?.lines.map((line) => line.key)).not.toContain('us-cent.1');
    expect(result?.lines).toHaveLength(8);
  });

  it('keeps to the stack that was chosen', () => {
    const { result } = runShim({ ...emptyShim, gap: 1.5 });
    const third = result!.lines[2]!.key;
    expect(runShim({ ...emptyShim, gap: 1.5, chosen: third }).result?.chosen?.key).toBe(third);
  });

  it('finds what the search itself finds', () => {
    const { result } = runShim({ ...emptyShim, gap: 2.34, mostPieces: 4 });
    expect(result?.lines.map((line) => line.stack)).toEqual(bestStacks(result!.question));
  });

  it.each([
    ['gap', { gap: 0 }],
    ['gap', { gap: 101 }],
    ['mostPieces', { mostPieces: 9 }],
    ['mostPieces', { mostPieces: 2.5 }],
    ['tolerance', { tolerance: -0.1 }],
    ['families', { families: [] }],
  ])('names %s when it is out of range, and gives no result', (field, change) => {
    const outcome = runShim({ ...emptyShim, gap: 1.5, ...change });
    expect(outcome.problems.map((problem) => problem.field)).toEqual([field]);
    expect(outcome.result).toBeNull();
  });
});

describe('the trim sheet', () => {
  const collar: TrimInputs = {
    ...emptyTrim,
    bossDiameter: 22.5,
    bossHeight: 1.5,
    recessDiameter: 19.5,
    recessOuter: 26,
    allowance: 0.2,
    clearanceWanted: 0.3,
  };

  it('tells both ways and the wall that is left', () => {
    const { result } = runTrim(collar);
    expect(figure(result!.summary.figures, 'offHeight')).toBeCloseTo(1.7, 12);
    expect(figure(result!.summary.figures, 'offDiameter')).toBeCloseTo(3.3, 12);
    expect(figure(result!.summary.figures, 'wallLeft')).toBeCloseTo(1.6, 12);
    expect(result?.trim.wallTooThin).toBe(false);
  });

  it('warns where the wall gets too thin', () => {
    const { result } = runTrim({ ...collar, recessOuter: 24 });
    expect(result?.trim.wallTooThin).toBe(true);
    expect(result?.summary.sentence).toContain('thinner than the 1.2 mm');
  });

  it('has nothing to take off where it clears already', () => {
    expect(runTrim({ ...collar, bossDiameter: 19 }).result?.summary).toMatchObject({ figures: [] });
  });

  it('names an outer diameter that does not go round the recess', () => {
    expect(runTrim({ ...collar, recessOuter: 19 }).problems.map((problem) => problem.field)).toEqual([
      'recessOuter',
    ]);
  });
});

describe('a worksheet that was attached', () => {
  const attached = WorksheetRecord.parse({
    kind: 'seat',
    version: 1,
    inputs: lip,
    result: summarise('seat', lip).result,
  });

  it('comes to the same when it is run again', () => {
    expect(runWorksheet(attached)).toMatchObject({ differs: false, result: attached.result });
  });

  it('says so when it comes to something else', () => {
    const changed = structuredClone(attached);
    changed.result.figures[0]!.value += 0.01;
    expect(runWorksheet(changed).differs).toBe(true);
  });

  it('differs where its inputs no longer give a result', () => {
    const out = { ...attached, inputs: { ...lip, bossDiameter: 0 } } as WorksheetRecord;
    expect(runWorksheet(out)).toMatchObject({ differs: true, result: null });
  });

  it('is refused in a version that is not known', () => {
    expect(WorksheetRecord.safeParse({ ...attached, version: 2 }).success).toBe(false);
  });
});
