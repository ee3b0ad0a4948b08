import type { ClampRingResult } from './clamp-ring.js';
import type { Figure } from './dimension.js';
import type { DovetailResult } from './dovetail.js';
import type { EnvelopeResult } from './envelope.js';
import type { HolePatternResult } from './hole-pattern.js';
import type { SeatResult } from './seat.js';
import type { ShaftBoreResult } from './shaft-bore.js';
import type { ThreadPairResult } from './thread-pair.js';

/** A length in mm to the digits its uncertainty allows: two decimals, three below 0.02 mm of uncertainty. */
export function length(value: Figure): string {
  return `${Math.abs(value.value).toFixed(value.uncertainty > 0 && value.uncertainty < 0.02 ? 3 : 2)} mm`;
}

/** A chance in words: what an owner may expect, never a promise. */
export function likely(chance: number): string {
  if (chance >= 0.95) return 'will probably';
  if (chance >= 0.5) return 'may well';
  if (chance > 0.05) return 'may, but rather will not,';
  return 'will probably not';
}

const settle = 'Nobody has read what would settle this yet.';

export function seat(
  result: SeatResult,
  [inner, outer, height]: readonly [string, string, 'height' | 'length'],
): string {
  if (!result.clearance || result.chanceEnters === null) return settle;
  const room = result.clearance;
  if (result.carriedBy === 'boss-on-face') {
    const standsOff = result.gap
      ? `; the faces then stay ${length(result.gap)} apart`
      : `; the faces then stay apart by the ${height} of the ${inner}`;
    return `The ${inner} ${likely(result.chanceEnters)} enter: it is ${length(room)} larger than the ${outer}${standsOff}.`;
  }
  if (result.carriedBy === 'boss-on-floor') {
    return `The ${inner} enters but ${result.gap ? `bottoms ${length(result.gap)} before the faces meet` : 'bottoms before the faces meet'}.`;
  }
  return `The ${inner} ${likely(result.chanceSeats ?? result.chanceEnters)} seat, with ${length(room)} of clearance on diameter.`;
}

export function thread(result: ThreadPairResult): string {
  switch (result.trouble) {
    case 'same-sex':
      return 'Both threads are of the same sex: an adapter is needed.';
    case 'other-diameter':
      return 'The threads have different diameters: an adapter is needed.';
    case 'other-pitch':
      return 'The threads have different pitches: they would jam after a turn or two. An adapter is needed.';
    case 'bottoms':
      return `The male thread bottoms${result.standOff ? ` and the shoulders stay ${length(result.standOff)} apart` : ''}.`;
    default:
  }
  if (result.verdict === 'not-known') return settle;
  if (!result.engagement) return 'Diameter, pitch and sex agree; whether it bottoms needs both lengths.';
  const turns = result.fewTurns ? ' That is fewer than three turns.' : '';
  return `The threads agree, with ${length(result.engagement)} in mesh.${turns}`;
}

export function holes(result: HolePatternResult): string {
  if (result.trouble === 'count') return 'The counts of holes do not go together.';
  if (!result.margin || result.chance === null) return settle;
  if (result.trouble === 'screw') return 'The screw is thicker than the hole.';
  if (result.trouble === 'circle')
    return `The circles differ by ${length(result.margin)} more on radius than the holes allow.`;
  return `The screws ${likely(result.chance)} go in, with ${length(result.margin)} of play left on radius.`;
}

export function clamp(result: ClampRingResult): string {
  if (!result.margin || result.chance === null) return settle;
  if (result.trouble === 'barrel-too-large')
    return `The barrel is ${length(result.margin)} too large for the ring, screw slack.`;
  if (result.trouble === 'barrel-too-small') {
    return `The barrel is ${length(result.margin)} too small: the split closes first.${result.sleeve ? ` A strip ${length(result.sleeve)} thick round it brings it to the middle of the range.` : ''}`;
  }
  return `The ring ${likely(result.chance)} hold the barrel; it lies ${length(result.margin)} inside the range.`;
}

export function shaft(result: ShaftBoreResult): string {
  if (result.trouble === 'drive-form') return 'The bore has a flat or key that the shaft lacks.';
  if (!result.clearance || result.chance === null) return settle;
  if (result.trouble === 'diameter') return `The shaft is ${length(result.clearance)} thicker than the bore.`;
  if (result.trouble === 'drive-size') return 'The round part goes in, the flat or key does not.';
  const play = result.playDegrees
    ? ` It can turn ${result.playDegrees.toFixed(1)}° before the flat or key carries.`
    : '';
  return `The bore ${likely(result.chance)} go on, with ${length(result.clearance)} of clearance.${play}`;
}

export function dovetail(result: DovetailResult): string {
  if (!result.clearance || result.chance === null) return settle;
  if (result.trouble === 'too-wide')
    return `The bar is ${length(result.clearance)} wider than the clamp opens.`;
  if (result.trouble === 'flank-angle')
    return `The flanks differ by ${result.angleDifference!.value.toFixed(1)}°: the bar would be held by an edge.`;
  return `The bar ${likely(result.chance)} go in, with ${length(result.clearance)} to spare before the jaws close.`;
}

export function envelope(result: EnvelopeResult): string {
  if (result.verdict === 'not-known' || !result.margin) return settle;
  if (result.passes === 'in-radius')
    return `It passes with ${length(result.margin)} of room in radius, at every angle.`;
  if (result.passes === 'in-height')
    return `It passes with ${length(result.margin)} of room in height, at every angle.`;
  const free = result.freeAngles?.[0];
  const angles = free ? `from ${Math.round(free.from)}° to ${Math.round(free.to) % 360}°` : '';
  if (result.passes === 'in-angle' && result.verdict !== 'tight')
    return `It clears where it stands now; free angles are ${angles}.`;
  if (result.turnNeeded !== null) {
    return `They overlap by ${length(result.margin)}; turned by ${Math.ceil(Math.abs(result.turnNeeded))}° it clears. Free angles are ${angles}; turning it moves the camera angle, so flats are due.`;
  }
  if (free)
    return `They overlap at some angles; it clears if it can stand ${angles}. Turning it moves the camera angle, so flats are due.`;
  return `They overlap by ${length(result.margin)} at every angle.`;
}
