import type { ParamMap, Params } from '@angular/router';
import type { SearchQuery } from '../../../shared/contract/search';
import { FixKind, Permanence, Standing } from '../../../shared/contract/vocabulary';

/** What is searched for, as it stands in the address. */
export type SearchState = Pick<
  SearchQuery,
  'q' | 'part' | 'revision' | 'symptom' | 'permanence' | 'standing' | 'kind'
>;

export type FilterName = Exclude<keyof SearchState, 'q'>;
export const filterNames: readonly FilterName[] = [
  'part',
  'revision',
  'symptom',
  'permanence',
  'standing',
  'kind',
];

export const emptySearch: SearchState = {
  q: '',
  part: [],
  revision: [],
  symptom: [],
  permanence: [],
  standing: [],
  kind: [],
};

/** Reads an address, leaving out what means nothing, so that an old or mangled link still shows something. */
export function searchStateOf(params: ParamMap): SearchState {
  const known = <T extends string>(name: string, values: readonly T[]): T[] =>
    values.filter((value) => params.getAll(name).includes(value));
  return {
    q: (params.get('q') ?? '').slice(0, 200),
    part: params.getAll('part').filter(isSlug).slice(0, 20),
    revision: params
      .getAll('revision')
      .map(Number)
      .filter((id) => Number.isSafeInteger(id) && id > 0)
      .slice(0, 40),
    symptom: params.getAll('symptom').filter(isSlug).slice(0, 20),
    permanence: known('permanence', Permanence.options),
    standing: known('standing', Standing.options),
    kind: known('kind', FixKind.options),
  };
}

/** The address of a search; what is empty is left out. */
export function addressOfSearch(state: SearchState): Params {
  return {
    q: state.q.trim() === '' ? null : state.q,
    ...Object.fromEntries(filterNames.map((name) => [name, state[name].length > 0 ? state[name] : null])),
  };
}

/** Chooses a value of a filter, or takes it back. Revisions belong to parts: without a part there are none. */
export function toggled(state: SearchState, name: FilterName, value: string): SearchState {
  const before = state[name].map(String);
  const after = before.includes(value) ? before.filter((other) => other !== value) : [...before, value];
  const next = { ...state, [name]: name === 'revision' ? after.map(Number) : after } as SearchState;
  return next.part.length === 0 ? { ...next, revision: [] } : next;
}

export function chosenCount(state: SearchState): number {
  return filterNames.reduce((sum, name) => sum + state[name].length, 0);
}

function isSlug(value: string): boolean {
  return /^[a-z0-9]+(?:-[a-z0-9]+)*$/.test(value) && value.length <= 120;
}
