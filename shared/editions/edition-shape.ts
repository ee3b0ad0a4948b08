import { same } from './same.js';

/**
 * How a value is merged: whole; member by member; or item by item, each known by its key. Members that a record does not
 * name are merged whole, so that none is ever dropped.
 */
export type Shape =
  | { readonly kind: 'whole' }
  | { readonly kind: 'record'; readonly members: Readonly<Record<string, Shape>> }
  | { readonly kind: 'list'; readonly keyOf: (item: unknown) => string; readonly item: Shape };

const whole: Shape = { kind: 'whole' };
const record = (members: Readonly<Record<string, Shape>> = {}): Shape => ({ kind: 'record', members });
const list = (keyOf: (item: never) => string, item: Shape): Shape => ({
  kind: 'list',
  keyOf: keyOf as (item: unknown) => string,
  item,
});

const byKey = (item: { key: string }): string => item.key;
/** Items that say nothing but that they are there: symptoms, tools, revisions. */
const names = list((item: string | number) => String(item), whole);
const side = record({ revisions: list((mark: { revisionId: number }) => String(mark.revisionId), whole) });

/** A joint is known by the two parts that it is about; a reading is one statement and stays in one piece. */
export const editionShape: Shape = record({
  content: record({
    joints: list(
      (joint: { a: { partId: number | null }; b: { partId: number | null } }) =>
        `${joint.a.partId ?? 'none'}-${joint.b.partId ?? 'none'}`,
      record({ a: side, b: side }),
    ),
    symptoms: names,
    readings: list(byKey, whole),
    fixes: list(
      byKey,
      record({
        tools: names,
        materials: names,
        steps: list(byKey, record()),
        revisionIds: names,
        afterwards: names,
      }),
    ),
    photos: list(
      (photo: { photoId: number }) => String(photo.photoId),
      record({ callouts: list(byKey, whole) }),
    ),
  }),
});

/** The items of a list by their keys, in order; one that stands there again is counted, so that each has a key of its own. */
export function keyed(items: readonly unknown[], keyOf: (item: unknown) => string): Map<string, unknown> {
  const found = new Map<string, unknown>();
  for (const item of items) {
    const key = keyOf(item);
    let free = key;
    for (let times = 2; found.has(free); times++) free = `${key} ${times}`;
    found.set(free, item);
  }
  return found;
}

/** Whether two lists of keys have what they share in the same order. */
export function sameOrder(one: readonly string[], other: readonly string[]): boolean {
  const shared = one.filter((key) => other.includes(key));
  return same(
    shared,
    other.filter((key) => one.includes(key)),
  );
}
