import type { Request } from 'express';
import type { Document } from '../storage/flatten.js';
import { ApiError } from './api-error.js';
import { csvDocuments } from './csv.js';
import { bodyText, parsedJson, requireType } from './input.js';

const types = ['application/json', 'application/x-ndjson', 'text/csv'];

/** The documents sent in a body: JSON (one or an array), one JSON object a line, or CSV. */
export function documentsInBody(request: Request, delimiter: string | undefined): Document[] {
  const type = requireType(request, types);
  if (delimiter !== undefined && (type !== 'text/csv' || !/^[\x20-\x7e\t]$/.test(delimiter))) {
    throw new ApiError(
      'invalid_document_csv_delimiter',
      'The csvDelimiter is one ASCII character and goes with the Content-Type text/csv only.',
    );
  }
  if (type === 'text/csv') return csvDocuments(bodyText(request, 'csv'), delimiter ?? ',');
  if (type === 'application/x-ndjson') {
    const lines = bodyText(request, 'ndjson')
      .split('\n')
      .filter((line) => line.trim() !== '');
    return lines.map((line) => asDocument(parsedJson(line, 'ndjson'), 'ndjson'));
  }
  const body = parsedJson(bodyText(request, 'json'), 'json');
  return (Array.isArray(body) ? body : [body]).map((each) => asDocument(each, 'json'));
}

function asDocument(value: unknown, what: string): Document {
  if (typeof value === 'object' && value !== null && !Array.isArray(value)) return value as Document;
  throw new ApiError(
    'malformed_payload',
    `The \`${what}\` payload provided is malformed: a document must be an object, found \`${JSON.stringify(value).slice(0, 60)}\`.`,
  );
}
