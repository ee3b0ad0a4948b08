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
   * Other words within `limit` typos (1 or 2). Only words with the same first letter are measured: the map takes
   * swaps for two edits, so it is asked for one edit more and the answer is sifted. A wrong first letter uses up
   * two typos by itself, so such words are looked up directly.
   */
  lookAlikes(typed: string, limit: number): LikeWord[] {
    if (limit < 1) return [];
    const found: Counted[] = [];
    const [first = ''] = typed;
    for (const [rest, [documents]] of this.words.atPrefix(first).fuzzyGet(typed.slice(1), limit + 1)) {
      const word = first + rest;
      const typos = word === typed ? 0 : typosBetween(typed, word, limit);
      if (typos > 0 && typos <= limit && !/\d/.test(word)) found.push({ word, typos, documents });
    }
    if (limit >= 2) found.push(...this.otherwiseBegun(typed));
    return closest(found);
  }

  /** Words whose beginning is within one typo of what was typed so far. Cost: words with its first letter. */
  lookAlikePrefixes(typed: string): LikeWord[] {
    const found: Counted[] = [];
    for (const [word, documents] of this.words.atPrefix(typed.slice(0, 1))) {
      if (word.length < typed.length - 1 || /\d/.test(word)) continue;
      const near = [0, 1, -1].some(
        (more) => alignmentDistance(typed, word.slice(0, typed.length + more), 1) <= 1,
      );
      if (near) found.push({ word, typos: 1, documents });
    }
    return closest(found);
  }

  /** Words that differ at their beginning only: a letter wrong, missing, too many, or the first two swapped. */
  private otherwiseBegun(typed: string): Counted[] {
    const rest = typed.slice(1);
    const swapped = `${typed.slice(1, 2)}${typed.slice(0, 1)}${typed.slice(2)}`;
    const letters = Array.from({ length: 26 }, (_, at) => String.fromCharCode(97 + at));
    const words = new Set([rest, swapped, ...letters.flatMap((letter) => [letter + rest, letter + typed])]);
    words.delete(typed);
    return [...words].flatMap((word) => {
      const documents = this.frequency(word);
      return documents > 0 && word[0] !== typed[0] ? [{ word, typos: 2, documents }] : [];
    });
  }
}

interface Counted extends LikeWord {
  readonly documents: number;
}

function closest(found: Counted[]): LikeWord[] {
  found.sort((left, right) => left.typos - right.typos || right.documents - left.documents);
  return found.slice(0, maxLookAlikes).map(({ word, typos }) => ({ word, typos }));
}
