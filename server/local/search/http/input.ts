import type { Request } from 'express';
import { ApiError } from './api-error.js';

/** The value of a query parameter; a parameter given twice counts as its last. */
export function param(request: Request, name: string): string | undefined {
  const value: unknown = request.query[name];
  if (Array.isArray(value)) return value.map(String).at(-1);
  return typeof value === 'string' ? value : undefined;
}

/** A value from the path. */
export function pathParam(request: Request, name: string): string {
  const value = request.params[name];
  return typeof value === 'string' ? value : '';
}

/** A whole number of nought or more from the query string. Throws with the code given. */
export function countParam(request: Request, name: string, code: string, otherwise: number): number {
  const text = param(request, name);
  if (text === undefined) return otherwise;
  if (!/^\d{1,15}$/.test(text)) {
    throw new ApiError(
      code,
      `Invalid value in parameter \`${name}\`: could not parse \`${text}\` as a positive integer`,
    );
  }
  return Number(text);
}

/** Refuses query parameters that the route does not know. */
export function onlyParams(request: Request, known: readonly string[]): void {
  const unknown = Object.keys(request.query).find((name) => !known.includes(name));
  if (unknown === undefined) return;
  const names = known.map((name) => `\`${name}\``).join(', ');
  throw new ApiError('bad_request', `Unknown parameter \`${unknown}\`: expected one of ${names}`);
}

/** The body's text. Throws missing_payload where there is none, malformed_payload where it is no UTF-8. */
export function bodyText(request: Request, what: string): string {
  const body: unknown = request.body;
  if (!Buffer.isBuffer(body) || body.length === 0)
    throw new ApiError('missing_payload', `A ${what} payload is missing.`);
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(body);
  } catch {
    throw new ApiError(
      'malformed_payload',
      `The \`${what}\` payload provided is malformed: it is not valid UTF-8.`,
    );
  }
}

/** Deeper nesting than this is refused, so that no document can exhaust the stack. */
const deepest = 128;

/** The body as JSON. Throws missing_content_type, invalid_content_type, missing_payload or malformed_payload. */
export function jsonBody(request: Request): unknown {
  requireType(request, ['application/json']);
  return parsedJson(bodyText(request, 'json'), 'json');
}

/** As jsonBody, for routes where a body may be left out. */
export function optionalJsonBody(request: Request): unknown {
  const body: unknown = request.body;
  return Buffer.isBuffer(body) && body.length > 0 ? jsonBody(request) : {};
}

export function parsedJson(text: string, what: string): unknown {
  if (nesting(text) > deepest) {
    throw new ApiError(
      'malformed_payload',
      `The \`${what}\` payload provided is malformed: nested deeper than ${deepest} levels.`,
    );
  }
  try {
    return JSON.parse(text);
  } catch (error) {
    const reason = error instanceof Error ? error.message.slice(0, 200) : '';
    throw new ApiError('malformed_payload', `The \`${what}\` payload provided is malformed: \`${reason}\`.`);
  }
}

function nesting(text: string): number {
  let depth = 0;
  let most = 0;
  for (const [token] of text.matchAll(/"(?:[^"\\]|\\.)*"|[[\]{}]/gs)) {
    if (token === '[' || token === '{') most = Math.max(most, ++depth);
    else if (token === ']' || token === '}') depth--;
  }
  return most;
}

/** The media type of the body, one of those given. */
export function requireType(request: Request, types: readonly string[]): string {
  const header = request.headers['content-type'];
  const accepted = types.map((type) => `\`${type}\``).join(', ');
  if (header === undefined) {
    throw new ApiError(
      'missing_content_type',
      `A Content-Type header is missing. Accepted values for the Content-Type header are: ${accepted}`,
    );
  }
  const type = header.split(';')[0]?.trim().toLowerCase() ?? '';
  if (!types.includes(type)) {
    throw new ApiError(
      'invalid_content_type',
      `The Content-Type \`${header.slice(0, 100)}\` is invalid. Accepted values for the Content-Type header are: ${accepted}`,
    );
  }
  return type;
}

/** The body as an object. Throws bad_request where it is something else. */
export function objectBody(body: unknown): Readonly<Record<string, unknown>> {
  if (typeof body === 'object' && body !== null && !Array.isArray(body))
    return body as Record<string, unknown>;
  throw new ApiError('bad_request', 'Invalid value type: expected an object');
}

/** Refuses fields that the route does not know. */
export function onlyFields(body: Readonly<Record<string, unknown>>, known: readonly string[]): void {
  const unknown = Object.keys(body).find((name) => !known.includes(name));
  if (unknown === undefined) return;
  const names = known.map((name) => `\`${name}\``).join(', ');
  throw new ApiError('bad_request', `Unknown field \`${unknown}\`: expected one of ${names}`);
}

/** Checks the name of an index: letters, digits, hyphens and underscores. */
export function indexUid(value: unknown): string {
  if (typeof value === 'string' && /^[a-zA-Z0-9_-]{1,400}$/.test(value)) return value;
  throw new ApiError(
    'invalid_index_uid',
    `\`${String(value).slice(0, 100)}\` is not a valid index uid. Index uid can be an integer or a string containing only ` +
      'alphanumeric characters, hyphens (-) and underscores (_), and can not be more than 400 bytes.',
  );
}
