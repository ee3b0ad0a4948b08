import type { AuditLine } from '../../shared/contract/audit.js';
import { actionWords } from '../../shared/text/audit-words.js';

const columns = [
  'id',
  'at',
  'who id',
  'who',
  'action',
  'in words',
  'kind',
  'thing id',
  'thing',
  'reason',
  'details',
];

/** First line of the CSV file, with a mark by which spreadsheets take it for UTF-8. */
export const csvHead = `\uFEFF${columns.map(csvCell).join(',')}\r\n`;

/** One entry as a line of CSV by RFC 4180. */
export function csvLine(line: AuditLine): string {
  const cells = [
    String(line.id),
    line.at,
    line.actor === null ? '' : String(line.actor.id),
    line.actor?.displayName ?? 'the site',
    line.action,
    actionWords(line.action),
    line.subject.kind,
    String(line.subject.id),
    line.subject.name,
    line.reason,
    line.details.join('; '),
  ];
  return `${cells.map(csvCell).join(',')}\r\n`;
}

/** One entry as a line of JSON. */
export function jsonLine(line: AuditLine): string {
  return `${JSON.stringify(line)}\n`;
}

/**
 * A cell by RFC 4180. One that a spreadsheet would take for a formula (first character =, +, -, @, tab or line end) gets
 * an apostrophe before it, by which it stays text.
 */
export function csvCell(text: string): string {
  const guarded = /^[=+\-@\t\r\n]/.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(guarded) ? `"${guarded.replaceAll('"', '""')}"` : guarded;
}
