/** One entry; texts are plain but for `html`, which is cleaned HTML. */
export interface FeedEntry {
  readonly id: string;
  readonly title: string;
  readonly url: string;
  readonly publishedAt: Date;
  readonly updatedAt: Date;
  readonly authors: readonly string[];
  readonly summary: string;
  readonly html: string;
}

export interface Feed {
  readonly id: string;
  readonly title: string;
  readonly subtitle: string;
  /** Where the feed itself stands, and the page it is of. */
  readonly selfUrl: string;
  readonly pageUrl: string;
  readonly rights: string;
  /** When nothing is in it yet. */
  readonly emptySince: Date;
  /** The newest first. */
  readonly entries: readonly FeedEntry[];
}

/** An Atom document by RFC 4287 in UTF-8. */
export function atomOf(feed: Feed): string {
  const updated = feed.entries.reduce(
    (newest, entry) => (entry.updatedAt > newest ? entry.updatedAt : newest),
    feed.emptySince,
  );
  return `<?xml version="1.0" encoding="utf-8"?>
<feed xmlns="http://www.w3.org/2005/Atom" xml:lang="en">
  <id>${escapeXml(feed.id)}</id>
  <title>${escapeXml(feed.title)}</title>
  <subtitle>${escapeXml(feed.subtitle)}</subtitle>
  <updated>${updated.toISOString()}</updated>
  <link rel="self" type="application/atom+xml" href="${escapeXml(feed.selfUrl)}"/>
  <link rel="alternate" type="text/html" href="${escapeXml(feed.pageUrl)}"/>
  <rights>${escapeXml(feed.rights)}</rights>
  <generator>Shimlore</generator>
${feed.entries.map(entryOf).join('')}</feed>
`;
}

function entryOf(entry: FeedEntry): string {
  const authors = entry.authors
    .map((name) => `    <author><name>${escapeXml(name)}</name></author>\n`)
    .join('');
  return `  <entry>
    <id>${escapeXml(entry.id)}</id>
    <title>${escapeXml(entry.title)}</title>
    <link rel="alternate" type="text/html" href="${escapeXml(entry.url)}"/>
    <published>${entry.publishedAt.toISOString()}</published>
    <updated>${entry.updatedAt.toISOString()}</updated>
${authors}    <summary>${escapeXml(entry.summary)}</summary>
    <content type="html">${escapeXml(entry.html)}</content>
  </entry>
`;
}

/**
 * Text as it may stand in an element or a quoted attribute. Characters that XML 1.0 does not have at all (section 2.2),
 * lone halves of surrogate pairs among them, are left out: no escape would make them readable.
 */
export function escapeXml(text: string): string {
  return text
    .replace(/[^\t\n\r\u0020-\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu, '')
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;')
    .replace(/'/g, '&#39;');
}
