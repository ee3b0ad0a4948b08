import { TestBed } from '@angular/core/testing';
import { of, throwError } from 'rxjs';
import type { PartRef } from '../../../shared/contract/hardware';
import type { FitCheckLine, JointRef } from '../../../shared/contract/joints';
import { Joints } from '../joints/joints';
import { AlikeSearch, type Alike, type Written } from './alike-search';
import { Questions } from './questions';

const part = (id: number): PartRef => ({
  id,
  slug: `part-${id}`,
  name: `Part ${id}`,
  kind: 'motor-bracket',
  maker: { id: 1, slug: 'maker', name: 'Maker' },
});
const joint = (id: number): JointRef => ({
  id,
  slug: `joint-${id}`,
  name: `Joint ${id}`,
  kind: 'boss-recess',
  a: part(1),
  b: part(2),
});
const line = { joint: joint(1), verdict: 'tight' } as FitCheckLine;
const both: Written['parts'] = [1, 2].map((id) => ({
  part: part(id),
  revision: { id: id * 10, partId: id, label: 'Rev A' },
}));

async function found(
  written: Written,
  over: { check?: () => unknown; alike?: () => unknown; writeUpsLike?: () => unknown } = {},
): Promise<{ alike: Alike; checked: unknown[][] }> {
  const checked: unknown[][] = [];
  TestBed.configureTestingModule({
    providers: [
      {
        provide: Joints,
        useValue: {
          check: (ids: number[]) => {
            checked.push(ids);
            return over.check?.() ?? of({ items: [line], stands: [] });
          },
        },
      },
      {
        provide: Questions,
        useValue: {
          alike: over.alike ?? (() => of({ questions: [], joints: [joint(1), joint(2)] })),
          writeUpsLike: over.writeUpsLike ?? (() => of([{ slug: 'lip', title: 'Lip' }])),
        },
      },
    ],
  });
  let alike: Alike | undefined;
  TestBed.inject(AlikeSearch)
    .find(written)
    .subscribe((value) => (alike = value));
  return { alike: alike!, checked };
}

describe('what is like a question that is being written', () => {
  it('names each joint once: judged where the revisions are known, else without', async () => {
    const { alike, checked } = await found({ words: 'rocks', parts: both });
    expect(checked).toEqual([[10, 20]]);
    expect(alike.places.map(({ joint: { id }, line: judged }) => [id, judged?.verdict ?? null])).toEqual([
      [1, 'tight'],
      [2, null],
    ]);
    expect(alike.writeUps).toEqual([{ slug: 'lip', title: 'Lip' }]);
  });

  it('judges nothing with fewer than two known revisions', async () => {
    const parts = both.map((entry, index) => (index === 0 ? entry : { ...entry, revision: null }));
    const { alike, checked } = await found({ words: '', parts });
    expect(checked).toEqual([]);
    expect(alike.places.every((place) => place.line === null)).toBe(true);
  });

  it('leaves out what cannot be found out, and keeps the rest', async () => {
    const fails = () => throwError(() => new Error('away'));
    const { alike } = await found({ words: 'rocks', parts: both }, { check: fails, alike: fails });
    expect(alike).toMatchObject({ places: [], questions: [], writeUps: [{ slug: 'lip' }] });
  });
});
