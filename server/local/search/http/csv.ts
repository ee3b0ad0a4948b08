import type { Document } from '../storage/flatten.js';
import { ApiError } from './api-error.js';

/**
 * Reads CSV (RFC 4180) with a line of names: `price:number` and `sold:boolean` give their type, all else is text.
 * Empty numbers and booleans become null. Throws malformed_payload naming the line.
 */
export function csvDocuments(text: string, delimiter: string): Document[] {
  const [head = [], ...rows] = csvRows(text.replace(/^\uFEFF/, ''), delimiter);
  const fields = head.map((name) => {
    const [, bare = name, type = 'string'] = /^(.*):(number|boolean|string)$/s.exec(name) ?? [];
    return { name: bare, type };
  });
  return rows.map((row, at) => {
    if (row.length !== fields.length) {
      throw malformed(`line ${at + 2} has ${row.length} values where ${fields.length} are named`);
    }
    return Object.fromEntries(
      fields.map(({ name, type }, place) => [name, typed(row[place] ?? '', type, at + 2)]),
    );
  });
}

function typed(text: string, type: string, line: number): unknown {
  if (type === 'string') return text;
  if (text.trim() === '') return null;
  if (type === 'number') {
    const number = Number(text);
    if (Number.isFinite(number)) return number;
    throw malformed(`line ${line}: \`${text.slice(0, 40)}\` is not a number`);
  }
  if (text !== 'true' && text !== 'false')
    throw malformed(`line ${line}: \`${text.slice(0, 40)}\` is neither true nor false`);
  return text === 'true';
}

function csvRows(text: string, delimiter: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let value = '';
  let inQuotes = false;
  const endRow = () => {
    row.push(value);
    value = '';
    if (row.length > 1 || row[0] !== '') rows.push(row);
    row = [];
  };
  for (let at = 0; at < text.length; at++) {
    const character = text[at] ?? '';
    if (inQuotes) {
      if (character !== '"') value += character;
      else if (text[at + 1] === '"') value += text[++at] ?? '';
      else inQuotes = false;
    } else if (character === '"' && value === '') inQuotes = true;
    else if (character === delimiter) {
      row.push(value);
      value = '';
    } else if (character === '\n') endRow();
    else if (character !== '\r' || text[at + 1] !== '\n') value += character;
  }
  if (inQuotes) throw malformed('a quote is not closed');
  endRow();
  return rows;
}

const malformed = (reason: string) =>
  new ApiError('malformed_payload', `The \`csv\` payload provided is malformed: ${reason}.`);
