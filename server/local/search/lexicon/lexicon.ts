import SearchableMap from 'minisearch/SearchableMap';
import { alignmentDistance, typosBetween } from './distance.js';
import { stem } from './stem.js';

export interface LikeWord {
  readonly word: string;
  readonly typos: number;
}

/** How many look-alikes of one word are followed; the commonest are kept. */
const maxLookAlikes = 40;

/** The words of one index with the number of documents that hold each. */
export class Lexicon {
  private readonly words = new SearchableMap<number>();
  private readonly wordsOfStem = new Map<string, number>();

  /** Changes the number of documents that hold the word; at nought the word is gone. */
  adjust(word: string, change: number): void {
    const before = this.words.get(word) ?? 0;
    const after = before + change;
    if (after > 0) this.words.set(word, after);
    else if (before > 0) this.words.delete(word);
    const step = (after > 0 ? 1 : 0) - (before > 0 ? 1 : 0);
    if (step === 0) return;
    const root = stem(word);
    const left = (this.wordsOfStem.get(root) ?? 0) + step;
    if (left > 0) this.wordsOfStem.set(root, left);
    else this.wordsOfStem.delete(root);
  }

  frequency(word: string): number {
    return this.words.get(word) ?? 0;
  }

  /** Whether any document holds the word or another form of it. */
  knows(word: string): boolean {
    return this.words.has(word) || this.wordsOfStem.has(stem(word));
  }

  /** Words that start with the prefix, commonest first. */
  startingWith(prefix: string, most: number): string[] {
    return [...this.words.atPrefix(prefix)]
      .sort(([, left], [, right]) => right - left)
      .slice(0, most)
      .map(([word]) => word);
  }

  hasPrefix(prefix: string): boolean {
    for (const _entry of this.words.atPrefix(prefix)) return true;
    return false;
  }

  /**
   * Other words within `limit` typos (1 or 2). The map measures swaps as two edits, so it is asked for one
   * edit more and the answer is sifted.
   */
  lookAlikes(typed: string, limit: number): LikeWord[] {
    if (limit < 1) return [];
    const found: (LikeWord & { documents: number })[] = [];
    for (const [word, [documents]] of this.words.fuzzyGet(typed, limit + 1)) {
      if (word === typed || /\d/.test(word)) continue;
      const typos = typosBetween(typed, word, limit);
      if (typos <= limit) found.push({ word, typos, documents });
    }
    return closest(found);
  }

  /** Words whose beginning is within one typo of what was typed so far. Cost: words with its first letter. */
  lookAlikePrefixes(typed: string): LikeWord[] {
    const found: (LikeWord & { documents: number })[] = [];
    for (const [word, documents] of this.words.atPrefix(typed.slice(0, 1))) {
      if (word.length < typed.length - 1 || /\d/.test(word)) continue;
      const near = [0, 1, -1].some(
        (more) => alignmentDistance(typed, word.slice(0, typed.length + more), 1) <= 1,
      );
      if (near) found.push({ word, typos: 1, documents });
    }
    return closest(found);
  }
}

function closest(found: (LikeWord & { documents: number })[]): LikeWord[] {
  found.sort((left, right) => left.typos - right.typos || right.documents - left.documents);
  return found.slice(0, maxLookAlikes).map(({ word, typos }) => ({ word, typos }));
}
