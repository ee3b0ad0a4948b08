import { wordsOf, type Word } from '../lexicon/words.js';

/** What was typed, cut up. */
export interface QueryWords {
  readonly words: readonly Word[];
  /** Runs of words in quotes: all must stand in a document, in this order. */
  readonly phrases: readonly (readonly string[])[];
  /** Words and runs of words with a minus before them: none may stand in a document. */
  readonly excluded: readonly (readonly string[])[];
  /** Whether the last word may be the beginning of a longer one. */
  readonly open: boolean;
}

/** Words beyond this many are not looked at. */
const mostWords = 10;

/** Cuts up what was typed. A minus counts as "not" only before a letter or a quote, so "-0.1" stays a figure. */
export function queryWords(query: string): QueryWords {
  const words: Word[] = [];
  const phrases: string[][] = [];
  const excluded: string[][] = [];
  let open = false;
  for (const match of query.matchAll(/(?<minus>(?<!\S)-)?"(?<quoted>[^"]*)"?|(?<loose>[^\s"]+)/gu)) {
    const { minus, quoted, loose } = match.groups ?? {};
    open = false;
    if (quoted !== undefined) {
      const phrase = wordsOf(quoted).map(({ word }) => word);
      if (phrase.length > 0) (minus === undefined ? phrases : excluded).push(phrase.slice(0, mostWords));
    } else if (loose !== undefined && /^-\p{L}/u.test(loose)) {
      excluded.push(...wordsOf(loose).map(({ word }) => [word]));
    } else if (loose !== undefined) {
      words.push(...wordsOf(loose));
      open = /[\p{L}\p{N}\p{M}]$/u.test(loose);
    }
  }
  const ended = /\s$/u.test(query) || words.length > mostWords;
  return {
    words: words.slice(0, mostWords),
    phrases: phrases.slice(0, mostWords),
    excluded: excluded.slice(0, mostWords),
    open: open && !ended,
  };
}
