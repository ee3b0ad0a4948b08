import type { FitCheckLine } from '../../shared/contract/joints.js';

/** From the worst to the roomiest; what nobody knows stands between what is tight and what seats. */
const gravity: Record<FitCheckLine['verdict'], number> = {
  'will-not-seat': 0,
  tight: 1,
  'not-known': 2,
  'seats-snugly': 3,
  'seats-with-room': 4,
};

/** Sorts lines worst first; within a verdict the smaller chance first. */
export function byGravity(one: FitCheckLine, other: FitCheckLine): number {
  return (
    gravity[one.verdict] - gravity[other.verdict] ||
    (one.chance.chance ?? 0.5) - (other.chance.chance ?? 0.5) ||
    one.joint.id - other.joint.id
  );
}
