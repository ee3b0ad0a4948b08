export type Leaf = string | number | boolean | null;

export interface PathValue {
  readonly path: string;
  /** A leaf, or what stands there instead of one. */
  readonly kind: 'text' | 'number' | 'truth' | 'null' | 'emptyText' | 'empty' | 'object';
  readonly value: Leaf;
}

export type Document = Readonly<Record<string, unknown>>;

/** Deeper than this a document is taken as it stands, so that no document can exhaust the stack. */
const deepest = 100;

/** Every value of a document under its dotted path; elements of arrays share their array's path. */
export function flatten(document: Document): PathValue[] {
  const values: PathValue[] = [];
  const visit = (path: string, value: unknown, depth: number): void => {
    if (depth > deepest) return;
    if (value === null || value === undefined) values.push({ path, kind: 'null', value: null });
    else if (typeof value === 'string')
      values.push({ path, kind: value === '' ? 'emptyText' : 'text', value });
    else if (typeof value === 'number') values.push({ path, kind: 'number', value });
    else if (typeof value === 'boolean') values.push({ path, kind: 'truth', value });
    else if (Array.isArray(value)) {
      if (value.length === 0) values.push({ path, kind: 'empty', value: null });
      for (const element of value) visit(path, element, depth + 1);
    } else if (typeof value === 'object') {
      const entries = Object.entries(value);
      values.push({ path, kind: entries.length === 0 ? 'empty' : 'object', value: null });
      for (const [key, nested] of entries) visit(`${path}.${key}`, nested, depth + 1);
    }
  };
  for (const [key, value] of Object.entries(document)) visit(key, value, 1);
  return values;
}
