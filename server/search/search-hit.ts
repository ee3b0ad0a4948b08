import type { Hit } from 'meilisearch';
import type { SearchHit, TextRun } from '../../shared/contract/search.js';
import { applicabilityOf, type OwnedPart } from '../../shared/fit/applicability.js';
import { hitStart, runsOf } from './hit-marks.js';
import { excerptFields, type FoundDocument } from './search-request.js';

type Formatted = Partial<Record<'title' | (typeof excerptFields)[number], unknown>>;

/** A hit as it is shown: matching words told apart, and whether it holds for what the reader has. */
export function searchHitOf(hit: Hit<FoundDocument>, owned: readonly OwnedPart[]): SearchHit {
  const { slug, title, card } = hit;
  const formatted = (hit._formatted ?? {}) as Formatted;
  return {
    slug,
    title: runsOf(textOf(formatted.title) || title),
    excerpt: excerptOf(formatted),
    ...card,
    applicability: applicabilityOf(card.sides, owned),
  };
}

function excerptOf(formatted: Formatted): TextRun[] {
  const texts = excerptFields.map((field) => textOf(formatted[field])).filter((text) => text !== '');
  return runsOf(texts.find((text) => text.includes(hitStart)) ?? texts[0] ?? '');
}

function textOf(value: unknown): string {
  return Array.isArray(value) ? value.join('; ') : typeof value === 'string' ? value : '';
}
