import { Marked, type RendererObject, type Tokens } from 'marked';

/** What of DOMPurify is used; handed in, since browser and server come by it differently. */
export interface Purifier {
  sanitize(dirty: string, config: typeof purifierSettings): unknown;
}

/** Elements that a text may hold, and the attributes each may carry. Anything else never reaches a page. */
export const allowedElements: Readonly<Record<string, readonly string[]>> = {
  p: [],
  br: [],
  hr: [],
  em: [],
  strong: [],
  del: [],
  code: [],
  pre: [],
  blockquote: [],
  ul: [],
  ol: ['start'],
  li: [],
  a: ['href', 'rel'],
  h4: [],
  h5: [],
  h6: [],
  table: [],
  thead: [],
  tbody: [],
  tr: [],
  th: ['align'],
  td: ['align'],
};

/** Targets a link may have: the web, mail, this site. Checked after white space and control characters are taken out. */
const allowedTarget = /^(?:https?:\/\/|mailto:|\/(?![/\\])|#)/i;
const linkRelation = 'nofollow noopener ugc';

export const purifierSettings = {
  ALLOWED_TAGS: Object.keys(allowedElements),
  ALLOWED_ATTR: ['href', 'rel', 'start', 'align'],
  // Attributes whose value is no address, and so is not held against the pattern below.
  ADD_URI_SAFE_ATTR: ['rel', 'start', 'align'],
  ALLOWED_URI_REGEXP: allowedTarget,
  ALLOW_ARIA_ATTR: false,
  ALLOW_DATA_ATTR: false,
  ALLOW_UNKNOWN_PROTOCOLS: false,
};

const escapes: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => escapes[character] ?? character);
}

const renderer: RendererObject = {
  html({ text }: Tokens.HTML | Tokens.Tag) {
    return escapeHtml(text);
  },
  // Pictures come from the photo store, where their metadata is gone and their alternative text is checked.
  image({ text }: Tokens.Image) {
    return escapeHtml(text);
  },
  heading({ tokens, depth }: Tokens.Heading) {
    // A page's own headings go down to h3; the text's stand below them.
    const level = Math.min(depth + 3, 6);
    return `<h${level}>${this.parser.parseInline(tokens)}</h${level}>\n`;
  },
  link({ href, tokens }: Tokens.Link) {
    const words = this.parser.parseInline(tokens);
    const target = href.replace(/[\p{Cc}\p{Zs}]/gu, '');
    return allowedTarget.test(target)
      ? `<a href="${escapeHtml(target)}" rel="${linkRelation}">${words}</a>`
      : words;
  },
  code({ text }: Tokens.Code) {
    return `<pre><code>${escapeHtml(text)}\n</code></pre>\n`;
  },
  checkbox({ checked }: Tokens.Checkbox) {
    return checked ? '☑ ' : '☐ ';
  },
};

const markdown = new Marked({ gfm: true, breaks: false, async: false, renderer });

/** Quotes and lists inside one another cost a call each; nobody means more levels than this. */
const deepest = 20;
const leadingMarks = /^(?:[ \t]*(?:>|[-*+](?=[ \t])|\d{1,9}[.)](?=[ \t])))+/;

function nestsTooDeep(source: string): boolean {
  return source
    .split('\n')
    .some((line) => (leadingMarks.exec(line)?.[0].match(/>|[-*+]|\d+[.)]/g)?.length ?? 0) > deepest);
}

/** Markdown to HTML; what cannot be parsed within bounds stands as plain text. */
function toHtml(source: string): string {
  const asText = `<p>${escapeHtml(source)}</p>`;
  if (nestsTooDeep(source)) return asText;
  try {
    return markdown.parse(source) as string;
  } catch {
    return asText;
  }
}

/**
 * Markdown (GFM) to HTML that can be put into a page as it is. HTML in the source shows as the text it is, headings start
 * at h4, pictures leave their words, links are marked as coming from readers. Never throws; a source nested beyond 20
 * levels stands as plain text. The result holds only `allowedElements`.
 */
export function renderMarkdown(source: string, purify: Purifier): string {
  return String(purify.sanitize(toHtml(source), purifierSettings)).trim();
}

/** The words of a Markdown source without any marks, for indexes and mails. Not HTML: escape it where it goes into a page. */
export function markdownToPlainText(source: string): string {
  return htmlToPlainText(toHtml(source));
}

const named: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', nbsp: ' ' };

/** The words of HTML made by `renderMarkdown`; blocks become lines. */
export function htmlToPlainText(html: string): string {
  return html
    .replace(/<(?:\/(?:p|li|h[4-6]|pre|tr|blockquote)|br|hr)\b[^>]*>/g, '\n')
    .replace(/<\/t[hd]>/g, ' ')
    .replace(/<[^>]*>/g, '')
    .replace(/&(?:#(\d{1,7})|([a-z]+));/g, (whole, code: string | undefined, name: string | undefined) =>
      code === undefined ? (named[name ?? ''] ?? whole) : characterOf(Number(code), whole),
    )
    .replace(/[ \t]+/g, ' ')
    .replace(/ ?\n\s*/g, '\n')
    .trim();
}

function characterOf(code: number, whole: string): string {
  return code > 0 && code <= 0x10ffff ? String.fromCodePoint(code) : whole;
}
