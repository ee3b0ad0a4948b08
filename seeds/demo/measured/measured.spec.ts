import { describe, expect, it } from 'vitest';
import { dimensionSpec, featureSpecs } from '../../../shared/fit/feature-dimensions.js';
import { jointKinds } from '../../../shared/fit/joint-kinds.js';
import { readMetricThread } from '../../../shared/fit/thread-pair.js';
import type { FeatureKind } from '../../../shared/contract/vocabulary.js';
import { demoParts } from '../parts.js';
import { seededNumbers } from '../random.js';
import { demoJoints } from './joints.js';
import { letterOf } from './judge-pairs.js';
import { priceBands } from './prices.js';
import { readingsOf, type Reading } from './readings.js';
import { measuredFeatures } from './sizes.js';
import { withWrongEntries } from './wrong-entries.js';

const kinds = new Map<string, FeatureKind>(
  demoParts.flatMap((part) => part.features.map(({ name, kind }) => [`${part.slug}/${name}`, kind] as const)),
);

/** Readings of every feature on the first revision that somebody has measured. */
function readings(seed: number): Reading[] {
  const next = seededNumbers(seed);
  const people = Array.from({ length: 20 }, (_, index) => ({
    accountId: index + 1,
    since: new Date('2023-10-01'),
    inches: index % 9 === 8,
  }));
  return measuredFeatures.flatMap((feature) =>
    readingsOf({
      feature,
      kind: kinds.get(`${feature.part}/${feature.feature}`)!,
      process: 'machined',
      letter: 'A',
      from: new Date('2024-01-01'),
      to: new Date('2026-11-01'),
      people,
      next,
    }),
  );
}

describe('what the demo measures', () => {
  it.each(demoJoints.map((joint) => [joint.slug, joint] as const))(
    'joins features of the right kinds in %s',
    (_slug, { kind, a, b }) => {
      expect([kinds.get(a), kinds.get(b)]).toEqual([jointKinds[kind].a, jointKinds[kind].b]);
    },
  );

  it('names each joint once, and each pair of features once for a kind', () => {
    expect(new Set(demoJoints.map((joint) => joint.slug)).size).toBe(demoJoints.length);
    expect(new Set(demoJoints.map((joint) => joint.name)).size).toBe(demoJoints.length);
    expect(new Set(demoJoints.map(({ kind, a, b }) => `${kind} ${a} ${b}`)).size).toBe(demoJoints.length);
  });

  it.each(measuredFeatures.map((item) => [`${item.part}/${item.feature}`, item] as const))(
    'gives %s dimensions and attributes that its kind has, on revisions that exist',
    (name, feature) => {
      const kind = kinds.get(name)!;
      const letters = demoParts
        .find((part) => part.slug === feature.part)!
        .revisions.map((item) => letterOf(item.label));
      for (const [dimension, values] of Object.entries(feature.sizes)) {
        expect(dimensionSpec(kind, dimension), dimension).toBeDefined();
        for (const letter of Object.keys(values).join('')) expect(letters).toContain(letter);
      }
      for (const [attribute, values] of Object.entries(feature.words)) {
        const spec = featureSpecs[kind].attributes.find((item) => item.name === attribute);
        expect(spec, attribute).toBeDefined();
        for (const value of Object.values(values)) {
          if (spec!.options) expect(spec!.options).toContain(value);
          else expect(readMetricThread(value).diameter).toBeGreaterThan(0);
        }
      }
    },
  );

  it('measures every feature that a joint names', () => {
    const measured = new Set(measuredFeatures.map((item) => `${item.part}/${item.feature}`));
    expect(demoJoints.flatMap(({ a, b }) => [a, b]).filter((name) => !measured.has(name))).toEqual([]);
    expect(measured.size).toBe(measuredFeatures.length);
  });

  it('has a price for every part and for nothing else', () => {
    expect(Object.keys(priceBands).sort()).toEqual(demoParts.map((part) => part.slug).sort());
  });
});

describe('the readings', () => {
  it('are the same in every run, and others with another seed', () => {
    expect(readings(5)).toEqual(readings(5));
    expect(readings(5)).not.toEqual(readings(6));
  });

  it('are some of them repeats, and some typed in inches', () => {
    const made = readings(5);
    expect(made.some((reading) => reading.entered.length > 2)).toBe(true);
    const inches = made.find((reading) => reading.unit === 'in' && reading.entered.length === 1)!;
    expect(inches.value).toBeCloseTo(inches.entered[0]! * 25.4, 9);
  });

  it('go wrong now and then, at most once for a dimension, and keep their order', () => {
    const right = readings(5);
    const made = withWrongEntries(right, 4, seededNumbers(7));
    const wrong = made.filter((reading, index) => reading !== right[index]);
    expect(made.map((reading) => reading.createdAt)).toEqual(right.map((reading) => reading.createdAt));
    expect(wrong.length / made.length).toBeGreaterThan(0.005);
    expect(wrong.length / made.length).toBeLessThan(0.04);
    expect(new Set(wrong.map((reading) => `${reading.feature} ${reading.spec.name}`)).size).toBe(
      wrong.length,
    );
    expect(made.filter((reading) => reading.setAsideReason !== null)).toHaveLength(4);
    for (const reading of wrong) {
      const before = right[made.indexOf(reading)]!;
      expect(Math.abs(reading.value - before.value)).toBeGreaterThan(0.5);
    }
  });
});
