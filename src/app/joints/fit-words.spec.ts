import { figure } from '../../../shared/fit/dimension';
import { chanceWords, figureText, percent } from './fit-words';

const silent = {
  contradicts: false,
  interval: null,
  chance: null,
  predicted: null,
  sat: 0,
  didNotSit: 0,
};

describe('a chance in words', () => {
  it('tells prior, counts and what they come to', () => {
    expect(
      chanceWords({
        ...silent,
        predicted: 0.03,
        sat: 4,
        didNotSit: 1,
        chance: 0.61,
        interval: [0.3, 0.85],
      }),
    ).toBe('predicted 3 %, 4 say it sat, 1 says not → 61 % (30 to 85 %)');
  });

  it('says so where nobody has reported or predicted', () => {
    expect(
      chanceWords({
        ...silent,
        predicted: 0.5,
        chance: 0.5,
        interval: [0.1, 0.9],
      }),
    ).toBe('predicted 50 %, no reports yet');
    expect(chanceWords(silent)).toBe('no prediction, no reports');
    expect(chanceWords({ ...silent, predicted: 1, sat: 2, chance: 1, interval: [0.999, 1] })).toBe(
      'predicted over 99 %, 2 say it sat → over 99 %',
    );
    expect(
      chanceWords({
        ...silent,
        didNotSit: 1,
        chance: 0.33,
        interval: [0.05, 0.7],
      }),
    ).toBe('no prediction, 1 says it did not → 33 % (5 to 70 %)');
  });

  it('never rounds to certainty', () => {
    expect([0, 0.004, 0.996, 1].map(percent)).toEqual(['under 1 %', 'under 1 %', 'over 99 %', 'over 99 %']);
  });
});

describe('a figure', () => {
  it('stands with its interval in the unit wished, to the digits its uncertainty allows', () => {
    expect(figureText(figure(-3, 0.05), 'mm')).toBe('−3.00 mm (−3.10 to −2.90)');
    expect(figureText(figure(2.54, 0.01), 'in')).toBe('0.1000 in (0.0992 to 0.1008)');
    expect(figureText(figure(-0.001, 0), 'mm')).toBe('0.00 mm');
  });
});
