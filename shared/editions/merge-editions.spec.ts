import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { emptyContent, type EditionContent, type Fix, type Reading } from '../contract/edition-content.js';
import type { EditionText } from './edition-text.js';
import { choiceOf, mergeEditions, type Choice } from './merge-editions.js';

const textOf = (content: Partial<EditionContent>, changeNote = ''): EditionText => ({
  content: { ...emptyContent, ...content },
  changeNote,
});
const fix = (key: string, over: Partial<Fix> = {}): Fix => ({
  key,
  title: key,
  kind: null,
  permanence: null,
  why: '',
  tools: [],
  materials: [],
  steps: [],
  revisionIds: [],
  afterwards: [],
  afterwardsNote: '',
  worksheet: null,
  acceptance: null,
  ...over,
});
const reading = (key: string, value: number): Reading => ({
  key,
  revisionId: null,
  dimension: 'lip',
  value,
  unit: 'mm',
  instrument: 'caliper',
  uncertainty: null,
});
const step = (key: string, text: string) => ({ key, text, photoId: null });
const side = (partId: number, ...holding: number[]) => ({
  partId,
  feature: '',
  revisions: holding.map((revisionId) => ({ revisionId, holds: true })),
});
const idsOf = (merge: ReturnType<typeof mergeEditions>) => merge.rows.map((row) => [row.id, row.changedBy]);
const taking = (id: string, choice: Choice) => new Map([[id, choice]]);

describe('two texts that began as one', () => {
  it('when only one side changed a field, then that side is taken by itself', () => {
    const merge = mergeEditions(
      textOf({ title: 'old', cause: 'old' }),
      textOf({ title: 'mine', cause: 'old' }),
      textOf({ title: 'old', cause: 'theirs' }),
    );
    expect(merge.text).toEqual(textOf({ title: 'mine', cause: 'theirs' }));
    expect(idsOf(merge)).toEqual([
      ['content/title', 'mine'],
      ['content/cause', 'theirs'],
    ]);
  });

  it('when both changed a field, then it is mine until somebody chooses theirs or words of their own', () => {
    const three = [textOf({ cause: 'old' }), textOf({ cause: 'mine' }), textOf({ cause: 'theirs' })] as const;
    const id = 'content/cause';
    expect(idsOf(mergeEditions(...three))).toEqual([[id, 'both']]);
    expect(mergeEditions(...three).text.content.cause).toBe('mine');
    expect(mergeEditions(...three, taking(id, { take: 'theirs' })).text.content.cause).toBe('theirs');
    const own: Choice = { take: 'own', value: 'mine and theirs' };
    expect(mergeEditions(...three, taking(id, own)).text.content.cause).toBe('mine and theirs');
  });

  it('when both say the same, then there is nothing to choose, whatever the order of members', () => {
    const mine = textOf({ readings: [reading('reading-1', 1)] });
    const turned = Object.fromEntries(Object.entries(reading('reading-1', 1)).reverse()) as Reading;
    expect(mergeEditions(textOf({}), mine, textOf({ readings: [turned] })).rows).toEqual([]);
  });

  it('when one worded a step anew and the other another step of the same fix, then both are in', () => {
    const steps = (one: string, two: string) =>
      textOf({ fixes: [fix('fix-00001', { steps: [step('step-001', one), step('step-002', two)] })] });
    const merge = mergeEditions(steps('a', 'b'), steps('A', 'b'), steps('a', 'B'));
    expect(merge.text).toEqual(steps('A', 'B'));
    expect(merge.rows.every((row) => row.changedBy !== 'both')).toBe(true);
  });

  it('when each side added a fix, then both are in, each behind the neighbour it was put behind', () => {
    const common = fix('fix-common');
    const merge = mergeEditions(
      textOf({ fixes: [common] }),
      textOf({ fixes: [fix('fix-of-mine'), common] }),
      textOf({ fixes: [common, fix('fix-of-theirs')] }),
    );
    expect(merge.text.content.fixes.map((one) => one.key)).toEqual([
      'fix-of-mine',
      'fix-common',
      'fix-of-theirs',
    ]);
  });

  it('when one took a fix out that the other left alone, then it goes', () => {
    const base = textOf({ fixes: [fix('fix-common')] });
    expect(mergeEditions(base, base, textOf({})).text.content.fixes).toEqual([]);
    expect(mergeEditions(base, textOf({}), base).text.content.fixes).toEqual([]);
  });

  it('when one took a fix out that the other worded anew, then it stays until somebody takes the other side', () => {
    const base = textOf({ fixes: [fix('fix-common')] });
    const reworded = textOf({ fixes: [fix('fix-common', { title: 'new words' })] });
    const id = 'content/fixes/fix-common';
    for (const [mine, theirs, removing] of [
      [textOf({}), reworded, 'mine'],
      [reworded, textOf({}), 'theirs'],
    ] as const) {
      expect(idsOf(mergeEditions(base, mine, theirs))).toEqual([[id, 'both']]);
      expect(mergeEditions(base, mine, theirs).text).toEqual(reworded);
      const taken = mergeEditions(base, mine, theirs, taking(id, { take: removing }));
      expect(taken.text.content.fixes).toEqual([]);
    }
  });

  it('when one moved the fixes and the other worded one anew, then both are done', () => {
    const [a, b] = [fix('fix-00001'), fix('fix-00002')];
    const merge = mergeEditions(
      textOf({ fixes: [a, b] }),
      textOf({ fixes: [b, a] }),
      textOf({ fixes: [{ ...a, why: 'why' }, b] }),
    );
    expect(merge.text).toEqual(textOf({ fixes: [b, { ...a, why: 'why' }] }));
  });

  it('when both moved the fixes, each another way, then the order is to be chosen', () => {
    const fixes = (...numbers: number[]) => textOf({ fixes: numbers.map((n) => fix(`fix-0000${n}`)) });
    const three = [fixes(1, 2, 3), fixes(3, 1, 2), fixes(2, 1, 3)] as const;
    const id = 'content/fixes/ order';
    expect(idsOf(mergeEditions(...three))).toEqual([[id, 'both']]);
    expect(mergeEditions(...three).text).toEqual(fixes(3, 1, 2));
    expect(mergeEditions(...three, taking(id, { take: 'theirs' })).text).toEqual(fixes(2, 1, 3));
  });

  it('when one marked another revision and the other said the feature, then the joint has both', () => {
    const joint = (a: object) => textOf({ joints: [{ a: { ...side(1, 5), ...a }, b: side(2, 7) }] });
    const marks = { revisions: side(1, 5, 6).revisions };
    const merge = mergeEditions(joint({}), joint(marks), joint({ feature: 'lip' }));
    expect(merge.text).toEqual(joint({ ...marks, feature: 'lip' }));
  });

  it('when both changed a reading, then it is chosen as one, so that no value gets the other side’s unit', () => {
    const merge = mergeEditions(
      textOf({ readings: [reading('reading-1', 1)] }),
      textOf({ readings: [reading('reading-1', 2)] }),
      textOf({ readings: [{ ...reading('reading-1', 1), unit: 'in' }] }),
    );
    expect(idsOf(merge)).toEqual([['content/readings/reading-1', 'both']]);
  });

  it('when a text has members that the merge knows nothing of, then they are merged as a whole', () => {
    const photo = (over: object) =>
      textOf({ photos: [{ photoId: 1, alt: 'lip', caption: '', ...over }] as EditionContent['photos'] });
    const merge = mergeEditions(
      photo({ later: [1] }),
      photo({ later: [1], caption: 'x' }),
      photo({ later: [2] }),
    );
    expect(merge.text).toEqual(photo({ later: [2], caption: 'x' }));
  });
});

