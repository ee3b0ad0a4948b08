import { licence } from '../../shared/contract/licence.js';
import { fixKindWords } from '../../shared/contract/vocabulary.js';
import type { RichText } from '../../shared/contract/write-ups.js';
import { NotFound } from '../http/problems.js';
import { escapeXml, type Feed, type FeedEntry } from './atom.js';
import type { CautionEntry, FeedStore, QuestionEntry, WriteUpEntry } from './feed.store.js';

const most = 30;
const longestSummary = 300;
/** Day from which the names in tag URIs hold (RFC 4151); it never changes, or every entry would be new to readers. */
const namesSince = '2026-12-01';

export type FeedService = ReturnType<typeof createFeedService>;

/** What is new, for feed readers. */
export function createFeedService(needs: {
  feeds: FeedStore;
  publicAddress: string;
  renderText: (source: string) => RichText;
  toPlainText: (html: string) => string;
}) {
  const { feeds, renderText, toPlainText } = needs;
  const { hostname } = new URL(needs.publicAddress);
  const address = (path: string): string => new URL(path, needs.publicAddress).href;
  const name = (what: string): string => `tag:${hostname},${namesSince}:${what}`;

  const feedOf = (
    path: string,
    page: string,
    words: { title: string; subtitle: string },
    entries: readonly FeedEntry[],
  ): Feed => ({
    ...words,
    id: name(path.slice('/feeds/'.length)),
    selfUrl: address(path),
    pageUrl: address(page),
    rights: `${licence.name} (${licence.spdx})`,
    emptySince: new Date(`${namesSince}T00:00:00Z`),
    entries: [...entries].sort((a, b) => b.updatedAt.getTime() - a.updatedAt.getTime()).slice(0, most),
  });

  return {
    async writeUps(): Promise<Feed> {
      return feedOf(
        '/feeds/write-ups.atom',
        '/search',
        { title: 'Shimlore: write-ups', subtitle: 'Write-ups and their new editions, the newest first.' },
        (await feeds.writeUps(null)).map(ofWriteUp),
      );
    },

    async cautions(): Promise<Feed> {
      return feedOf(
        '/feeds/cautions.atom',
        '/search',
        {
          title: 'Shimlore: cautions',
          subtitle: 'Safety notices that the desk placed on write-ups and fixes.',
        },
        (await feeds.cautions(null)).map(ofCaution),
      );
    },

    /** Throws NotFound. */
    async part(slug: string): Promise<Feed> {
      const part = await feeds.partNamed(slug);
      if (!part) throw new NotFound('There is no part of this name.', 'Look it up among the hardware.');
      const [writeUps, cautions, questions] = await Promise.all([
        feeds.writeUps(part.id),
        feeds.cautions(part.id),
        feeds.questions(part.id),
      ]);
      return feedOf(
        `/feeds/parts/${slug}.atom`,
        `/parts/${slug}`,
        { title: `Shimlore: ${part.name}`, subtitle: `What is new about the ${part.name} by ${part.maker}.` },
        [...writeUps.map(ofWriteUp), ...cautions.map(ofCaution), ...questions.map(ofQuestion)],
      );
    },
  };

  function ofWriteUp(writeUp: WriteUpEntry): FeedEntry {
    const { title, summary, noticed, cause, fixes } = writeUp.content;
    const url = address(`/write-ups/${writeUp.slug}`);
    // Fixes by name only: their steps are read beneath the cautions that stand on the page.
    const listed = fixes.map(
      (fix) =>
        `<li>${escapeXml(fix.kind ? `${fixKindWords[fix.kind].label}: ${fix.title}` : fix.title)}</li>`,
    );
    return {
      id: name(`write-ups/${writeUp.id}`),
      title,
      url,
      publishedAt: writeUp.firstPublishedAt,
      updatedAt: writeUp.publishedAt,
      authors: [writeUp.author],
      summary,
      html: [
        renderText(noticed).html,
        renderText(cause).html,
        `<p>Fixes:</p><ul>${listed.join('')}</ul>`,
        `<p>Steps and cautions stand on <a href="${escapeXml(url)}">the page</a>.</p>`,
      ].join('\n'),
    };
  }

  function ofCaution(caution: CautionEntry): FeedEntry {
    const words = [caution.hazard, caution.consequence, caution.avoidance];
    return {
      id: name(`cautions/${caution.id}`),
      title: `${caution.signalWord.toUpperCase()}: ${caution.hazard} – ${caution.title}`,
      url: address(`/write-ups/${caution.slug}`),
      publishedAt: caution.at,
      updatedAt: caution.at,
      authors: ['The desk of Shimlore'],
      summary: words.join(' '),
      html: words.map((text) => `<p>${escapeXml(text)}</p>`).join(''),
    };
  }

  function ofQuestion(question: QuestionEntry): FeedEntry {
    const { html } = renderText(question.text);
    const plain = toPlainText(html);
    return {
      id: name(`questions/${question.id}`),
      title: question.title,
      url: address(`/questions/${question.slug}`),
      publishedAt: question.at,
      updatedAt: question.at,
      authors: [question.person],
      summary: plain.length <= longestSummary ? plain : `${plain.slice(0, longestSummary - 1)}…`,
      html,
    };
  }
}
