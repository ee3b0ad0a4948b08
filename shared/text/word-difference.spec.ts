import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { wordDifference } from './word-difference.js';

const joined = (pieces: ReturnType<typeof wordDifference>, left: 'removed' | 'added'): string =>
  pieces
    .filter((piece) => piece.kind !== left)
    .map((piece) => piece.text)
    .join('');

describe('word difference', () => {
  it('tells one changed word apart from the words and spaces around it', () => {
    expect(wordDifference('The lip is 22.5 mm wide.', 'The lip is 22.1 mm wide.')).toEqual([
      { kind: 'same', text: 'The lip is ' },
      { kind: 'removed', text: '22.5' },
      { kind: 'added', text: '22.1' },
      { kind: 'same', text: ' mm wide.' },
    ]);
  });

  it('gives one piece for equal texts and none for two empty ones', () => {
    expect(wordDifference('as it was', 'as it was')).toEqual([{ kind: 'same', text: 'as it was' }]);
    expect(wordDifference('', '')).toEqual([]);
  });

  it('gives a text that is new or gone as one piece', () => {
    expect(wordDifference('', 'two words')).toEqual([{ kind: 'added', text: 'two words' }]);
    expect(wordDifference('two words', '')).toEqual([{ kind: 'removed', text: 'two words' }]);
  });

  it('loses no character and no white space of either text, whatever they are', () => {
    const text = fc.array(
      fc.constantFrom('lip', 'recess', ' ', '  ', '\n', '\t', '22.5', 'ü', '𝛿', '.', '-'),
      { maxLength: 40 },
    );
    fc.assert(
      fc.property(text, text, (from, to) => {
        const pieces = wordDifference(from.join(''), to.join(''));
        expect(joined(pieces, 'added')).toBe(from.join(''));
        expect(joined(pieces, 'removed')).toBe(to.join(''));
      }),
    );
  });

  it('counts a text with more changes than it may look for as written anew', () => {
    const words = (stem: string): string =>
      Array.from({ length: 2500 }, (_, index) => `${stem}${index}`).join(' ');
    const pieces = wordDifference(words('a'), words('b'));
    expect(pieces).toEqual([
      { kind: 'removed', text: words('a') },
      { kind: 'added', text: words('b') },
    ]);
  });
});
