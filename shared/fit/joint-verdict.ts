import type { Process } from '../statistics/consensus.js';
import { judgeClampRing } from './clamp-ring.js';
import type { Dimension, Figure } from './dimension.js';
import { judgeDovetail } from './dovetail.js';
import { judgeEnvelope, type AngleInterval, type EnvelopeBody } from './envelope.js';
import { dimensionSpec, featureSpecs } from './feature-dimensions.js';
import { judgeHolePattern } from './hole-pattern.js';
import type { IsoFit } from './iso-286.js';
import { jointKinds, type JointKind } from './joint-kinds.js';
import * as say from './joint-sentence.js';
import { judgeSeat } from './seat.js';
import { judgeShaftBore, type DriveForm } from './shaft-bore.js';
import { judgeThreadPair } from './thread-pair.js';
import type { Tilt } from './tilt.js';
import type { SeatVerdict } from './verdict.js';

/** What is known of a feature of the one part in the reader's hand: dimensions in mm or degrees, attributes in words. */
export interface FeatureOnHand {
  readonly dimensions: Readonly<Record<string, Dimension | undefined>>;
  readonly attributes: Readonly<Record<string, string | undefined>>;
  readonly process: Process;
}

/** A dimension or attribute nobody has read yet, and how to read it. */
export interface MissingReading {
  readonly side: 'a' | 'b';
  readonly name: string;
  readonly label: string;
  readonly howTo: string;
}

export interface JointVerdict {
  readonly verdict: SeatVerdict;
  /** Room in the direction that decides, mm; negative is overlap. */
  readonly margin: Figure | null;
  readonly marginOf: string;
  readonly chance: number | null;
  /** What touches instead, in words; null where it seats. */
  readonly touches: string | null;
  readonly gap: Figure | null;
  readonly tilt: { readonly best: Tilt; readonly worst: Tilt | null } | null;
  /** Angles that stay free for the second body; only for envelopes. */
  readonly freeAngles: readonly AngleInterval[] | null;
  /** Turn that would clear it, degrees. */
  readonly turnNeeded: number | null;
  readonly isoFit: IsoFit | null;
  readonly sentence: string;
  readonly missing: readonly MissingReading[];
}

/** The rougher of two processes decides snug limits. */
const roughness: Record<Process, number> = { machined: 0, printed: 1, cast: 2 };

/**
 * Verdict for two features by the kind of their joint. Lengths mm, angles degrees. A missing dimension never throws: it is
 * named in `missing` with how to read it. RangeError where a dimension lies outside the range of its judge.
 */
export function judgeJoint(kind: JointKind, a: FeatureOnHand, b: FeatureOnHand): JointVerdict {
  const process = roughness[a.process] >= roughness[b.process] ? a.process : b.process;
  const result = judges[kind](reader(a), reader(b), process);
  return {
    ...empty,
    ...result,
    missing: result.missing.map(([side, name]) => describeMissing(kind, side, name)),
  };
}

type Reader = { dim(name: string): Dimension | null; word(name: string): string | null };
type Judged = Partial<Omit<JointVerdict, 'missing'>> &
  Pick<JointVerdict, 'verdict' | 'sentence'> & { missing: readonly (readonly ['a' | 'b', string])[] };

const empty = {
  margin: null,
  marginOf: 'clearance on diameter',
  chance: null,
  touches: null,
  gap: null,
  tilt: null,
  freeAngles: null,
  turnNeeded: null,
  isoFit: null,
};

function reader(feature: FeatureOnHand): Reader {
  return {
    dim: (name) => feature.dimensions[name] ?? null,
    word: (name) => feature.attributes[name] ?? null,
  };
}

