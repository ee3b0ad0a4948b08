import purify from 'isomorphic-dompurify';
import type { RichText } from '../../shared/contract/write-ups.js';
import { htmlToPlainText, renderMarkdown } from '../../shared/text/render-markdown.js';

/** Texts kept rendered; one page has about thirty, and most readers look at the same pages. */
const remembered = 2000;
const rendered = new Map<string, string>();

/** Markdown as written, and as cleaned HTML. Cost: about a millisecond the first time, nothing while it is remembered. */
export function renderText(source: string): RichText {
  let html = rendered.get(source);
  if (html === undefined) {
    html = renderMarkdown(source, purify);
    if (rendered.size >= remembered) rendered.delete(rendered.keys().next().value as string);
    rendered.set(source, html);
  }
  return { source, html };
}

/** The words of rendered HTML, for mails and other places without markup. */
export function toPlainText(html: string): string {
  return htmlToPlainText(html);
}
