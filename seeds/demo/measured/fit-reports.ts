import type { FitVerdict } from '../../../shared/contract/joints.js';
import type { z } from 'zod';
import { pick, shuffled } from '../random.js';

/** One pair of revisions with what the measurements say of it. */
export interface JudgedPair {
  readonly joint: string;
  /** `part:letter`. */
  readonly a: string;
  readonly b: string;
  readonly verdict: z.infer<typeof FitVerdict>;
  readonly chance: number | null;
  /** First day on which both were sold. */
  readonly since: Date;
  /** People whose trial on this pair counts as a voice against it. */
  readonly tried: readonly number[];
}

export interface PlannedReport {
  readonly pair: JudgedPair;
  readonly accountId: number;
  readonly sat: boolean;
  readonly note: string;
  readonly createdAt: Date;
}

/** Members say on this pair that it does not sit, although every reading says that it does. */
const contradicted = {
  joint: 'wren-60-shield-in-dew-ring',
  a: 'larkfield-wren-60:D',
  b: 'emberfell-dew-ring:B',
};

const notes = {
  sat: [
    'Went together as it came.',
    'Sat at the first try, nothing to fill.',
    'Pressed the corners, no rock.',
    'A leaf of 0.05 mm did not go in anywhere.',
    'Went on with two fingers and came to rest on its face.',
    '',
  ],
  not: [
    'Did not go home; I could see light all round.',
    'Stopped short. Measured twice, the same both times.',
    'Stands off and rocks when I press it.',
    'Would need something under it or something off it.',
    '',
  ],
  against: [
    'Stops after 2 mm. Ring and shield measured: the ring is as told, the shield is not.',
    'Will not go over the shield, scratch included.',
    'Shield is 80.4 here, whatever the page says. Batch ring 16.',
    'Does not pass. Mine was sold as the last batch.',
    'No chance in the cold, and none in the warm.',
    'Too tight by a hair all round.',
    'Had to send the ring back.',
  ],
};

/**
 * Reports on pairs that can be judged, at most one per person and pair: as many as the chance says sat. Who has made a trial
 * on a pair of the same two parts for another reason says here that this joint was not what was wrong.
 */
export function planReports(
  pairs: readonly JudgedPair[],
  people: readonly number[],
  now: Date,
  next: () => number,
): PlannedReport[] {
  const report = (pair: JudgedPair, accountId: number, sat: boolean, note: string): PlannedReport => ({
    pair,
    accountId,
    sat,
    note,
    createdAt: new Date(
      Math.floor(pair.since.getTime() + (now.getTime() - pair.since.getTime()) * (0.02 + 0.96 * next())),
    ),
  });
  return pairs.flatMap((pair) => {
    if (pair.joint === contradicted.joint && pair.a === contradicted.a && pair.b === contradicted.b) {
      return shuffled(people, next)
        .slice(0, notes.against.length)
        .map((person, index) => report(pair, person, false, notes.against[index]!));
    }
    const { chance } = pair;
    if (chance === null) return [];
    const certain = chance >= 0.95;
    const fromTrials = certain
      ? pair.tried.map((person) =>
          report(pair, person, true, 'This seat was right; the trouble was elsewhere.'),
        )
      : [];
    const others = shuffled(
      people.filter((person) => !pair.tried.includes(person)),
      next,
    ).slice(0, next() < 0.45 ? 1 + Math.floor(next() * 3) : 0);
    return [
      ...fromTrials,
      ...others.map((person) => {
        const sat = certain ? true : chance <= 0.05 ? false : next() < chance;
        return report(pair, person, sat, pick(sat ? notes.sat : notes.not, next));
      }),
    ];
  });
}