const judges: Record<JointKind, (a: Reader, b: Reader, process: Process) => Judged> = {
  'boss-recess': (a, b, process) =>
    seat(
      a.dim('diameter'),
      a.dim('height'),
      b.dim('diameter'),
      b.dim('depth'),
      process,
      ['boss', 'recess', 'height'],
      a.dim('plateWidth'),
    ),
  'barrel-bore': (a, b, process) =>
    seat(
      a.dim('diameter'),
      a.dim('length'),
      b.dim('diameter'),
      b.dim('depth'),
      process,
      ['barrel', 'bore', 'length'],
      null,
    ),
  'thread-pair': (a, b) => {
    const result = judgeThreadPair(threadSide(a), threadSide(b));
    return {
      verdict: result.verdict,
      margin: result.depthSpare,
      marginOf: 'depth to spare',
      chance: result.chance,
      gap: result.standOff,
      touches:
        result.trouble === 'bottoms' ? 'the end of the male thread on the floor of the female one' : null,
      sentence: say.thread(result),
      missing: result.missing.map((name) => split(name)),
    };
  },
  'hole-pattern': (a, b) => {
    const result = judgeHolePattern({
      holes: {
        count: a.dim('count')?.value ?? null,
        circle: a.dim('circle'),
        holeDiameter: a.dim('holeDiameter'),
        slotTravel: a.dim('slotTravel'),
        slotAlong: a.word('slotAlong') as 'radius' | 'circle' | null,
      },
      tapped: { count: b.dim('count')?.value ?? null, circle: b.dim('circle'), screw: b.word('screw') },
    });
    return {
      verdict: result.verdict,
      margin: result.margin,
      marginOf: 'radial play left',
      chance: result.chance,
      touches: result.trouble === null ? null : 'the screws against the edges of their holes',
      sentence: say.holes(result),
      missing: result.missing.map((name) => split(name.replace('holes.', 'a.').replace('tapped.', 'b.'))),
    };
  },
  'barrel-clamp': (a, b) => {
    const result = judgeClampRing(
      { open: b.dim('diameter'), closed: b.dim('closedDiameter') },
      a.dim('diameter'),
    );
    const names = {
      'clamp.open': ['b', 'diameter'],
      'clamp.closed': ['b', 'closedDiameter'],
      'barrel.diameter': ['a', 'diameter'],
    } as const;
    return {
      verdict: result.verdict,
      margin: result.margin,
      marginOf: "distance to the end of the clamp's range, on diameter",
      chance: result.chance,
      touches:
        result.trouble === 'barrel-too-small'
          ? 'the split closes before the ring grips'
          : result.trouble === 'barrel-too-large'
            ? 'the barrel on the edge of the ring'
            : null,
      sentence: say.clamp(result),
      missing: result.missing.map((name) => names[name]),
    };
  },
  'shaft-bore': (a, b, process) => {
    const result = judgeShaftBore(driveSide(a), driveSide(b), process);
    return {
      verdict: result.verdict,
      margin: result.clearance,
      chance: result.chance,
      isoFit: result.isoFit,
      touches:
        result.trouble === 'drive-form'
          ? 'the flat or key of the bore on a shaft without one'
          : result.trouble
            ? 'the shaft on the edge of the bore'
            : null,
      sentence: say.shaft(result),
      missing: result.missing.map((name) => split(name.replace('shaft.', 'a.').replace('bore.', 'b.'))),
    };
  },
  dovetail: (a, b) => {
    const result = judgeDovetail(dovetailSide(a), dovetailSide(b));
    return {
      verdict: result.verdict,
      margin: result.clearance,
      marginOf: "opening minus bar at the bar's reference height",
      chance: result.chance,
      touches:
        result.trouble === 'flank-angle'
          ? 'an edge of the bar instead of its flank'
          : result.trouble
            ? "the bar on the clamp's jaws"
            : null,
      sentence: say.dovetail(result),
      missing: result.missing.map((name) => split(name.replace('bar.', 'a.').replace('clamp.', 'b.'))),
    };
  },
  envelope: (a, b) => {
    const result = judgeEnvelope(body(a), body(b));
    const stays = result.verdict === 'tight' || result.verdict === 'will-not-seat';
    return {
      verdict: result.verdict,
      margin: result.margin,
      marginOf: 'room in radius or height',
      chance: result.chance,
      touches: stays ? 'the two bodies at the same angle' : null,
      freeAngles: result.freeAngles,
      turnNeeded: result.turnNeeded,
      sentence: say.envelope(result),
      missing: result.missing.map((name) => split(name.replace('body.', 'a.').replace('obstruction.', 'b.'))),
    };
  },
};

function seat(
  inner: Dimension | null,
  height: Dimension | null,
  outer: Dimension | null,
  depth: Dimension | null,
  process: Process,
  words: readonly [string, string, 'height' | 'length'],
  plateWidth: Dimension | null,
): Judged {
  const result = judgeSeat({
    bossDiameter: inner,
    bossHeight: height,
    recessDiameter: outer,
    recessDepth: depth,
    process,
    ...(plateWidth ? { plateWidth: plateWidth.value } : {}),
  });
  const names = {
    bossDiameter: ['a', 'diameter'],
    bossHeight: ['a', words[2]],
    recessDiameter: ['b', 'diameter'],
    recessDepth: ['b', 'depth'],
  } as const;
  const decidedByDepth = result.carriedBy === 'boss-on-floor';
  return {
    verdict: result.verdict,
    chance: result.chanceSeats,
    gap: result.gap,
    tilt: result.tilt,
    isoFit: result.isoFit,
    margin: decidedByDepth ? result.depthSpare : result.clearance,
    marginOf: decidedByDepth ? 'depth to spare' : 'clearance on diameter',
    touches:
      result.carriedBy === 'boss-on-face'
        ? `the end of the ${words[0]} on the face round the ${words[1]}`
        : decidedByDepth
          ? `the end of the ${words[0]} on the floor of the ${words[1]}`
          : null,
    sentence: say.seat(result, words),
    missing: result.missing.map((name) => names[name]),
  };
}

function threadSide(side: Reader): {
  designation: string | null;
  sex: 'male' | 'female' | null;
  length: Dimension | null;
} {
  return {
    designation: side.word('designation'),
    sex: side.word('sex') as 'male' | 'female' | null,
    length: side.dim('length'),
  };
}

function driveSide(side: Reader): {
  diameter: Dimension | null;
  driveSize: Dimension | null;
  form: DriveForm | null;
} {
  return {
    diameter: side.dim('diameter'),
    driveSize: side.dim('driveSize'),
    form: side.word('form') as DriveForm | null,
  };
}

function dovetailSide(side: Reader): Parameters<typeof judgeDovetail>[0] {
  return {
    width: side.dim('width'),
    referenceHeight: side.dim('referenceHeight'),
    flankAngle: side.dim('flankAngle'),
  };
}

function body(side: Reader): EnvelopeBody {
  return {
    innerRadius: side.dim('innerRadius'),
    outerRadius: side.dim('outerRadius'),
    bottom: side.dim('bottom'),
    top: side.dim('top'),
    angle: side.dim('angle'),
    width: side.dim('width'),
  };
}

function split(name: string): readonly ['a' | 'b', string] {
  const [side, ...rest] = name.split('.');
  return [side as 'a' | 'b', rest.join('.')];
}

function describeMissing(kind: JointKind, side: 'a' | 'b', name: string): MissingReading {
  const featureKind = jointKinds[kind][side];
  const dimension = dimensionSpec(featureKind, name);
  const attribute = featureSpecs[featureKind].attributes.find((entry) => entry.name === name);
  return {
    side,
    name,
    label: dimension?.label ?? attribute?.label ?? name,
    howTo: dimension?.howTo ?? 'Read it off the part or its drawing.',
  };
}
