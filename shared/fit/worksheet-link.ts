import { readInputs, textsOfQuery, type QueryValues } from '../contract/worksheet-address.js';
import {
  worksheetKinds,
  worksheetVersion,
  type WorksheetKind,
  type WorksheetRecord,
} from '../contract/worksheet.js';
import { summarise } from './worksheet.js';

export type ReadLink = { readonly record: WorksheetRecord } | { readonly refusal: string };

/**
 * The worksheet that a link stands for, run: `/worksheets/shim?v=1&gap=1.7`, with or without the site before it. Refused,
 * with the reason in words, where the address is not a worksheet's, of another version, holds something that is no number,
 * or comes to no result. Never throws.
 */
export function worksheetOfLink(link: string): ReadLink {
  let address: URL;
  try {
    address = new URL(link.trim(), 'http://shimlore.invalid');
  } catch {
    return { refusal: 'This is not a link.' };
  }
  const kind = worksheetKinds.find((candidate) => address.pathname === `/worksheets/${candidate}`);
  if (!kind) return { refusal: 'This is not the link of a worksheet; “Copy link” on a worksheet gives one.' };
  return readSheet(kind, address.searchParams);
}

function readSheet<K extends WorksheetKind>(kind: K, parameters: URLSearchParams): ReadLink {
  if (parameters.get('v') !== String(worksheetVersion)) {
    return { refusal: 'This worksheet is of another version; open it and copy its link again.' };
  }
  const query: QueryValues = Object.fromEntries(
    [...new Set(parameters.keys())].map((name) => {
      const values = parameters.getAll(name);
      return [name, values.length === 1 ? values[0]! : values];
    }),
  );
  const { inputs, notNumbers } = readInputs(kind, textsOfQuery(kind, query));
  if (notNumbers.length > 0)
    return { refusal: `These fields of the worksheet hold no number: ${notNumbers.join(', ')}.` };
  const { result } = summarise(kind, inputs);
  if (!result) return { refusal: 'This worksheet comes to no result yet; fill in what it asks for.' };
  return { record: { kind, version: worksheetVersion, inputs, result } as WorksheetRecord };
}
