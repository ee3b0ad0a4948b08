import { stem } from '../lexicon/stem.js';
import { wordsOf, type Word } from '../lexicon/words.js';
import { distinct, type Phrase, type QueryPlan } from './query-plan.js';

/** A run of a text that answers the query (UTF-16 offsets). */
export interface TextMatch {
  readonly start: number;
  readonly end: number;
  /** Which of the typed words it answers. */
  readonly term: number;
}

interface Sought {
  readonly phrase: Phrase;
  readonly term: number;
}

interface Formed {
  readonly word: Word;
  readonly stems: ReadonlySet<string>;
}

/** Finds in texts what a query plan searches for. */
export class TextMatcher {
  private readonly byFirstStem = new Map<string, Sought[]>();
  private readonly beginnings: { readonly prefix: string; readonly term: number }[] = [];

  constructor(plan: QueryPlan) {
    const lists = [
      ...plan.terms.map(({ exact, loose }) => distinct([...exact, ...loose])),
      ...plan.phrases.map((each) => [each]),
    ];
    lists.forEach((phrases, term) => {
      for (const phrase of phrases) this.seek(phrase, term);
    });
  }

  /** Matches in the order of the text; they do not overlap. */
  matches(text: string): TextMatch[] {
    const formed = wordsOf(text).map((word) => ({
      word,
      stems: new Set([word.word, ...word.parts].map(stem)),
    }));
    const found: TextMatch[] = [];
    for (let at = 0; at < formed.length; at++) {
      const match = this.phraseAt(formed, at) ?? this.beginningAt(formed[at]);
      if (!match) continue;
      found.push(match.match);
      at += match.words - 1;
    }
    return found;
  }

  private seek(phrase: Phrase, term: number): void {
    const [first] = phrase.stems;
    if (first === undefined) return;
    if (phrase.prefix) this.beginnings.push({ prefix: first, term });
    else this.byFirstStem.set(first, [...(this.byFirstStem.get(first) ?? []), { phrase, term }]);
  }

  private phraseAt(formed: readonly Formed[], at: number): { match: TextMatch; words: number } | undefined {
    const first = formed[at];
    if (!first) return undefined;
    let best: { match: TextMatch; words: number } | undefined;
    for (const root of first.stems) {
      for (const { phrase, term } of this.byFirstStem.get(root) ?? []) {
        const words = phrase.stems.length;
        if (best && best.words >= words) continue;
        const last = formed[at + words - 1];
        const holds = phrase.stems.every((each, place) => formed[at + place]?.stems.has(each));
        if (last && holds) best = { match: { start: first.word.start, end: last.word.end, term }, words };
      }
    }
    return best;
  }

  private beginningAt(formed: Formed | undefined): { match: TextMatch; words: number } | undefined {
    if (!formed) return undefined;
    const { word } = formed;
    const beginning = this.beginnings.find(({ prefix }) =>
      [word.word, ...word.parts].some((form) => form.startsWith(prefix)),
    );
    if (!beginning) return undefined;
    const { prefix, term } = beginning;
    const end = word.word.startsWith(prefix) ? Math.min(word.start + prefix.length, word.end) : word.end;
    return { match: { start: word.start, end, term }, words: 1 };
  }
}
