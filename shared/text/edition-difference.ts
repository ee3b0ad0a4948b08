import type { EditionContent } from '../contract/edition-content.js';
import type { FieldDifference } from '../contract/write-ups.js';
import { fieldsOf, type ContentNames, type EditionField } from './edition-fields.js';
import { wordDifference } from './word-difference.js';

export interface EditionDifference {
  /** In the order of the page; what only the earlier edition has stands where it stood. */
  readonly changed: FieldDifference[];
  /** Things both say alike; what is empty in both does not count. */
  readonly unchangedFields: number;
}

/**
 * What changed from one edition to another, thing by thing and word by word. Fixes, steps and readings are known by their
 * keys and photos by their identity, so that one which only moved is told as moved. `from` null: all of `to` is new.
 */
export function editionDifference(
  from: EditionContent | null,
  to: EditionContent,
  names: ContentNames,
): EditionDifference {
  const before = new Map((from ? fieldsOf(from, names) : []).map((field) => [field.field, field]));
  const after = new Map(fieldsOf(to, names).map((field) => [field.field, field]));
  const changed: FieldDifference[] = [];
  let unchangedFields = 0;
  for (const { field, label } of inPageOrder([...before.values()], after)) {
    const earlier = before.get(field)?.text ?? '';
    const later = after.get(field)?.text ?? '';
    if (earlier !== later) changed.push({ field, label, pieces: wordDifference(earlier, later) });
    else if (later !== '') unchangedFields += 1;
  }
  return { changed: [...changed, ...(from ? moves(from, to, names) : [])], unchangedFields };
}

/** The later edition's fields, with those that are gone put in behind the field they followed. */
function inPageOrder(
  before: readonly EditionField[],
  after: ReadonlyMap<string, EditionField>,
): EditionField[] {
  const gone = new Map<string, EditionField[]>();
  let previous = '';
  for (const field of before) {
    if (after.has(field.field)) previous = field.field;
    else gone.set(previous, [...(gone.get(previous) ?? []), field]);
  }
  return [
    ...(gone.get('') ?? []),
    ...[...after.values()].flatMap((field) => [field, ...(gone.get(field.field) ?? [])]),
  ];
}

interface Item {
  readonly key: string;
  readonly name: string;
}

function moves(from: EditionContent, to: EditionContent, names: ContentNames): FieldDifference[] {
  const stepsOf = (content: EditionContent, fixKey: string): Item[] =>
    content.fixes
      .find((fix) => fix.key === fixKey)
      ?.steps.map((step) => ({ key: step.key, name: firstWords(step.text) })) ?? [];
  return [
    ...moved('symptoms.order', 'Order of the symptoms', symptomItems(from, names), symptomItems(to, names)),
    ...moved('readings.order', 'Order of the readings', readingItems(from), readingItems(to)),
    ...moved('fixes.order', 'Order of the fixes', fixItems(from), fixItems(to)),
    ...to.fixes.flatMap((fix) =>
      moved(
        `fixes.${fix.key}.steps.order`,
        `Fix “${fix.title}”, order of the steps`,
        stepsOf(from, fix.key),
        stepsOf(to, fix.key),
      ),
    ),
    ...moved('photos.order', 'Order of the photos', photoItems(from), photoItems(to)),
  ];
}

const symptomItems = (content: EditionContent, names: ContentNames): Item[] =>
  content.symptoms.map((slug) => ({ key: slug, name: names.symptom(slug) }));
const readingItems = (content: EditionContent): Item[] =>
  content.readings.map(({ key, dimension }) => ({ key, name: dimension }));
const fixItems = (content: EditionContent): Item[] =>
  content.fixes.map(({ key, title }) => ({ key, name: title }));
const photoItems = (content: EditionContent): Item[] =>
  content.photos.map(({ photoId, alt }) => ({ key: String(photoId), name: alt }));

/** Told only where things that both editions have stand in another order; what is new or gone moves nothing. */
function moved(
  field: string,
  label: string,
  before: readonly Item[],
  after: readonly Item[],
): FieldDifference[] {
  const shared = (items: readonly Item[], others: readonly Item[]): Item[] =>
    items.filter((item) => others.some((other) => other.key === item.key));
  const earlier = shared(before, after);
  const later = shared(after, before);
  if (earlier.every((item, index) => item.key === later[index]?.key)) return [];
  const nameOf = new Map(later.map((item) => [item.key, item.name]));
  const list = (items: readonly Item[]): string =>
    items.map((item, index) => `${index + 1}. ${nameOf.get(item.key) ?? item.name}`).join('\n');
  return [{ field, label, pieces: wordDifference(list(earlier), list(later)) }];
}

function firstWords(text: string): string {
  const words = text.trim().split(/\s+/);
  return words.length <= 8 ? words.join(' ') : `${words.slice(0, 8).join(' ')} …`;
}
