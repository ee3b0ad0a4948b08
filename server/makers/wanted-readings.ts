import type { Revision } from '../../shared/contract/hardware.js';
import type { WantedReadings } from '../../shared/contract/makers.js';
import { featureSpecs } from '../../shared/fit/feature-dimensions.js';
import { toRevisionRef } from '../revision-ref.js';
import { groupBy } from '../rows.js';
import type { JointFeatureRow, ReadingCount } from './wanted-readings.store.js';

/** With this many readings a consensus is no thin evidence any more. */
const enough = 3;

/** What is to be measured on a revision; nothing once every dimension was read often enough. */
export function wantedReadingsOf(
  revision: Revision,
  rows: readonly JointFeatureRow[],
  counts: readonly ReadingCount[],
): WantedReadings[] {
  const features = [...groupBy(rows, (row) => row.id).values()].flatMap((ofFeature) => {
    const { id, slug, name, kind } = ofFeature[0]!;
    const readings = (dimension: string): number =>
      counts.find(
        (count) =>
          count.revisionId === revision.id && count.featureId === id && count.dimension === dimension,
      )?.count ?? 0;
    const dimensions = featureSpecs[kind].dimensions
      .map((spec) => ({
        name: spec.name,
        label: spec.label,
        howTo: spec.howTo,
        readings: readings(spec.name),
      }))
      .filter((dimension) => dimension.readings < enough);
    if (dimensions.length === 0) return [];
    const joints = ofFeature.map(({ jointSlug, jointName }) => ({ slug: jointSlug, name: jointName }));
    return [{ feature: { id, slug, name, kind }, joints, dimensions }];
  });
  if (features.length === 0) return [];
  const { id, partId, label, announced } = revision;
  return [
    {
      revision: toRevisionRef({ id, partId, label, state: announced ? 'announced' : 'sold' }),
      announced: announced === true,
      features,
    },
  ];
}

/** The same in one sentence; empty where no feature of the part mates with another. */
export function wantedSentence(rows: readonly JointFeatureRow[]): string {
  const features = [...new Map(rows.map((row) => [row.id, row])).values()];
  if (features.length === 0) return '';
  const wishes = features.map(
    ({ name, kind }) => `${name}: ${featureSpecs[kind].dimensions.map(({ label }) => label).join(', ')}`,
  );
  return `Whoever gets one: the maker asks you to measure it. ${wishes.join('; ')}.`;
}
