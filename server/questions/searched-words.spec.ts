import { describe, expect, it } from 'vitest';
import { searchedWords } from './searched-words.js';

describe('the words of a search through questions', () => {
  it.each([
    ['Bracket rocks', '+bracket* +rocks*', []],
    ['the lip', '+lip*', []],
    ['M1 lip 22.5', '+lip*', ['m1', '22.5']],
    ['"lip" +recess -(boss)* @3', '+lip* +recess* +boss*', ['3']],
    ['lip LIP lip', '+lip*', []],
    ['clamp-screw', '', ['clamp-screw']],
    ['the of !!', '', []],
    ['Почему качается', '+почему* +качается*', []],
  ])('of “%s” are looked for without any syntax of their own', (typed, indexed, others) => {
    expect(searchedWords(typed)).toEqual({ indexed, others });
  });

  it('are at most twelve', () => {
    const typed = Array.from({ length: 40 }, (_, index) => `word${index}`).join(' ');
    expect(searchedWords(typed).indexed.split(' ')).toHaveLength(12);
  });
});
