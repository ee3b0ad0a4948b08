import { describe, expect, test } from 'vitest';
import { plainFiguresOf, withPlainFigures, wordsOfReading } from './measurement-words.js';

describe('figures in a question', () => {
  test.each([
    ['22.5 lip 19.5 recess', '22.5 lip 19.5 recess'],
    ['ø22,50mm lip', '22.5 mm lip'],
    ['22.00 mm', '22 mm'],
    ['lip 22.', 'lip 22'],
    ['0.886" hub', '0.886 in hub'],
    ['0.2° tilt', '0.2 deg tilt'],
    ['M48x0.75 thread', 'M48x0.75 thread'],
    ['100 steps', '100 steps'],
    ['1000 steps', '1000 steps'],
    ['wobbles in the cold', 'wobbles in the cold'],
    ['8inserts', '8inserts'],
  ])('when somebody writes "%s", then "%s" is looked for', (written, looked) => {
    expect(withPlainFigures(written)).toBe(looked);
  });
});

test('when a text has figures in another form than they are looked for, then only those are added', () => {
  expect(plainFiguresOf('The lip is 22.50 mm, the recess 19.5 mm, the plate 3,2mm.')).toEqual([
    '22.5 mm',
    '3.2 mm',
  ]);
});

test('when a reading is a length, then it is found in millimetres and in inches', () => {
  expect(wordsOfReading({ dimension: 'lip diameter', value: 22.5, unit: 'mm' })).toBe(
    'lip diameter 22.5 mm 0.886 in',
  );
  expect(wordsOfReading({ dimension: 'hub', value: 0.886, unit: 'in' })).toBe('hub 0.886 in 22.5 mm');
  expect(wordsOfReading({ dimension: 'tilt', value: 0.4, unit: 'deg' })).toBe('tilt 0.4 deg');
  expect(wordsOfReading({ dimension: 'not read yet', value: null, unit: 'mm' })).toBe('not read yet');
});
