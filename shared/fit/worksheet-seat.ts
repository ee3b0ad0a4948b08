import type { SeatInputs, WorksheetFigure, WorksheetSummary } from '../contract/worksheet.js';
import type { Dimension, Figure } from './dimension.js';
import { usualUncertainty } from './instruments.js';
import { judgeJoint, type FeatureOnHand, type JointVerdict } from './joint-verdict.js';
import { judgeSeat, type SeatResult } from './seat.js';
import { outOfPlane } from './tilt.js';
import { InputCheck, ranges, type Outcome } from './worksheet-range.js';

export interface SeatSheet {
  readonly a: FeatureOnHand;
  readonly b: FeatureOnHand;
  readonly seat: SeatResult;
  readonly verdict: JointVerdict;
  /** Worst tilt in degrees with its standard uncertainty from the gap's; the plate's width counts as exact. */
  readonly tilt: { readonly value: number; readonly uncertainty: number } | null;
  /** How far a gear or pulley of the face width typed runs out of plane at the worst tilt, mm. */
  readonly outOfPlane: number | null;
  /** Gap as it can be handed to a shim sheet, mm; null where the faces meet. */
  readonly gap: Figure | null;
  readonly summary: WorksheetSummary;
}

const roughness = { machined: 0, printed: 1, cast: 2 } as const;

/** The seat sheet: both features as typed, judged. Out-of-range inputs are named, and then there is no result. */
export function runSeat(inputs: SeatInputs): Outcome<SeatSheet> {
  const check = new InputCheck(inputs.unit);
  const [inner, outer, height] =
    inputs.form === 'boss-recess' ? ['boss', 'recess', 'height'] : ['barrel', 'bore', 'length'];
  const read = (name: DimensionField, label: string | null): Dimension | null => {
    const value = label
      ? check.neededLength(name, label, inputs[name], ranges.dimension)
      : check.length(name, inputs[name], ranges.dimension);
    const own = check.length(`${name}Uncertainty`, inputs[`${name}Uncertainty` as const], ranges.uncertainty);
    const instrument = name.startsWith('boss') ? inputs.bossInstrument : inputs.recessInstrument;
    if (value === null) return null;
    return { value, uncertainty: own ?? usualUncertainty(instrument, 'mm'), source: { kind: 'own-reading' } };
  };
  const bossDiameter = read('bossDiameter', `diameter of the ${inner}`);
  const recessDiameter = read('recessDiameter', `diameter of the ${outer}`);
  const bossHeight = read('bossHeight', null);
  const recessDepth = read('recessDepth', null);
  const plateWidth = check.length('plateWidth', inputs.plateWidth, ranges.dimension);
  const faceWidth = check.length('faceWidth', inputs.faceWidth, ranges.dimension);
  if (plateWidth !== null && bossDiameter && plateWidth <= bossDiameter.value)
    check.tell('plateWidth', `Out of range: has to be wider than the ${inner}; leave it empty for no tilt.`);
  if (!check.isClear) return check.outcome<SeatSheet>(null);

  const process =
    roughness[inputs.bossProcess] >= roughness[inputs.recessProcess]
      ? inputs.bossProcess
      : inputs.recessProcess;
  const seat = judgeSeat({
    bossDiameter,
    bossHeight,
    recessDiameter,
    recessDepth,
    process,
    ...(plateWidth === null ? {} : { plateWidth }),
  });
  const plate = plateWidth === null ? null : exactly(plateWidth);
  const a = onHand({ diameter: bossDiameter, [height!]: bossHeight, plateWidth: plate }, inputs.bossProcess);
  const b = onHand({ diameter: recessDiameter, depth: recessDepth }, inputs.recessProcess);
  const verdict = judgeJoint(inputs.form, a, b);
  const gap = seat.gap && seat.gap.value > 0 ? seat.gap : null;
  const worst = seat.tilt?.worst ?? null;
  const tilt =
    worst && gap && plateWidth !== null && bossDiameter
      ? {
          value: worst.degrees,
          uncertainty: tiltUncertainty(gap, (plateWidth - bossDiameter.value) / 2, worst.degrees),
        }
      : null;
  const run = tilt && faceWidth !== null && worst ? outOfPlane(faceWidth, worst) : null;
  return check.outcome<SeatSheet>({
    a,
    b,
    seat,
    verdict,
    tilt,
    outOfPlane: run,
    gap,
    summary: { sentence: verdict.sentence, figures: figuresOf(seat, gap, tilt, run) },
  });
}

type DimensionField = 'bossDiameter' | 'bossHeight' | 'recessDiameter' | 'recessDepth';

function exactly(value: number): Dimension {
  return { value, uncertainty: 0, source: { kind: 'own-reading' } };
}

function onHand(
  dimensions: Record<string, Dimension | null>,
  process: FeatureOnHand['process'],
): FeatureOnHand {
  const known = Object.entries(dimensions).filter(([, dimension]) => dimension !== null);
  return { dimensions: Object.fromEntries(known) as Record<string, Dimension>, attributes: {}, process };
}

/** First order of asin(gap / L): u / (L cos tilt), in degrees. */
function tiltUncertainty(gap: Figure, length: number, degrees: number): number {
  const cosine = Math.max(0.01, Math.cos((degrees * Math.PI) / 180));
  return ((gap.uncertainty / (length * cosine)) * 180) / Math.PI;
}

function figuresOf(
  seat: SeatResult,
  gap: Figure | null,
  tilt: { value: number; uncertainty: number } | null,
  run: number | null,
): WorksheetFigure[] {
  const length = (name: string, label: string, value: Figure | null): WorksheetFigure[] =>
    value ? [{ name, label, value: value.value, uncertainty: value.uncertainty, unit: 'mm' }] : [];
  const chance = (name: string, label: string, value: number | null): WorksheetFigure[] =>
    value === null ? [] : [{ name, label, value, uncertainty: null, unit: 'chance' }];
  return [
    ...length('clearance', 'Clearance on diameter', seat.clearance),
    ...chance('chanceEnters', 'Chance that it enters', seat.chanceEnters),
    ...length('depthSpare', 'Depth to spare', seat.depthSpare),
    ...chance('chanceFaceMeets', 'Chance that the faces meet before it bottoms', seat.chanceFaceMeets),
    ...chance('chanceSeats', 'Chance that it seats', seat.chanceSeats),
    ...length('gap', 'Gap left, pulled evenly', gap),
    ...(tilt ? [{ name: 'tilt', label: 'Tilt, pulled on one side', ...tilt, unit: 'deg' } as const] : []),
    ...(run === null
      ? []
      : [
          {
            name: 'outOfPlane',
            label: 'Out of plane over the face width, at that tilt',
            value: run,
            uncertainty: null,
            unit: 'mm',
          } as const,
        ]),
  ];
}
