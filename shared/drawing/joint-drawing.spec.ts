import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Dimension } from '../fit/dimension.js';
import { featureSpecs } from '../fit/feature-dimensions.js';
import { jointKindNames, jointKinds } from '../fit/joint-kinds.js';
import type { FeatureOnHand } from '../fit/joint-verdict.js';
import { drawJoint } from './joint-drawing.js';
import type { Drawing, PathShape } from './shapes.js';

const read = (value: number): Dimension => ({ value, uncertainty: 0.02, source: { kind: 'own-reading' } });
const side = (
  dimensions: Record<string, number>,
  attributes: Record<string, string> = {},
): FeatureOnHand => ({
  dimensions: Object.fromEntries(Object.entries(dimensions).map(([name, value]) => [name, read(value)])),
  attributes,
  process: 'printed',
});
const lip = side({ diameter: 22.5, height: 1.5, plateWidth: 60 });
const recess = side({ diameter: 19.5, depth: 2 });
const names = { nameA: 'bracket Rev 1', nameB: 'motor Rev C' };

function paths(
  drawing: Drawing,
  role: PathShape['role'],
): { left: number; right: number; top: number; bottom: number }[] {
  return drawing.shapes.flatMap((shape) => {
    if (shape.kind !== 'path' || shape.role !== role) return [];
    const points = [...shape.d.matchAll(/(-?[\d.]+) (-?[\d.]+)/g)].map(
      ([, x, y]) => [Number(x), Number(y)] as const,
    );
    const xs = points.map(([x]) => x);
    const ys = points.map(([, y]) => y);
    return [{ left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) }];
  });
}

const texts = (drawing: Drawing): string[] =>
  drawing.shapes.flatMap((shape) => (shape.kind === 'path' ? [] : [shape.text]));

describe('the drawing of a joint', () => {
  test('a lip on the face leaves a gap to scale, with the ring it rests on picked out', () => {
    const drawing = drawJoint({ kind: 'boss-recess', a: lip, b: recess, ...names })!;
    const gaps = paths(drawing, 'gap');
    expect(gaps).toHaveLength(2);
    expect((gaps[0]!.bottom - gaps[0]!.top) / drawing.scale!).toBeCloseTo(1.5, 1);
    const [left, right] = paths(drawing, 'overlap');
    expect((right!.right - left!.left) / drawing.scale!).toBeCloseTo(22.5, 1);
    expect((right!.left - left!.right) / drawing.scale!).toBeCloseTo(19.5, 1);
  });

  test('figures stand on their dimension lines with the half width of their 95 % interval', () => {
    const drawing = drawJoint({ kind: 'boss-recess', a: lip, b: recess, ...names })!;
    expect(texts(drawing)).toEqual(expect.arrayContaining(['⌀22.50 ±0.04', '⌀19.50 ±0.04', 'gap 1.50']));
  });

  test('a shim fills the gap, and the tilt is gone', () => {
    const drawing = drawJoint({ kind: 'boss-recess', a: lip, b: recess, ...names, shim: 1.52 })!;
    const shims = paths(drawing, 'shim');
    expect(shims).toHaveLength(2);
    expect((shims[0]!.bottom - shims[0]!.top) / drawing.scale!).toBeCloseTo(1.52, 1);
    expect(paths(drawing, 'overlap')).toEqual([]);
    expect(drawing.tiltFactor).toBeNull();
    expect(drawing.description.join(' ')).toContain('1.52 mm fills the gap');
  });

  test('a small tilt is drawn larger, and its factor is told', () => {
    const shallow = side({ diameter: 22.5, height: 0.2, plateWidth: 60 });
    const drawing = drawJoint({ kind: 'boss-recess', a: shallow, b: recess, ...names })!;
    expect(drawing.tiltFactor).toBeGreaterThan(1);
    expect(texts(drawing).some((text) => text.includes(`drawn ${drawing.tiltFactor} ×`))).toBe(true);
  });

  test('a pair that seats has neither gap nor overlap', () => {
    const drawing = drawJoint({
      kind: 'boss-recess',
      a: side({ diameter: 19.3, height: 1.5 }),
      b: recess,
      ...names,
    })!;
    expect(paths(drawing, 'gap')).toEqual([]);
    expect(paths(drawing, 'overlap')).toEqual([]);
    expect(drawing.description).toContain('The faces meet.');
  });

  test('without a diameter there is nothing to draw', () => {
    expect(drawJoint({ kind: 'boss-recess', a: side({ height: 1.5 }), b: recess, ...names })).toBeNull();
  });

  const dimension = fc.option(fc.double({ min: 0.2, max: 120, noNaN: true }).map(read), { nil: undefined });
  const anySide = (kind: keyof typeof featureSpecs): fc.Arbitrary<FeatureOnHand> =>
    fc.record({
      dimensions: fc.record(
        Object.fromEntries(featureSpecs[kind].dimensions.map(({ name }) => [name, dimension])),
      ),
      attributes: fc.record(
        Object.fromEntries(
          featureSpecs[kind].attributes.map(({ name, options }) => [
            name,
            fc.constantFrom(...(options ?? ['M48x0.75'])),
          ]),
        ),
      ),
      process: fc.constant('printed' as const),
    });
  test.each(jointKindNames)(
    '%s draws no coordinate that is not a number, and always says what it shows',
    (kind) => {
      fc.assert(
        fc.property(anySide(jointKinds[kind].a), anySide(jointKinds[kind].b), (a, b) => {
          const drawing = drawJoint({ kind, a, b, ...names });
          if (!drawing) return;
          expect(JSON.stringify(drawing)).not.toMatch(/NaN|Infinity|null,null/);
          expect(drawing.shapes.some((shape) => shape.kind === 'path' && /NaN|Infinity/.test(shape.d))).toBe(
            false,
          );
          expect(drawing.description.length).toBeGreaterThan(0);
        }),
        { numRuns: 100 },
      );
    },
  );
});
