/** What a mail says; both its text and its HTML are made from it. Every string is plain text. */
export interface Letter {
  readonly subject: string;
  readonly greeting: string;
  readonly paragraphs: readonly string[];
  readonly action?: { readonly label: string; readonly url: string };
  readonly closing?: string;
  /** Page on which notices can be turned off; only in notices. */
  readonly turnOffUrl?: string;
}

const longestSubject = 200;

/** Subject of at most 200 characters in one line. */
export function subjectOf(letter: Letter): string {
  const line = letter.subject.replace(/\s+/g, ' ').trim();
  return line.length <= longestSubject ? line : `${line.slice(0, longestSubject - 1)}…`;
}

export function textOf(letter: Letter): string {
  const blocks = [
    letter.greeting,
    ...letter.paragraphs,
    ...(letter.action ? [`${letter.action.label}:\n${letter.action.url}`] : []),
    ...(letter.closing ? [letter.closing] : []),
    'Shimlore',
    ...(letter.turnOffUrl ? [`-- \nNo more mail like this: ${letter.turnOffUrl}`] : []),
  ];
  return `${blocks.join('\n\n')}\n`;
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
    `<p style="font-size:13px;color:#555"><a href="${escape(letter.turnOffUrl)}" style="color:#555">No more mail like this</a></p>`;
  return [
    '<!doctype html><html lang="en"><head><meta charset="utf-8">',
    `<title>${escape(subjectOf(letter))}</title></head>`,
    '<body style="font-family:sans-serif;font-size:16px;line-height:1.5;color:#1b1f24;max-width:36em;margin:1.5em auto;padding:0 1em">',
    ...paragraphs,
    action ?? '',
    letter.closing ? `<p>${escape(letter.closing)}</p>` : '',
    '<p>Shimlore</p>',
    turnOff ?? '',
    '</body></html>',
  ].join('\n');
}

function escape(text: string): string {
  return text
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;')
    .replace(/'/g, '&#39;');
}
