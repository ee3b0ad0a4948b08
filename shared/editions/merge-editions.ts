import { editionShape, keyed, sameOrder, type Shape } from './edition-shape.js';
import type { EditionText } from './edition-text.js';
import { same } from './same.js';

export type Side = 'mine' | 'theirs';

/** What is taken where both sides changed the same: one of them, or what somebody made of the two. */
export type Choice = { readonly take: Side } | { readonly take: 'own'; readonly value: unknown };
export type Choices = ReadonlyMap<string, Choice>;

/** One piece of the text that the two sides say differently; undefined where a side does not have it. */
export interface MergeRow {
  /** The path joined by `/`: `content/cause`, `content/fixes/<key>/title`, `content/fixes/ order`. */
  readonly id: string;
  readonly path: readonly string[];
  readonly base: unknown;
  readonly mine: unknown;
  readonly theirs: unknown;
  /** With `both` somebody has to choose; otherwise the side that changed it is taken by itself. */
  readonly changedBy: Side | 'both';
}

export interface MergedEdition {
  readonly text: EditionText;
  /** What the sides say differently, in the order of the form. */
  readonly rows: readonly MergeRow[];
}

/** The last step of the path of an order of items; no item can have it for its key, for texts of one line begin without a space. */
export const orderStep = ' order';

/**
 * Merges two texts that both began as `base`, piece by piece. A piece that one side changed is taken from it; one that both
 * changed alike, as it is; one that both changed differently, by the choice made for it: mine where none is made, or whichever
 * is there where the other side took it out. Items are known by their keys: what either side added stays, what one side took
 * out goes unless the other changed it. Pure; O(size of the texts), lists by the square of their length.
 */
export function mergeEditions(
  base: EditionText,
  mine: EditionText,
  theirs: EditionText,
  choices: Choices = new Map(),
): MergedEdition {
  const rows: MergeRow[] = [];
  const text = merged(editionShape, [], { base, mine, theirs }, { choices, rows });
  return { text: text as EditionText, rows };
}

/** What is taken for a row: the choice made, or what is taken without one. */
export function choiceOf(row: MergeRow, choices: Choices): Choice {
  const made = row.changedBy === 'both' ? choices.get(row.id) : { take: row.changedBy };
  return made ?? { take: row.mine === undefined ? 'theirs' : 'mine' };
}

interface Three<T = unknown> {
  readonly base: T;
  readonly mine: T;
  readonly theirs: T;
}

interface Merging {
  readonly choices: Choices;
  readonly rows: MergeRow[];
}

type Path = readonly string[];

function merged(shape: Shape, path: Path, three: Three, merging: Merging): unknown {
  const { base, mine, theirs } = three;
  if (same(mine, theirs)) return mine;
  if (mine !== undefined && theirs !== undefined) {
    if (shape.kind === 'record') return mergedRecord(shape.members, path, three as Three<object>, merging);
    if (shape.kind === 'list') {
      const lists = { base: (base ?? []) as unknown[], mine: mine as unknown[], theirs: theirs as unknown[] };
      return mergedList(shape, path, lists, merging);
    }
  }
  return mergedWhole(path, three, merging);
}

function mergedWhole(path: Path, { base, mine, theirs }: Three, { choices, rows }: Merging): unknown {
  const changedBy = same(mine, base) ? 'theirs' : same(theirs, base) ? 'mine' : 'both';
  const row: MergeRow = { id: path.join('/'), path, base, mine, theirs, changedBy };
  rows.push(row);
  const choice = choiceOf(row, choices);
  return choice.take === 'own' ? choice.value : row[choice.take];
}

function mergedRecord(
  members: Readonly<Record<string, Shape>>,
  path: Path,
  { base, mine, theirs }: Three<object>,
  merging: Merging,
): object {
  const member = (of: object | undefined, name: string): unknown => (of as Record<string, unknown>)?.[name];
  const names = new Set([...Object.keys(mine), ...Object.keys(theirs)]);
  const entries = [...names].map((name): [string, unknown] => {
    const three = { base: member(base, name), mine: member(mine, name), theirs: member(theirs, name) };
    const shape = Object.hasOwn(members, name) ? members[name]! : ({ kind: 'whole' } as const);
    return [name, merged(shape, [...path, name], three, merging)];
  });
  return Object.fromEntries(entries.filter(([, value]) => value !== undefined));
}

function mergedList(
  { keyOf, item }: Shape & { kind: 'list' },
  path: Path,
  lists: Three<unknown[]>,
  merging: Merging,
): unknown[] {
  const [base, mine, theirs] = [lists.base, lists.mine, lists.theirs].map((items) => keyed(items, keyOf)) as [
    Map<string, unknown>,
    Map<string, unknown>,
    Map<string, unknown>,
  ];
  const kept = new Map<string, unknown>();
  for (const key of new Set([...mine.keys(), ...theirs.keys()])) {
    const three = { base: base.get(key), mine: mine.get(key), theirs: theirs.get(key) };
    const value = merged(item, [...path, key], three, merging);
    if (value !== undefined) kept.set(key, value);
  }
  const keys = { base: [...base.keys()], mine: [...mine.keys()], theirs: [...theirs.keys()] };
  return mergedOrder([...path, orderStep], keys, merging)
    .filter((key) => kept.has(key))
    .map((key) => kept.get(key));
}

/** All keys of both sides: in the order of the side that moved what they share, with what only the other has put in behind its neighbour. */
function mergedOrder(path: Path, { base, mine, theirs }: Three<string[]>, merging: Merging): string[] {
  if (sameOrder(mine, theirs)) return woven(mine, theirs);
  const inAll = (keys: readonly string[]): string[] =>
    keys.filter((key) => base.includes(key) && mine.includes(key) && theirs.includes(key));
  if (sameOrder(inAll(mine), inAll(base))) return woven(theirs, mine);
  if (sameOrder(inAll(theirs), inAll(base))) return woven(mine, theirs);
  const taken = mergedWhole(path, { base, mine, theirs }, merging);
  return taken === theirs ? woven(theirs, mine) : woven(mine, theirs);
}

function woven(leading: readonly string[], following: readonly string[]): string[] {
  const order = [...leading];
  let place = 0;
  for (const key of following) {
    const at = order.indexOf(key);
    if (at >= 0) place = at + 1;
    else order.splice(place++, 0, key);
  }
  return order;
}
