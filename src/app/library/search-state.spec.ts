import { convertToParamMap } from '@angular/router';
import { addressOfSearch, chosenCount, emptySearch, searchStateOf, toggled } from './search-state';

describe('what is searched for', () => {
  it('survives the way through the address', () => {
    const state = {
      ...emptySearch,
      q: 'rocks 22.5',
      part: ['m1', 'belt-bracket'],
      revision: [3, 7],
      standing: ['tried' as const],
    };
    const written = Object.entries(addressOfSearch(state)).filter(([, value]) => value !== null);
    expect(searchStateOf(convertToParamMap(Object.fromEntries(written)))).toEqual(state);
  });

  it('leaves nothing in the address when nothing is asked', () => {
    expect(Object.values(addressOfSearch({ ...emptySearch, q: '  ' })).every((value) => value === null)).toBe(
      true,
    );
  });

  it('reads a mangled address without its meaningless parts', () => {
    const params = convertToParamMap({
      q: 'x'.repeat(300),
      part: ['M1 <b>', 'm1'],
      revision: ['-1', 'two', '5'],
      kind: ['shim', 'glue'],
    });
    const state = searchStateOf(params);
    expect(state.q).toHaveLength(200);
    expect(state.part).toEqual(['m1']);
    expect(state.revision).toEqual([5]);
    expect(state.kind).toEqual(['shim']);
  });

  it('takes a chosen value back when it is chosen again', () => {
    const once = toggled(emptySearch, 'kind', 'trim');
    expect(once.kind).toEqual(['trim']);
    expect(toggled(once, 'kind', 'trim').kind).toEqual([]);
  });

  it('forgets revisions with the last part they belong to', () => {
    const state = { ...emptySearch, part: ['m1'], revision: [3] };
    expect(toggled(state, 'part', 'm1').revision).toEqual([]);
  });

  it('counts chosen filters, and words are none', () => {
    expect(chosenCount({ ...emptySearch, q: 'rocks', part: ['m1'], kind: ['shim', 'trim'] })).toBe(3);
  });
});