const few = <T>(...values: T[]): fc.Arbitrary<T> => fc.constantFrom(...values);
const words = few('', 'the lip', 'the recess', 'the lip is wide\nand 0.3 mm high');
const set = <T>(...values: T[]): fc.Arbitrary<T[]> =>
  fc.shuffledSubarray(values, { minLength: 0, maxLength: values.length });
const items = <T>(keys: string[], make: (key: string) => fc.Arbitrary<T>): fc.Arbitrary<T[]> =>
  set(...keys).chain((chosen) => fc.tuple(...chosen.map(make)));
const anyStep = (key: string) => fc.record({ key: fc.constant(key), text: words, photoId: few(null, 4) });
const anyFix = (key: string) =>
  fc.record({
    key: fc.constant(key),
    title: words,
    kind: few<Fix['kind']>(null, 'shim', 'trim'),
    permanence: few<Fix['permanence']>(null, 'reversible'),
    why: words,
    tools: set('knife', 'caliper', 'file'),
    materials: set('coin'),
    steps: items(['step-001', 'step-002', 'step-003'], anyStep),
    revisionIds: set(5, 6),
    afterwards: set<Fix['afterwards'][number]>('flats', 'balance'),
    afterwardsNote: words,
    acceptance: few<Fix['acceptance']>(null, {
      quantity: 'tilt',
      comparison: 'at-most',
      value: 1,
      unit: 'deg',
    }),
    worksheet: fc.constant(null),
  });
const anySide = (partId: number) =>
  fc.record({
    partId: fc.constant(partId),
    feature: words,
    revisions: fc
      .tuple(set(5, 6, 7), fc.boolean())
      .map(([ids, holds]) => ids.map((revisionId) => ({ revisionId, holds }))),
  });
