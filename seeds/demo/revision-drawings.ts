import { bracketView, motorView } from '../drawing/revision-views.js';

export interface RevisionDrawing {
  readonly part: string;
  readonly letter: string;
  readonly caption: string;
  readonly alt: string;
  readonly svg: string;
}

const motor = { plug: 'side', stripe: false, shaftFlat: false } as const;
const bracket = { ribs: false } as const;

/** What tells the revisions of the parts that are mixed up most from each other, one drawing each. */
export const demoRevisionDrawings: readonly RevisionDrawing[] = [
  {
    part: 'tarn-m1',
    letter: 'A',
    caption: 'Blue stripe without a letter, wide recess, plug at the rear.',
    alt: 'M1 Rev A: a recess of 23.0 mm round the shaft; on the label a blue stripe and no letter; the plug at the rear.',
    svg: motorView({ ...motor, title: 'M1 REV A', recess: 23, stripe: true, plug: 'rear' }),
  },
  {
    part: 'tarn-m1',
    letter: 'B',
    caption: 'Blue stripe and letter B, wide recess, plug at the side.',
    alt: 'M1 Rev B: a recess of 23.0 mm round the shaft; on the label a blue stripe and the letter B; the plug at the side.',
    svg: motorView({ ...motor, title: 'M1 REV B', recess: 23, stripe: true, letter: 'B' }),
  },
  {
    part: 'tarn-m1',
    letter: 'C',
    caption: 'Letter C without a stripe, narrow recess, round shaft.',
    alt: 'M1 Rev C: a narrower recess of 19.5 mm round a round shaft; on the label the letter C and no stripe.',
    svg: motorView({ ...motor, title: 'M1 REV C', recess: 19.5, letter: 'C' }),
  },
  {
    part: 'tarn-m1',
    letter: 'D',
    caption: 'Letter D and a square dot, narrow recess, a flat on the shaft.',
    alt: 'M1 Rev D: a recess of 19.5 mm round a shaft with a flat; on the label the letter D and a square dot.',
    svg: motorView({
      ...motor,
      title: 'M1 REV D',
      recess: 19.5,
      letter: 'D',
      squareDot: true,
      shaftFlat: true,
    }),
  },
  {
    part: 'stonebridge-belt-bracket',
    letter: 'A',
    caption: 'One dot underneath; the low lip, 1.2 mm.',
    alt: 'Belt bracket Rev A from underneath with one dot; its lip is 22.5 mm wide and 1.2 mm high.',
    svg: bracketView({ ...bracket, title: 'BELT BRACKET REV A', dots: 1, lip: 22.5, lipHeight: 1.2 }),
  },
  {
    part: 'stonebridge-belt-bracket',
    letter: 'B',
    caption: 'Two dots underneath; the high lip, 1.7 mm.',
    alt: 'Belt bracket Rev B from underneath with two dots; its lip is 22.5 mm wide and 1.7 mm high.',
    svg: bracketView({ ...bracket, title: 'BELT BRACKET REV B', dots: 2, lip: 22.5, lipHeight: 1.7 }),
  },
  {
    part: 'stonebridge-belt-bracket',
    letter: 'C',
    caption: 'Three dots and ribs along the arm; the wide lip.',
    alt: 'Belt bracket Rev C from underneath with three dots and two ribs; its lip is 22.5 mm wide and 1.7 mm high.',
    svg: bracketView({
      ...bracket,
      title: 'BELT BRACKET REV C',
      dots: 3,
      lip: 22.5,
      lipHeight: 1.7,
      ribs: true,
    }),
  },
  {
    part: 'stonebridge-belt-bracket',
    letter: 'D',
    caption: 'Four dots and ribs along the arm; the narrow lip, Ø 19.2.',
    alt: 'Belt bracket Rev D from underneath with four dots and two ribs; its lip is 19.2 mm wide and 1.7 mm high.',
    svg: bracketView({
      ...bracket,
      title: 'BELT BRACKET REV D',
      dots: 4,
      lip: 19.2,
      lipHeight: 1.7,
      ribs: true,
    }),
  },
];
