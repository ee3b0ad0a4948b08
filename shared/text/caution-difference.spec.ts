import { describe, expect, it } from 'vitest';
import { cautionDifference } from './caution-difference.js';

const words = {
  name: 'Blade',
  signalWord: 'caution' as const,
  hazards: ['blade' as const],
  hazard: 'A blade that slips.',
  consequence: 'Could cut hands.',
  avoidance: 'Cut away from yourself.',
};

describe('two versions of a caution', () => {
  it('differ in nothing when they say the same', () => {
    expect(cautionDifference(words, { ...words })).toEqual([]);
  });

  it('are told apart field by field, word by word', () => {
    expect(
      cautionDifference(words, { ...words, signalWord: 'warning', consequence: 'Could cut eyes.' }),
    ).toEqual([
      {
        field: 'signalWord',
        label: 'Signal word',
        pieces: [
          { kind: 'removed', text: 'caution' },
          { kind: 'added', text: 'warning' },
        ],
      },
      {
        field: 'consequence',
        label: 'What can happen',
        pieces: [
          { kind: 'same', text: 'Could cut ' },
          { kind: 'removed', text: 'hands' },
          { kind: 'added', text: 'eyes' },
          { kind: 'same', text: '.' },
        ],
      },
    ]);
  });

  it('tell the hazards they answer by their words', () => {
    const [difference] = cautionDifference(words, { ...words, hazards: ['blade', 'dust'] });
    expect(difference?.label).toBe('What it answers');
    expect(difference?.pieces.map((piece) => piece.text).join('')).toBe('blade\ndust');
  });
});
