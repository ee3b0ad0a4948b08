import type { EditionContent } from '../contract/edition-content.js';
import { editionShape, type Shape } from './edition-shape.js';
import type { EditionText } from './edition-text.js';

/**
 * The text with what cannot be saved put back to how it was saved last, so that all the rest can be. Of a list only the items
 * named go back, to the saved ones of their keys; those that were never saved are left out. `paths` are those of the content,
 * such as `cause` or `fixes.0.title`; `changeNote` stands beside it. What no path leads to stays as it is.
 */
export function holdBack(text: EditionText, saved: EditionText, paths: readonly string[]): EditionText {
  const held = new Map<string, Set<number> | 'all'>();
  for (const path of paths) {
    const [field = '', index] = path.split('.');
    const known = held.get(field) ?? new Set<number>();
    held.set(field, known === 'all' || !/^\d+$/.test(index ?? '') ? 'all' : known.add(Number(index)));
  }
  const content = Object.fromEntries(
    Object.entries(text.content).map(([field, value]: [string, unknown]) => {
      const which = held.get(field);
      const was: unknown = saved.content[field as keyof EditionContent];
      if (which === undefined) return [field, value];
      const shape = shapeOf(field);
      return which === 'all' || shape?.kind !== 'list'
        ? [field, was]
        : [field, withItemsBack(value as unknown[], was as unknown[], which, shape.keyOf)];
    }),
  ) as EditionContent;
  return { content, changeNote: held.has('changeNote') ? saved.changeNote : text.changeNote };
}

function withItemsBack(
  items: readonly unknown[],
  saved: readonly unknown[],
  which: ReadonlySet<number>,
  keyOf: (item: unknown) => string,
): unknown[] {
  const was = new Map(saved.map((item) => [keyOf(item), item]));
  return items.flatMap((item, index) => {
    if (!which.has(index)) return [item];
    const back = was.get(keyOf(item));
    return back === undefined ? [] : [back];
  });
}

function shapeOf(field: string): Shape | undefined {
  const content = editionShape.kind === 'record' ? editionShape.members['content'] : undefined;
  return content?.kind === 'record' && Object.hasOwn(content.members, field)
    ? content.members[field]
    : undefined;
}
