import { gatheredKinds } from '../../shared/contract/watches.js';
import type { DigestSection } from '../mail/watch-letters.js';
import { groupBy } from '../rows.js';
import type { DigestRow } from './digest.store.js';
import { subjectKey, type SubjectName } from './subject-names.store.js';

/** As many lines as a mail can be read with; the rest is on the page of notices. */
const mostLines = 60;

/**
 * What happened under headings of what it concerns, in the order in which each first had something to tell. Readings,
 * trials and reports of fit of one page are one line with their number. `left`: how many things the lines leave out.
 */
export function digestSections(
  rows: readonly DigestRow[],
  names: ReadonlyMap<string, SubjectName>,
): { sections: DigestSection[]; left: number } {
  let room = mostLines;
  let left = 0;
  const sections: DigestSection[] = [];
  for (const [heading, group] of groupBy(rows, (row) => headingOf(row, names))) {
    const lines = linesOf(group);
    const shown = lines.slice(0, room);
    room -= shown.length;
    left += lines.slice(shown.length).reduce((sum, { count }) => sum + count, 0);
    if (shown.length > 0) sections.push({ heading, lines: shown.map(({ text, path }) => ({ text, path })) });
  }
  return { sections, left };
}

function headingOf(
  { because, subject, subjectId }: DigestRow,
  names: ReadonlyMap<string, SubjectName>,
): string {
  if (because === 'person') return 'About what you asked, tried or wrote';
  const name = subject && subjectId && names.get(subjectKey({ subject, id: subjectId }))?.name;
  if (!name) return because === 'bench' ? 'Your bench' : 'What you watch';
  return because === 'bench' ? `${name}, on your bench` : name;
}

function linesOf(rows: readonly DigestRow[]): { text: string; path: string; count: number }[] {
  const alike = groupBy(rows, (row) =>
    gatheredKinds.has(row.kind) ? `${row.kind} ${row.path}` : String(row.id),
  );
  return [...alike.values()].map((group) => {
    const [first] = group as [DigestRow];
    const text =
      group.length === 1 ? first.title : (gatheredKinds.get(first.kind)?.(group.length) ?? first.title);
    return { text, path: first.path, count: group.length };
  });
}
