import { z } from 'zod';
import { Instrument } from './vocabulary.js';

/** Grows when inputs get another meaning; a sheet of a version that is not known is refused, never guessed at. */
export const worksheetVersion = 1;

export const worksheetKinds = ['seat', 'shim', 'trim'] as const;
export type WorksheetKind = (typeof worksheetKinds)[number];

/** Unit of every length of a sheet, as it was typed. */
export const LengthUnit = z.enum(['mm', 'in']);
export type LengthUnit = z.infer<typeof LengthUnit>;

const Process = z.enum(['machined', 'printed', 'cast']);
/** A figure as typed, in the sheet's unit; null where the field is empty. Ranges are told by the computation. */
const Typed = z.number().finite().nullable();

export const SeatInputs = z.strictObject({
  unit: LengthUnit,
  form: z.enum(['boss-recess', 'barrel-bore']),
  /** What enters: boss or barrel. Uncertainties are standard; null takes the instrument's usual one. */
  bossDiameter: Typed,
  bossDiameterUncertainty: Typed,
  bossHeight: Typed,
  bossHeightUncertainty: Typed,
  bossProcess: Process,
  bossInstrument: Instrument,
  plateWidth: Typed,
  /** What it enters: recess or bore. */
  recessDiameter: Typed,
  recessDiameterUncertainty: Typed,
  recessDepth: Typed,
  recessDepthUncertainty: Typed,
  recessProcess: Process,
  recessInstrument: Instrument,
  /** Width of the gear or pulley that hangs on it. */
  faceWidth: Typed,
});
export type SeatInputs = z.infer<typeof SeatInputs>;

export const StockFamily = z.enum([
  'coin',
  'washer',
  'shim-ring',
  'feeler-leaf',
  'sheet',
  'tape',
  'printed-layer',
]);
export type StockFamily = z.infer<typeof StockFamily>;

/** A piece of the reader's own, always in mm, so that whoever re-runs the sheet has it too. */
export const OwnPiece = z.strictObject({
  name: z.string().max(80),
  thickness: z.number().positive().max(100),
  uncertainty: z.number().min(0).max(10),
  available: z.number().int().min(1).max(999).nullable(),
});
export type OwnPiece = z.infer<typeof OwnPiece>;

export const ShimInputs = z.strictObject({
  unit: LengthUnit,
  gap: Typed,
  gapUncertainty: Typed,
  tolerance: Typed,
  mostPieces: Typed,
  layout: z.enum(['ring', 'three-points']),
  boltCircle: Typed,
  families: z.array(StockFamily).max(10),
  /** Ids of kinds of stock that are not to be used. */
  excluded: z.array(z.string().max(40)).max(100),
  own: z.array(OwnPiece).max(40),
  /** The stack that was chosen, by its key; empty for the first. */
  chosen: z.string().max(400),
  /** Only for the drawing. */
  bossDiameter: Typed,
  bossHeight: Typed,
  recessDiameter: Typed,
  recessDepth: Typed,
});
export type ShimInputs = z.infer<typeof ShimInputs>;

export const TrimInputs = z.strictObject({
  unit: LengthUnit,
  bossDiameter: Typed,
  bossDiameterUncertainty: Typed,
  bossHeight: Typed,
  bossHeightUncertainty: Typed,
  recessDiameter: Typed,
  recessDiameterUncertainty: Typed,
  recessOuter: Typed,
  recessOuterUncertainty: Typed,
  /** Only for the drawing. */
  recessDepth: Typed,
  instrument: Instrument,
  /** How the part with the recess was made; sets the least wall. */
  process: Process,
  allowance: Typed,
  clearanceWanted: Typed,
});
export type TrimInputs = z.infer<typeof TrimInputs>;

export interface WorksheetInputs {
  readonly seat: SeatInputs;
  readonly shim: ShimInputs;
  readonly trim: TrimInputs;
}

/** A worked-out figure; uncertainty is standard, null where the figure has none. Lengths mm, angles degrees, chances 0 to 1. */
export const WorksheetFigure = z.object({
  name: z.string().max(40),
  label: z.string().max(120),
  value: z.number(),
  uncertainty: z.number().nullable(),
  unit: z.enum(['mm', 'deg', 'chance']),
});
export type WorksheetFigure = z.infer<typeof WorksheetFigure>;

export const WorksheetSummary = z.object({
  sentence: z.string().max(500),
  figures: z.array(WorksheetFigure).max(20),
});
export type WorksheetSummary = z.infer<typeof WorksheetSummary>;

const recordOf = <K extends WorksheetKind, I extends z.ZodType>(kind: K, inputs: I) =>
  z.strictObject({
    kind: z.literal(kind),
    version: z.literal(worksheetVersion),
    inputs,
    result: WorksheetSummary,
  });

/** A worksheet as it is attached: what was typed, what came out, and by which version; `runWorksheet` runs it again. */
export const WorksheetRecord = z.discriminatedUnion('kind', [
  recordOf('seat', SeatInputs),
  recordOf('shim', ShimInputs),
  recordOf('trim', TrimInputs),
]);
export type WorksheetRecord = z.infer<typeof WorksheetRecord>;

export const emptySeat: SeatInputs = {
  unit: 'mm',
  form: 'boss-recess',
  bossDiameter: null,
  bossDiameterUncertainty: null,
  bossHeight: null,
  bossHeightUncertainty: null,
  bossProcess: 'printed',
  bossInstrument: 'caliper',
  plateWidth: null,
  recessDiameter: null,
  recessDiameterUncertainty: null,
  recessDepth: null,
  recessDepthUncertainty: null,
  recessProcess: 'machined',
  recessInstrument: 'caliper',
  faceWidth: null,
};

export const emptyShim: ShimInputs = {
  unit: 'mm',
  gap: null,
  gapUncertainty: null,
  tolerance: null,
  mostPieces: 3,
  layout: 'ring',
  boltCircle: null,
  families: ['coin', 'washer', 'shim-ring', 'feeler-leaf', 'sheet', 'tape'],
  excluded: [],
  own: [],
  chosen: '',
  bossDiameter: null,
  bossHeight: null,
  recessDiameter: null,
  recessDepth: null,
};

export const emptyTrim: TrimInputs = {
  unit: 'mm',
  bossDiameter: null,
  bossDiameterUncertainty: null,
  bossHeight: null,
  bossHeightUncertainty: null,
  recessDiameter: null,
  recessDiameterUncertainty: null,
  recessOuter: null,
  recessOuterUncertainty: null,
  recessDepth: null,
  instrument: 'caliper',
  process: 'printed',
  allowance: null,
  clearanceWanted: null,
};

export const emptyInputs: WorksheetInputs = { seat: emptySeat, shim: emptyShim, trim: emptyTrim };
export const worksheetSchemas = { seat: SeatInputs, shim: ShimInputs, trim: TrimInputs } as const;
