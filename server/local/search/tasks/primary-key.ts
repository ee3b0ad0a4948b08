import { ApiError } from '../http/api-error.js';
import type { Document } from '../storage/flatten.js';
import type { IndexState } from '../storage/index-catalogue.js';

/** The attribute that identifies documents: the index's own, the one asked for, or the only one ending in "id". */
export function primaryKeyFor(
  index: IndexState,
  asked: { readonly primaryKey: string | null; readonly documents: readonly Document[] },
  isEmpty: () => boolean,
): string {
  const { primaryKey } = asked;
  if (primaryKey !== null && index.primaryKey !== null && primaryKey !== index.primaryKey && !isEmpty()) {
    throw new ApiError(
      'index_primary_key_already_exists',
      `Index \`${index.uid}\` already has a primary key: \`${index.primaryKey}\`.`,
    );
  }
  return primaryKey ?? index.primaryKey ?? inferred(index.uid, asked.documents[0]);
}

function inferred(uid: string, document: Document | undefined): string {
  const candidates = Object.keys(document ?? { id: 0 }).filter((key) => key.toLowerCase().endsWith('id'));
  const [first, second] = candidates;
  if (first === undefined) {
    throw new ApiError(
      'index_primary_key_no_candidate_found',
      `The primary key inference failed as the engine did not find any field ending with \`id\` in its name. ` +
        `Please specify the primary key manually using the \`primaryKey\` query parameter.`,
    );
  }
  if (second !== undefined) {
    throw new ApiError(
      'index_primary_key_multiple_candidates_found',
      `Index \`${uid}\`: the primary key inference failed as the engine found ${candidates.length} fields ending ` +
        `with \`id\` in their names: '${first}' and '${second}'. Please specify the primary key manually using the ` +
        `\`primaryKey\` query parameter.`,
    );
  }
  return first;
}

/** The identifier of a document as text. Throws where it is missing or not made of letters, digits, - and _. */
export function documentId(document: Document, primaryKey: string): string {
  const value = Object.hasOwn(document, primaryKey) ? document[primaryKey] : nested(document, primaryKey);
  if (value === undefined) {
    throw new ApiError(
      'missing_document_id',
      `Document doesn't have a \`${primaryKey}\` attribute: \`${JSON.stringify(document).slice(0, 200)}\`.`,
    );
  }
  const fits =
    (typeof value === 'number' && Number.isSafeInteger(value)) ||
    (typeof value === 'string' && /^[a-zA-Z0-9_-]{1,511}$/.test(value));
  if (!fits) {
    throw new ApiError(
      'invalid_document_id',
      `Document identifier \`${JSON.stringify(value).slice(0, 200)}\` is invalid. A document identifier can be of type ` +
        'integer or string, only composed of alphanumeric characters (a-z A-Z 0-9), hyphens (-) and underscores (_), ' +
        'and can not be more than 511 bytes.',
    );
  }
  return String(value);
}

function nested(document: Document, path: string): unknown {
  let value: unknown = document;
  for (const key of path.split('.')) {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
    value = (value as Record<string, unknown>)[key];
  }
  return value;
}
