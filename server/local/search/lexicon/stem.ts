const vowelPattern = /[aeiou]/;

/** Whether the letter at `at` is a consonant by Porter's rule (y is one after a vowel or at the start). */
function isConsonant(word: string, at: number): boolean {
  const letter = word[at] ?? '';
  if (vowelPattern.test(letter)) return false;
  return letter !== 'y' || at === 0 || !isConsonant(word, at - 1);
}

const shape = (word: string): string =>
  Array.from(word, (_letter, at) => (isConsonant(word, at) ? 'c' : 'v')).join('');

/** Number of vowel-consonant turns: m in Porter's paper. */
const measure = (word: string): number =>
  (
    shape(word)
      .replace(/(.)\1+/g, '$1')
      .match(/vc/g) ?? []
  ).length;
const hasVowel = (word: string): boolean => shape(word).includes('v');
const endsDouble = (word: string): boolean => /([^aeiouy])\1$/.test(word);
const endsShort = (word: string): boolean => shape(word).endsWith('cvc') && !/[wxy]$/.test(word);

type Rule = readonly [suffix: string, replacement: string];

const step2: readonly Rule[] = [
  ['ational', 'ate'],
  ['tional', 'tion'],
  ['enci', 'ence'],
  ['anci', 'ance'],
  ['izer', 'ize'],
  ['bli', 'ble'],
  ['alli', 'al'],
  ['entli', 'ent'],
  ['eli', 'e'],
  ['ousli', 'ous'],
  ['ization', 'ize'],
  ['ation', 'ate'],
  ['ator', 'ate'],
  ['alism', 'al'],
  ['iveness', 'ive'],
  ['fulness', 'ful'],
  ['ousness', 'ous'],
  ['aliti', 'al'],
  ['iviti', 'ive'],
  ['biliti', 'ble'],
  ['logi', 'log'],
];
const step3: readonly Rule[] = [
  ['icate', 'ic'],
  ['ative', ''],
  ['alize', 'al'],
  ['iciti', 'ic'],
  ['ical', 'ic'],
  ['ful', ''],
  ['ness', ''],
];
const step4: readonly string[] = [
  'ement',
  'ance',
  'ence',
  'able',
  'ible',
  'ment',
  'ant',
  'ent',
  'ism',
  'ate',
  'iti',
  'ous',
  'ive',
  'ize',
  'ion',
  'al',
  'er',
  'ic',
  'ou',
];

function replaceSuffix(word: string, rules: readonly Rule[]): string {
  const rule = rules.find(([suffix]) => word.endsWith(suffix));
  if (!rule) return word;
  const root = word.slice(0, -rule[0].length);
  return measure(root) > 0 ? root + rule[1] : word;
}

function withoutPlural(word: string): string {
  if (word.endsWith('sses') || word.endsWith('ies')) return word.slice(0, -2);
  return word.endsWith('s') && !word.endsWith('ss') ? word.slice(0, -1) : word;
}

function withoutPast(word: string): string {
  if (word.endsWith('eed')) return measure(word.slice(0, -3)) > 0 ? word.slice(0, -1) : word;
  const suffix = ['ed', 'ing'].find(
    (ending) => word.endsWith(ending) && hasVowel(word.slice(0, -ending.length)),
  );
  if (!suffix) return word;
  const root = word.slice(0, -suffix.length);
  if (/(?:at|bl|iz)$/.test(root)) return `${root}e`;
  if (endsDouble(root) && !/[lsz]$/.test(root)) return root.slice(0, -1);
  return measure(root) === 1 && endsShort(root) ? `${root}e` : root;
}

function withoutLongSuffix(word: string): string {
  const suffix = step4.find((ending) => word.endsWith(ending));
  if (!suffix) return word;
  const root = word.slice(0, -suffix.length);
  if (suffix === 'ion' && !/[st]$/.test(root)) return word;
  return measure(root) > 1 ? root : word;
}

function tidied(word: string): string {
  let root = word;
  if (root.endsWith('e')) {
    const short = root.slice(0, -1);
    if (measure(short) > 1 || (measure(short) === 1 && !endsShort(short))) root = short;
  }
  return root.endsWith('ll') && measure(root) > 1 ? root.slice(0, -1) : root;
}

const keptStems = 200_000;
const stems = new Map<string, string>();

/**
 * Stem of an English word in lower case (Porter, "An algorithm for suffix stripping", 1980, with the author's
 * later amendments "bli" and "logi"). Words with anything but a-z, and those under three letters, stay as they are.
 */
export function stem(word: string): string {
  if (word.length < 3 || word.length > 40 || !/^[a-z]+$/.test(word)) return word;
  const kept = stems.get(word);
  if (kept !== undefined) return kept;
  let root = withoutPast(withoutPlural(word));
  if (root.endsWith('y') && hasVowel(root.slice(0, -1))) root = `${root.slice(0, -1)}i`;
  root = tidied(withoutLongSuffix(replaceSuffix(replaceSuffix(root, step2), step3)));
  if (stems.size >= keptStems) stems.clear();
  stems.set(word, root);
  return root;
}