const anyText: fc.Arbitrary<EditionText> = fc.record({
  changeNote: words,
  content: fc.record({
    title: words,
    summary: words,
    joints: items(['1-2', '2-3'], (key) =>
      fc.record({ a: anySide(Number(key[0])), b: anySide(Number(key[2])) }),
    ),
    symptoms: set('rocks', 'slips', 'binds'),
    noticed: words,
    cause: words,
    readings: items(['reading-1', 'reading-2'], (key) => few(1, 2).map((value) => reading(key, value))),
    fixes: items(['fix-00001', 'fix-00002', 'fix-00003'], anyFix),
    photos: items(['8', '9'], (key) =>
      fc.record({ photoId: fc.constant(Number(key)), alt: words, caption: words, callouts: fc.constant([]) }),
    ),
    sources: words,
  }),
});

/** The keys of everything a text has, and below each fix those of its steps. */
function keysOf({ content }: EditionText): Set<string> {
  return new Set([
    ...content.symptoms.map((slug) => `symptom ${slug}`),
    ...content.readings.map(({ key }) => key),
    ...content.photos.map(({ photoId }) => `photo ${photoId}`),
    ...content.joints.map((joint) => `joint ${joint.a.partId}-${joint.b.partId}`),
    ...content.fixes.flatMap(({ key, steps }) => [key, ...steps.map((one) => `${key}/${one.key}`)]),
  ]);
}

/** A text with its lists in the order of their keys, for where the order is not what is looked at. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value))
    return value.map(sorted).sort((a, b) => (JSON.stringify(a) < JSON.stringify(b) ? -1 : 1));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .map(([name, member]): [string, unknown] => [name, sorted(member)])
      .sort(([a], [b]) => (a < b ? -1 : 1)),
  );
}

describe('whatever the texts', () => {
  const hold = (...law: Parameters<typeof fc.property<[EditionText, EditionText, EditionText]>>) =>
    fc.assert(fc.property(...law), { numRuns: 400 });

  it('a side that changed nothing leaves the other side as it is', () => {
    hold(anyText, anyText, anyText, (base, changed) => {
      expect(mergeEditions(base, base, changed).text).toEqual(changed);
      expect(mergeEditions(base, changed, base).text).toEqual(changed);
    });
  });

  it('sides that say the same give that, with nothing to choose', () => {
    hold(anyText, anyText, anyText, (base, both) => {
      expect(mergeEditions(base, both, both)).toEqual({ text: both, rows: [] });
    });
  });

  it('nothing that a side has is lost, unless the other took it out and this one had left it alone', () => {
    hold(anyText, anyText, anyText, (base, mine, theirs) => {
      const kept = keysOf(mergeEditions(base, mine, theirs).text);
      const was = keysOf(base);
      const goes = (key: string) => was.has(key) && !(keysOf(mine).has(key) && keysOf(theirs).has(key));
      for (const key of [...keysOf(mine), ...keysOf(theirs)]) expect(kept.has(key) || goes(key)).toBe(true);
    });
  });

  it('every piece of either side is in the merged text or in a row', () => {
    hold(anyText, anyText, anyText, (base, mine, theirs) => {
      const { text, rows } = mergeEditions(base, mine, theirs);
      const seen = JSON.stringify([text, rows.map((row) => [row.mine, row.theirs])]);
      for (const field of ['title', 'summary', 'noticed', 'cause', 'sources'] as const) {
        expect(seen).toContain(JSON.stringify(mine.content[field]));
        expect(seen).toContain(JSON.stringify(theirs.content[field]));
      }
    });
  });

  it('the sides can be exchanged: the same is to be chosen, and where nothing is, the same comes of it but for the order', () => {
    hold(anyText, anyText, anyText, (base, mine, theirs) => {
      const one = mergeEditions(base, mine, theirs);
      const other = mergeEditions(base, theirs, mine);
      const disputed = (rows: typeof one.rows) =>
        rows.filter((row) => row.changedBy === 'both').map((row) => row.id);
      expect(disputed(one.rows).sort()).toEqual(disputed(other.rows).sort());
      const turned = new Map(
        other.rows.map((row): [string, Choice] => {
          const taken = choiceOf(row, new Map());
          return [row.id, { take: taken.take === 'mine' ? 'theirs' : 'mine' }];
        }),
      );
      expect(sorted(mergeEditions(base, mine, theirs, turned).text)).toEqual(sorted(other.text));
    });
  });

  it('merging with theirs again changes nothing more', () => {
    hold(anyText, anyText, anyText, (base, mine, theirs) => {
      const { text } = mergeEditions(base, mine, theirs);
      expect(mergeEditions(theirs, text, theirs).text).toEqual(text);
    });
  });
});
