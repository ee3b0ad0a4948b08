import { wordsOf } from '../lexicon/words.js';
import type { TextMatch } from './text-matches.js';

export interface Crop {
  readonly words: number;
  readonly marker: string;
}

export interface Tags {
  readonly before: string;
  readonly after: string;
}

/** A text cropped to the words around its matches and with the matches between tags; each on wish. */
export function formatText(
  text: string,
  matches: readonly TextMatch[],
  crop: Crop | undefined,
  tags: Tags | undefined,
): string {
  const { start, end } = crop ? cropped(text, matches, crop.words) : { start: 0, end: text.length };
  let shown = start > 0 && crop ? crop.marker : '';
  let at = start;
  for (const match of tags ? matches : []) {
    if (!tags || match.start < start || match.end > end) continue;
    shown += text.slice(at, match.start) + tags.before + text.slice(match.start, match.end) + tags.after;
    at = match.end;
  }
  return shown + text.slice(at, end) + (end < text.length && crop ? crop.marker : '');
}

/** The window of so many words that answers most of the typed words, most often, and the earliest of such. */
function cropped(text: string, matches: readonly TextMatch[], size: number): { start: number; end: number } {
  const words = wordsOf(text);
  if (size <= 0 || words.length <= size) return { start: 0, end: text.length };
  const termsAt = words.map((word) =>
    matches.filter((match) => match.start < word.end && match.end > word.start),
  );
  let best = { score: -1, first: 0 };
  const counts = new Map<number, number>();
  let total = 0;
  const change = (place: number, by: number) => {
    for (const { term } of termsAt[place] ?? []) {
      counts.set(term, (counts.get(term) ?? 0) + by);
      total += by;
    }
  };
  for (let last = 0; last < words.length; last++) {
    change(last, 1);
    if (last >= size) change(last - size, -1);
    const first = last - size + 1;
    if (first < 0) continue;
    const covered = [...counts.values()].filter((count) => count > 0).length;
    const score = covered * 1000 + total;
    if (score > best.score) best = { score, first };
  }
  const first = centred(
    best.first,
    size,
    termsAt.map((list) => list.length > 0),
  );
  const start = first === 0 ? 0 : (words[first]?.start ?? 0);
  const isLast = first + size >= words.length;
  return { start, end: isLast ? text.length : (words[first + size - 1]?.end ?? text.length) };
}

/** Moves the window so that its matches stand about in its middle, without losing any. */
function centred(first: number, size: number, hit: readonly boolean[]): number {
  const places = Array.from({ length: size }, (_, place) => first + place).filter((place) => hit[place]);
  const [left] = places;
  const right = places.at(-1);
  if (left === undefined || right === undefined) return first;
  const room = size - (right - left + 1);
  return Math.max(0, Math.min(left - Math.floor(room / 2), hit.length - size));
}
