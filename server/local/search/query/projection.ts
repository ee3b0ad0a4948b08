import { covers } from '../storage/attributes.js';
import type { Document } from '../storage/flatten.js';

/** The part of a document under the paths given: `a.b` keeps `b` inside `a`, also in arrays of objects. */
export function project(document: Document, paths: readonly string[]): Document {
  if (paths.includes('*')) return document;
  return projected(document, '', paths) as Document;
}

function projected(value: Document, prefix: string, paths: readonly string[]): Record<string, unknown> {
  const kept: [string, unknown][] = [];
  for (const [key, nested] of Object.entries(value)) {
    const path = prefix === '' ? key : `${prefix}.${key}`;
    if (paths.some((each) => covers(each, path))) kept.push([key, nested]);
    else if (paths.some((each) => each.startsWith(`${path}.`))) {
      const inner = inside(nested, path, paths);
      if (inner !== undefined) kept.push([key, inner]);
    }
  }
  return Object.fromEntries(kept);
}

function inside(value: unknown, path: string, paths: readonly string[]): unknown {
  if (Array.isArray(value))
    return value.map((each) => inside(each, path, paths)).filter((each) => each !== undefined);
  return typeof value === 'object' && value !== null ? projected(value as Document, path, paths) : undefined;
}

/** Paths asked for that may also be shown; with `*` on either side the other decides. */
export function shownPaths(asked: readonly string[], displayed: readonly string[]): string[] {
  if (displayed.includes('*')) return [...asked];
  if (asked.includes('*')) return [...displayed];
  return asked.flatMap((path) => {
    if (displayed.some((each) => covers(each, path))) return [path];
    return displayed.filter((each) => each.startsWith(`${path}.`));
  });
}
