import type { Lexicon } from '../lexicon/lexicon.js';
import { stem } from '../lexicon/stem.js';
import { plain, wordsOf, type Word } from '../lexicon/words.js';
import type { IndexSettings } from '../settings/settings.js';
import { queryWords } from './query-words.js';

/** Stems that follow each other in a text; the last may be only the beginning of a word. */
export interface Phrase {
  readonly stems: readonly string[];
  readonly prefix: boolean;
}

/** One typed word with all that may stand for it in a document. */
export interface Term {
  readonly word: string;
  /** The word in any of its forms, its synonyms, words it begins. */
  readonly exact: readonly Phrase[];
  /** Words with typos, the word in two parts, or joined with its neighbours. */
  readonly loose: readonly Phrase[];
  /** About how many documents hold it; 0 where none does. */
  readonly frequency: number;
}

export interface QueryPlan {
  readonly terms: readonly Term[];
  readonly phrases: readonly Phrase[];
  readonly excluded: readonly Phrase[];
  /** Whether there is nothing to search for, so that every document is a hit. */
  readonly isPlaceholder: boolean;
}

const longestGroup = 3;
const mostLongerWords = 40;

/** Finds what may stand for each typed word, by the words that the index holds. */
export function planQuery(query: string, settings: IndexSettings, lexicon: Lexicon): QueryPlan {
  const { words: typed, phrases, excluded, open } = queryWords(query);
  const stopWords = new Set(settings.stopWords.map(plain));
  const meant = typed.filter(({ word }) => !stopWords.has(word));
  const words = meant.length > 0 ? meant : typed;
  const last = words.at(-1);
  const mayGoOn = open && settings.prefixSearch !== 'disabled' && last === typed.at(-1);
  const synonyms = synonymsByKey(settings);
  const joined = joinedWords(words, lexicon);
  const alike = words.map((_word, at) => groupsAt(words, at, synonyms));
  const terms = words.map((word, at) =>
    termOf(word, {
      lexicon,
      settings,
      open: mayGoOn && word === last,
      synonyms: alike[at] ?? [],
      joined: joined[at] ?? [],
    }),
  );
  return {
    terms,
    phrases: phrases.map(phraseOf),
    excluded: excluded.map(phraseOf),
    isPlaceholder: terms.length === 0 && phrases.length === 0,
  };
}

export const phraseOf = (words: readonly string[]): Phrase => ({ stems: words.map(stem), prefix: false });

interface TermSurroundings {
  readonly lexicon: Lexicon;
  readonly settings: IndexSettings;
  readonly open: boolean;
  readonly synonyms: readonly (readonly string[])[];
  readonly joined: readonly string[];
}

function termOf({ word, parts }: Word, around: TermSurroundings): Term {
  const { lexicon, open } = around;
  const root = stem(word);
  const longer = open ? lexicon.startingWith(word, mostLongerWords) : [];
  const exact: Phrase[] = [phraseOf([word])];
  if (open) exact.push({ stems: [word], prefix: true });
  for (const other of longer)
    if (!stem(other).startsWith(word) && stem(other) !== root) exact.push(phraseOf([other]));
  for (const synonym of around.synonyms) exact.push(phraseOf(synonym));

  const loose: Phrase[] = [];
  if (parts.length > 1) loose.push(phraseOf(parts));
  for (const other of around.joined) loose.push(phraseOf([other]));
  const halves = splitWord(word, lexicon);
  if (halves) loose.push(phraseOf(halves));
  const alike = lookAlikes(word, around, longer.length > 0);
  for (const other of alike) loose.push(phraseOf([other]));

  const standIns = [
    word,
    ...longer,
    ...around.joined,
    ...alike,
    ...around.synonyms.map(([first = '']) => first),
  ];
  const counted = standIns.reduce((sum, each) => sum + lexicon.frequency(each), 0);
  const isKnown =
    counted > 0 || lexicon.knows(word) || halves !== undefined || parts.some((part) => lexicon.knows(part));
  return {
    word,
    exact: distinct(exact),
    loose: distinct(loose, exact),
    frequency: isKnown ? Math.max(counted, 1) : 0,
  };
}

/** Words with one or two letters off, as the length of the word allows. Figures are never guessed at. */
function lookAlikes(
  word: string,
  { lexicon, settings, open }: TermSurroundings,
  hasLonger: boolean,
): string[] {
  const { enabled, disableOnWords, minWordSizeForTypos } = settings.typoTolerance;
  if (!enabled || /\d/.test(word) || disableOnWords.some((each) => plain(each) === word)) return [];
  const letters = Array.from(word).length;
  const allowed =
    letters >= minWordSizeForTypos.twoTypos ? 2 : letters >= minWordSizeForTypos.oneTypo ? 1 : 0;
  if (allowed === 0) return [];
  const found = lexicon.lookAlikes(word, allowed).map((each) => each.word);
  if (found.length > 0 || hasLonger || !open || lexicon.knows(word)) return found;
  return lexicon.lookAlikePrefixes(word).map((each) => each.word);
}

/** The two known words that make up the word, the pair with the commonest rarer half. */
function splitWord(word: string, lexicon: Lexicon): [string, string] | undefined {
  if (/\d/.test(word) || word.length > 40) return undefined;
  let best: [string, string] | undefined;
  let most = 0;
  for (let at = 2; at <= word.length - 2; at++) {
    const halves: [string, string] = [word.slice(0, at), word.slice(at)];
    const frequency = Math.min(lexicon.frequency(halves[0]), lexicon.frequency(halves[1]));
    if (frequency > most) [best, most] = [halves, frequency];
  }
  return best;
}

/** For each place the known words that two or three neighbours make when written as one. */
function joinedWords(words: readonly Word[], lexicon: Lexicon): string[][] {
  const joined = words.map(() => [] as string[]);
  for (let size = 2; size <= longestGroup; size++) {
    for (let at = 0; at + size <= words.length; at++) {
      const whole = words
        .slice(at, at + size)
        .map(({ word }) => word)
        .join('');
      if (lexicon.frequency(whole) > 0)
        for (let place = at; place < at + size; place++) joined[place]?.push(whole);
    }
  }
  return joined;
}

type Synonyms = ReadonlyMap<string, readonly (readonly string[])[]>;

function synonymsByKey(settings: IndexSettings): Synonyms {
  const words = (text: string) => wordsOf(text).map(({ word }) => word);
  const entries = Object.entries(settings.synonyms).map(
    ([key, others]) => [words(key).join(' '), others.map(words).filter((list) => list.length > 0)] as const,
  );
  return new Map(entries);
}

/** Synonyms of every group of neighbours that takes in the word at the place. */
function groupsAt(words: readonly Word[], at: number, synonyms: Synonyms): string[][] {
  if (synonyms.size === 0) return [];
  const found: string[][] = [];
  for (let size = 1; size <= longestGroup; size++) {
    for (let start = Math.max(0, at - size + 1); start <= at && start + size <= words.length; start++) {
      const key = words
        .slice(start, start + size)
        .map(({ word }) => word)
        .join(' ');
      for (const other of synonyms.get(key) ?? []) found.push([...other]);
    }
  }
  return found;
}

const keyOf = (phrase: Phrase) => `${phrase.stems.join(' ')}${phrase.prefix ? '*' : ''}`;

/** Without repetitions, and without what `known` already has. */
export function distinct(phrases: readonly Phrase[], known: readonly Phrase[] = []): Phrase[] {
  const seen = new Set(known.map(keyOf));
  return phrases.filter((phrase) => {
    const key = keyOf(phrase);
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}
