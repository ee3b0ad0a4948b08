import type { Knex } from 'knex';
import type { DimensionConsensus } from '../../../shared/contract/measurements.js';
import { verdictOfPair, type KnownFeature } from '../../../server/joints/fit-cell.js';
import { demoParts } from '../parts.js';
import type { Catalogue } from '../seed-catalogue.js';
import type { PlaceConsensus } from './consensus.js';
import type { JudgedPair } from './fit-reports.js';
import { demoJoints } from './joints.js';
import { atLetter } from './measured-shape.js';
import { processOf } from './process.js';
import { measuredFeatures } from './sizes.js';

/** Every pair of revisions of every joint with its verdict from the consensus given and the people who tried it. */
export async function judgePairs(
  trx: Knex,
  catalogue: Catalogue,
  consensus: readonly PlaceConsensus[],
): Promise<JudgedPair[]> {
  const known = knownFeatures(consensus);
  const tried = await triedPairs(trx);
  return demoJoints.flatMap((joint) => {
    const [partA, partB] = [joint.a, joint.b].map((side) => partOf(side));
    return partA!.revisions.flatMap((revisionA) =>
      partB!.revisions.map((revisionB): JudgedPair => {
        const [a, b] = [
          `${partA!.slug}:${letterOf(revisionA.label)}`,
          `${partB!.slug}:${letterOf(revisionB.label)}`,
        ];
        const { verdict, chance } = verdictOfPair(
          joint.kind,
          known(joint.a, letterOf(revisionA.label)),
          known(joint.b, letterOf(revisionB.label)),
        );
        const pair = `${catalogue.revisions.get(a)}/${catalogue.revisions.get(b)}`;
        const since = [revisionA.from, revisionB.from].map((from) =>
          new Date(from ?? '2023-12-01').getTime(),
        );
        return {
          joint: joint.slug,
          a,
          b,
          verdict,
          chance,
          since: new Date(Math.max(...since, new Date('2023-12-01').getTime())),
          tried: [...(tried.get(pair) ?? [])],
        };
      }),
    );
  });
}

export function letterOf(label: string): string {
  return label.replace('Rev ', '');
}

/** The part of `part/feature`. Throws for one the demo does not contain. */
export function partOf(side: string): (typeof demoParts)[number] {
  const part = demoParts.find((candidate) => candidate.slug === side.split('/')[0]);
  if (!part) throw new Error(`The demo names “${side}”, which it does not contain.`);
  return part;
}

function knownFeatures(consensus: readonly PlaceConsensus[]): (side: string, letter: string) => KnownFeature {
  const dimensions = new Map<string, Record<string, DimensionConsensus>>();
  for (const place of consensus) {
    const at = `${place.feature}/${place.letter}`;
    dimensions.set(at, { ...dimensions.get(at), [place.dimension]: place.consensus });
  }
  const words = new Map(
    measuredFeatures.map((feature) => [`${feature.part}/${feature.feature}`, feature.words]),
  );
  return (side, letter) => ({
    process: processOf(partOf(side)),
    attributes: Object.fromEntries(
      Object.entries(words.get(side) ?? {}).flatMap(([name, values]) => {
        const value = atLetter(values, letter);
        return value === undefined ? [] : [[name, value]];
      }),
    ),
    dimensions: dimensions.get(`${side}/${letter}`) ?? {},
  });
}

/** People who made a trial on two revisions, by `revision/revision` in both orders. */
async function triedPairs(trx: Knex): Promise<Map<string, Set<number>>> {
  const rows: { one: number; other: number; accountId: number }[] = await trx('trial_revisions as a')
    .join('trial_revisions as b', 'b.trial_id', 'a.trial_id')
    .join('trials as t', 't.id', 'a.trial_id')
    .whereRaw('a.revision_id <> b.revision_id')
    .orderBy(['t.account_id', 'a.revision_id', 'b.revision_id'])
    .select({ one: 'a.revision_id', other: 'b.revision_id', accountId: 't.account_id' });
  const people = new Map<string, Set<number>>();
  for (const { one, other, accountId } of rows) {
    const pair = `${one}/${other}`;
    people.set(pair, (people.get(pair) ?? new Set()).add(accountId));
  }
  return people;
}
