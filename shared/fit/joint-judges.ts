import type { Process } from '../statistics/consensus.js';
import { judgeClampRing } from './clamp-ring.js';
import type { Dimension } from './dimension.js';
import { judgeDovetail } from './dovetail.js';
import { judgeEnvelope, type EnvelopeBody } from './envelope.js';
import { judgeHolePattern } from './hole-pattern.js';
import type { JointVerdict } from './joint-answer.js';
import type { JointKind } from './joint-kinds.js';
import * as say from './joint-sentence.js';
import { judgeSeat } from './seat.js';
import { judgeShaftBore, type DriveForm } from './shaft-bore.js';
import { judgeThreadPair } from './thread-pair.js';

/** Looks up what is known of one side; null where nobody has read it. */
export type Reader = { dim(name: string): Dimension | null; word(name: string): string | null };
/** A verdict of one judge; what it leaves out does not apply to its kind. */
export type Judged = Partial<Omit<JointVerdict, 'missing'>> &
  Pick<JointVerdict, 'verdict' | 'sentence'> & { missing: readonly (readonly ['a' | 'b', string])[] };

/** One judge for each kind of joint: asks for the dimensions it needs and words its answer. */
export const judges: Record<JointKind, (a: Reader, b: Reader, process: Process) => Judged> = {
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
