import type { Dimension } from '../fit/dimension.js';
import { judgeEnvelope, type EnvelopeBody } from '../fit/envelope.js';
import { clearanceHoles } from '../fit/hole-pattern.js';
import type { JointKind } from '../fit/joint-kinds.js';
import type { FeatureOnHand } from '../fit/joint-verdict.js';
import { judgeSeat } from '../fit/seat.js';
import { readMetricThread } from '../fit/thread-pair.js';
import { dovetailSection, type DovetailBody } from './dovetail-section.js';
import { envelopePlan } from './envelope-plan.js';
import { holePlan } from './hole-plan.js';
import { threadSection } from './thread-section.js';
import { clampPlan, shaftSection } from './round-sections.js';
import { seatSection } from './seat-section.js';
import type { Drawing } from './shapes.js';

export interface JointDrawingInput {
  readonly kind: JointKind;
  readonly a: FeatureOnHand;
  readonly b: FeatureOnHand;
  /** Names shown and read out: "bracket Rev 1", "motor M1 Rev C". */
  readonly nameA: string;
  readonly nameB: string;
  /** Thickness of the chosen shim, mm. */
  readonly shim?: number;
  /** Height the chosen trim takes off, mm. */
  readonly trim?: number;
}

/**
 * The drawing of a joint from what is known of both sides, to true scale; null while a dimension it cannot do without is
 * not known, or where readings exclude each other.
 */
export function drawJoint(input: JointDrawingInput): Drawing | null {
  try {
    return drawers[input.kind](input);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

const drawers: Record<JointKind, (input: JointDrawingInput) => Drawing | null> = {
  'boss-recess': (input) => seat(input, 'height', ['boss', 'recess']),
  'barrel-bore': (input) => seat(input, 'length', ['barrel', 'bore']),
  'barrel-clamp': ({ a, b, nameA, nameB }) => {
    const [barrel, open, closed] = [dim(a, 'diameter'), dim(b, 'diameter'), dim(b, 'closedDiameter')];
    return barrel && open && closed && clampPlan(open, closed, barrel, { ring: nameB, barrel: nameA });
  },
  'shaft-bore': ({ a, b, nameA, nameB }) => {
    const [shaft, bore] = [dim(a, 'diameter'), dim(b, 'diameter')];
    const flat = (side: FeatureOnHand): Dimension | null =>
      side.attributes['form'] === 'flat' ? dim(side, 'driveSize') : null;
    return (
      shaft &&
      bore &&
      shaftSection(
        { diameter: shaft, flat: flat(a) },
        { diameter: bore, flat: flat(b) },
        { shaft: nameA, bore: nameB },
      )
    );
  },
  'hole-pattern': ({ a, b, nameA, nameB }) => {
    const [holeCircle, hole, tapCircle] = [dim(a, 'circle'), dim(a, 'holeDiameter'), dim(b, 'circle')];
    const screw = clearanceHoles[(b.attributes['screw'] ?? '').toUpperCase()]?.screw;
    const count = Math.round(dim(a, 'count')?.value ?? 3);
    if (!holeCircle || !hole || !tapCircle || screw === undefined || count < 1 || count > 36) return null;
    return holePlan({ holeCircle, hole, tapCircle, screw, count }, { holes: nameA, taps: nameB });
  },
  dovetail: ({ a, b, nameA, nameB }) => {
    const [bar, clamp] = [dovetail(a), dovetail(b)];
    return bar && clamp && dovetailSection(bar, clamp, { bar: nameA, clamp: nameB });
  },
  envelope: ({ a, b, nameA, nameB }) =>
    envelopePlan(body(a), body(b), judgeEnvelope(body(a), body(b)), { body: nameA, obstruction: nameB }),
  'thread-pair': ({ a, b, nameA, nameB }) => {
    const [length, other] = [dim(a, 'length'), dim(b, 'length')];
    const [one, two] = [a.attributes['designation'], b.attributes['designation']];
    if (!length || !other || !one || !two) return null;
    const maleFirst = a.attributes['sex'] !== 'female';
    const thread = readMetricThread(maleFirst ? one : two);
    const male = {
      diameter: thread.diameter,
      minor: thread.minorDiameter,
      length: maleFirst ? length : other,
    };
    return threadSection(
      male,
      maleFirst ? other : length,
      maleFirst ? { male: nameA, female: nameB } : { male: nameB, female: nameA },
      maleFirst ? [one, two] : [two, one],
    );
  },
};

function seat(
  input: JointDrawingInput,
  height: 'height' | 'length',
  [inner, outer]: readonly [string, string],
): Drawing | null {
  const { a, b } = input;
  const [bossDiameter, recessDiameter] = [dim(a, 'diameter'), dim(b, 'diameter')];
  if (!bossDiameter || !recessDiameter) return null;
  const [bossHeight, recessDepth, plateWidth] = [dim(a, height), dim(b, 'depth'), dim(a, 'plateWidth')];
  const result = judgeSeat({
    bossDiameter,
    recessDiameter,
    bossHeight,
    recessDepth,
    process: a.process,
    ...(plateWidth ? { plateWidth: plateWidth.value } : {}),
  });
  return seatSection({
    bossDiameter,
    recessDiameter,
    bossHeight,
    recessDepth,
    plateWidth,
    result,
    words: { inner, outer, partA: input.nameA, partB: input.nameB },
    ...(input.shim === undefined ? {} : { shim: input.shim }),
    ...(input.trim === undefined ? {} : { trim: input.trim }),
  });
}

function dim(side: FeatureOnHand, name: string): Dimension | null {
  return side.dimensions[name] ?? null;
}

function dovetail(side: FeatureOnHand): DovetailBody | null {
  const [width, referenceHeight, flankAngle] = [
    dim(side, 'width'),
    dim(side, 'referenceHeight'),
    dim(side, 'flankAngle'),
  ];
  return width && referenceHeight && flankAngle && { width, referenceHeight, flankAngle };
}

function body(side: FeatureOnHand): EnvelopeBody {
  return {
    innerRadius: dim(side, 'innerRadius'),
    outerRadius: dim(side, 'outerRadius'),
    bottom: dim(side, 'bottom'),
    top: dim(side, 'top'),
    angle: dim(side, 'angle'),
    width: dim(side, 'width'),
  };
}
