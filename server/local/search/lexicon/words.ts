/** One word of a text with its place (UTF-16 offsets) and the smaller words it is made of, if any. */
export interface Word {
  readonly start: number;
  readonly end: number;
  /** Lower case, without accents and apostrophes: "Won't" is "wont", "M48×0.75" is "m48x0.75". */
  readonly word: string;
  /** "m48x0.75" holds "m48" and "0.75"; empty for plain words. */
  readonly parts: readonly string[];
}

const chunk = /[\p{L}\p{N}\p{M}]+(?:['’.\-×][\p{L}\p{N}\p{M}]+)*/gu;
const plainWord = /[\p{L}\p{M}\p{N}]+(?:['’][\p{L}\p{M}]+)*/gu;
const numberWithUnit = /^(\d+(?:\.\d+)?)([^\d.-]+)$/;

const plainLetters = /^[a-z]+$/;

/** Words of a text in order. Numbers with decimals and names such as "608-2RS" stay whole. */
export function wordsOf(text: string): Word[] {
  const words: Word[] = [];
  for (const match of text.matchAll(chunk)) {
    const [raw] = match;
    const lower = raw.toLowerCase();
    if (plainLetters.test(lower))
      words.push({ start: match.index, end: match.index + raw.length, word: lower, parts: [] });
    else if (/\d/.test(raw)) words.push(...numberWords(raw, match.index));
    else words.push(...plainWords(raw, match.index));
  }
  return words;
}

/** Lower case, compatibility forms folded, accents and apostrophes taken off. */
export function plain(text: string): string {
  return text
    .normalize('NFKD')
    .replace(/[\p{M}'’]/gu, '')
    .replaceAll('×', 'x')
    .toLowerCase();
}

function plainWords(raw: string, offset: number): Word[] {
  return [...raw.matchAll(plainWord)].flatMap((match) => {
    const start = offset + match.index;
    const word = plain(match[0]);
    return word === '' ? [] : [{ start, end: start + match[0].length, word, parts: [] }];
  });
}

function numberWords(raw: string, offset: number): Word[] {
  const whole = plain(raw);
  const end = offset + raw.length;
  const unit = numberWithUnit.exec(raw);
  if (unit) {
    const [, figure = '', letters = ''] = unit;
    const middle = offset + figure.length;
    const unitWord = plain(letters);
    const number = { start: offset, end: middle, word: plain(figure), parts: [] };
    return unitWord === '' ? [number] : [number, { start: middle, end, word: unitWord, parts: [] }];
  }
  const parts = whole
    .split(/-|(?<=\d)x(?=\d)|(?<!\d)\.|\.(?!\d)/)
    .filter((part) => part !== '' && part !== whole);
  return whole === '' ? [] : [{ start: offset, end, word: whole, parts }];
}
