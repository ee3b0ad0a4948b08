/** Words that InnoDB's full-text index leaves out (information_schema.INNODB_FT_DEFAULT_STOPWORD). */
const leftOut = new Set(
  'a about an are as at be by com de en for from how i in is it la of on or that the this to was what when where who will with und the www'.split(
    ' ',
  ),
);
const shortestIndexed = 3;
const most = 12;

export interface SearchedWords {
  /** Words that the index holds, in its boolean syntax: each must stand or begin a word. Empty where there are none. */
  readonly indexed: string;
  /** What the index does not hold, such as "M1" or "22.5"; to be looked for in the text itself. */
  readonly others: readonly string[];
}

/** The words of a search as MariaDB's full-text index can look for them; nothing of them is syntax. At most twelve count. */
export function searchedWords(typed: string): SearchedWords {
  const words = wordsOf(typed).slice(0, most);
  const isIndexed = (word: string): boolean =>
    /^[\p{L}\p{N}]+$/u.test(word) && word.length >= shortestIndexed && !leftOut.has(word);
  return {
    indexed: words
      .filter(isIndexed)
      .map((word) => `+${word}*`)
      .join(' '),
    others: words.filter((word) => !isIndexed(word) && !leftOut.has(word)),
  };
}

function wordsOf(typed: string): string[] {
  const words = typed
    .toLowerCase()
    .split(/\s+/)
    .map((word) => word.replace(/^[^\p{L}\p{N}]+|[^\p{L}\p{N}]+$/gu, ''))
    .filter((word) => word !== '');
  return [...new Set(words)];
}
