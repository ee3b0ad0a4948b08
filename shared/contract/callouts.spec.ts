import { describe, expect, it } from 'vitest';
import { Callouts, mostCallouts, type Callout } from './callouts.js';
import { PhotoUse } from './edition-content.js';

const ring: Callout = { kind: 'ring', key: 'ring-one', label: 'lip', centre: { x: 0, y: 1 }, radius: 0.1 };
const dimension: Callout = {
  kind: 'dimension',
  key: 'dimension-one',
  label: '',
  from: { x: 0.2, y: 0.2 },
  to: { x: 0.8, y: 0.2 },
  value: null,
  unit: 'deg',
};
const arrow: Callout = {
  kind: 'arrow',
  key: 'arrow-one',
  label: 'rim',
  from: { x: 0.1, y: 0.1 },
  to: { x: 0.4, y: 0.4 },
};

/** Path and message of everything that is wrong. */
function wrongWith(callouts: unknown): string[] {
  const parsed = Callouts.safeParse(callouts);
  return parsed.success ? [] : parsed.error.issues.map((issue) => `${issue.path.join('.')} ${issue.message}`);
}

describe('callouts', () => {
  it('are kept as they were drawn, up to the edge of the photo', () => {
    expect(Callouts.parse([ring, dimension, arrow])).toEqual([ring, dimension, arrow]);
  });

  it('are none on photos of texts from before there were any', () => {
    expect(PhotoUse.parse({ photoId: 1, alt: 'The lip', caption: '' }).callouts).toEqual([]);
  });

  it('take as many as one photo bears and no more', () => {
    const many = (count: number): Callout[] =>
      Array.from({ length: count }, (_, index) => ({ ...ring, key: `ring-number-${index}` }));
    expect(wrongWith(many(mostCallouts))).toEqual([]);
    expect(wrongWith(many(mostCallouts + 1))).toEqual([' takes at most 20 callouts']);
  });

  it.each<[string, unknown, string]>([
    ['left of the photo', { ...arrow, from: { x: -0.01, y: 0 } }, '0.from.x lies outside the photo'],
    ['below the photo', { ...ring, centre: { x: 0.5, y: 1.01 } }, '0.centre.y lies outside the photo'],
    [
      'a place that is no number',
      { ...arrow, to: { x: '0.5', y: 0.5 } },
      '0.to.x takes a number from 0 to 1',
    ],
    ['a ring without size', { ...ring, radius: 0 }, '0.radius takes at least 0.005'],
    ['a ring wider than two photos', { ...ring, radius: 1.01 }, '0.radius takes at most'],
    ['a kind that is none', { ...ring, kind: 'heart' }, '0.kind takes an arrow, a ring or a dimension'],
    ['a unit that is none', { ...dimension, unit: 'steps' }, '0.unit'],
    ['a value without end', { ...dimension, value: Infinity }, '0.value'],
    ['words of two lines', { ...ring, label: 'lip\nrim' }, '0.label takes one line'],
    ['words of 81 letters', { ...ring, label: 'x'.repeat(81) }, '0.label takes at most 80 characters'],
    ['a key that is none', { ...ring, key: 'Ring 1' }, '0.key takes 8 to 36'],
    ['a field that is none', { ...ring, colour: 'red' }, '0 Unrecognized key'],
  ])('refuse %s, naming the field', (_what, callout, told) => {
    expect(wrongWith([callout])).toEqual([expect.stringContaining(told)]);
  });

  it('refuse a key that stands twice on the photo', () => {
    expect(wrongWith([ring, { ...arrow, key: ring.key }])).toEqual(['1.key stands twice on this photo']);
  });
});
