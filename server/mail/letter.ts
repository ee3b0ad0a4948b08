/** A file that goes with a mail. */
export interface Attachment {
  readonly fileName: string;
  readonly mediaType: string;
  readonly content: Buffer;
}

/** Figures beside words; in text its columns are lined up. */
export interface LetterTable {
  readonly caption: string;
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

export interface LetterSection {
  readonly heading: string;
  readonly lines: readonly { readonly text: string; readonly url: string }[];
}

/** What a mail says; both its text and its HTML are made from it. Every string is plain text. */
export interface Letter {
  readonly subject: string;
  readonly greeting: string;
  readonly paragraphs: readonly string[];
  /** After the paragraphs: several things told of in one mail, under headings. */
  readonly sections?: readonly LetterSection[];
  /** After the paragraphs. */
  readonly tables?: readonly LetterTable[];
  readonly action?: { readonly label: string; readonly url: string };
  readonly closing?: string;
  /** Why this mail comes, in small print. */
  readonly why?: string;
  /** Page on which notices can be turned off; only in notices. */
  readonly turnOffUrl?: string;
  /** What the link to that page says. */
  readonly turnOffLabel?: string;
}

const longestSubject = 200;

/** Subject of at most 200 characters in one line. */
export function subjectOf(letter: Letter): string {
  const line = letter.subject.replace(/\s+/g, ' ').trim();
  return line.length <= longestSubject ? line : `${line.slice(0, longestSubject - 1)}…`;
}

const usualTurnOffLabel = 'No more mail like this';

export function textOf(letter: Letter): string {
  const foot = [
    ...(letter.why ? [letter.why] : []),
    ...(letter.turnOffUrl ? [`${letter.turnOffLabel ?? usualTurnOffLabel}: ${letter.turnOffUrl}`] : []),
  ];
  const blocks = [
    letter.greeting,
    ...letter.paragraphs,
    ...(letter.sections ?? []).map(sectionText),
    ...(letter.tables ?? []).map(textTable),
    ...(letter.action ? [`${letter.action.label}:\n${letter.action.url}`] : []),
    ...(letter.closing ? [letter.closing] : []),
    'Shimlore',
    ...(foot.length > 0 ? [`-- \n${foot.join('\n')}`] : []),
  ];
  return `${blocks.join('\n\n')}\n`;
}

function sectionText({ heading, lines }: LetterSection): string {
  return [heading, ...lines.map(({ text, url }) => `- ${text}\n  ${url}`)].join('\n');
}

export function htmlOf(letter: Letter): string {
  const paragraphs = [letter.greeting, ...letter.paragraphs].map(
    (text) => `<p>${escape(text).replace(/\n/g, '<br>')}</p>`,
  );
  const action =
    letter.action &&
    `<p><a href="${escape(letter.action.url)}" style="color:#1f4e8c">${escape(letter.action.label)}</a></p>`;
  const turnOff =
    letter.turnOffUrl &&
    `<a href="${escape(letter.turnOffUrl)}" style="color:#555">${escape(letter.turnOffLabel ?? usualTurnOffLabel)}</a>`;
  const foot = [...(letter.why ? [escape(letter.why)] : []), ...(turnOff ? [turnOff] : [])];
  return [
    '<!doctype html><html lang="en"><head><meta charset="utf-8">',
    `<title>${escape(subjectOf(letter))}</title></head>`,
    '<body style="font-family:sans-serif;font-size:16px;line-height:1.5;color:#1b1f24;max-width:36em;margin:1.5em auto;padding:0 1em">',
    ...paragraphs,
    ...(letter.sections ?? []).map(sectionHtml),
    ...(letter.tables ?? []).map(htmlTable),
    action ?? '',
    letter.closing ? `<p>${escape(letter.closing)}</p>` : '',
    '<p>Shimlore</p>',
    foot.length > 0 ? `<p style="font-size:13px;color:#555">${foot.join('<br>')}</p>` : '',
    '</body></html>',
  ].join('\n');
}

function sectionHtml({ heading, lines }: LetterSection): string {
  const items = lines.map(
    ({ text, url }) =>
      `<li style="margin:.25em 0"><a href="${escape(url)}" style="color:#1f4e8c">${escape(text)}</a></li>`,
  );
  return `<h2 style="font-size:16px;margin:1.25em 0 .25em">${escape(heading)}</h2><ul style="margin:0;padding-left:1.25em">${items.join('')}</ul>`;
}

function textTable({ caption, head, rows }: LetterTable): string {
  const all = [head, ...rows];
  const widths = head.map((_, column) => Math.max(...all.map((row) => (row[column] ?? '').length)));
  const lines = all.map((row) =>
    row
      .map((cell, column) => cell.padEnd(widths[column] ?? 0))
      .join('  ')
      .trimEnd(),
  );
  return [caption, ...lines].join('\n');
}

function htmlTable({ caption, head, rows }: LetterTable): string {
  const cells = (tag: 'th' | 'td', row: readonly string[]): string =>
    row
      .map(
        (cell) =>
          `<${tag} style="text-align:left;padding:2px 12px 2px 0;border-bottom:1px solid #ccc">${escape(cell)}</${tag}>`,
      )
      .join('');
  return [
    '<table style="border-collapse:collapse;font-size:14px;margin:0 0 1em">',
    `<caption style="text-align:left;font-weight:bold">${escape(caption)}</caption>`,
    `<tr>${cells('th', head)}</tr>`,
    ...rows.map((row) => `<tr>${cells('td', row)}</tr>`),
    '</table>',
  ].join('');
}

function escape(text: string): string {
  return text
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;')
    .replace(/'/g, '&#39;');
}
