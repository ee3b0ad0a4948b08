import { normalProbability } from '../statistics/normal-distribution.js';
import type { Figure } from './dimension.js';

/** How a pair of revisions meets, from the roomiest to the one nobody can tell. */
export type SeatVerdict = 'seats-with-room' | 'seats-snugly' | 'tight' | 'will-not-seat' | 'not-known';

/** Chance from which a pair counts as seating, and up to which as not seating. */
export const certainFrom = 0.95;

/** Chance that a normal figure is zero or more; a figure without uncertainty is certain. */
export function chancePositive(value: Figure): number {
  if (value.uncertainty === 0) return value.value >= 0 ? 1 : 0;
  return normalProbability(value.value / value.uncertainty);
}

/**
 * Verdict from the chance of seating and the clearance: seats from 0.95 (with room above the snug limit, else snugly),
 * will not seat up to 0.05, tight in between. Clearance and limit in mm.
 */
export function verdictOf(chance: number, clearance: number, snugLimit: number): SeatVerdict {
  if (chance >= certainFrom) return clearance > snugLimit ? 'seats-with-room' : 'seats-snugly';
  return chance <= 1 - certainFrom ? 'will-not-seat' : 'tight';
}
