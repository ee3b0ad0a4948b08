/**
 * Single-stroke capitals on a grid 4 wide and 6 high (baseline at y = 6), in the manner of drawing-office lettering.
 * Drawn as paths, so that a sheet looks the same on a machine that has no fonts at all.
 */
const glyphs: Record<string, readonly [path: string, width: number]> = {
  A: ['M0 6L2 0L4 6M.7 4H3.3', 4],
  B: ['M0 0V6H2.5Q4 6 4 4.5Q4 3 2.5 3H0M2.5 3Q3.7 3 3.7 1.5Q3.7 0 2.3 0H0', 4],
  C: ['M4 1.2Q3.5 0 2 0Q0 0 0 3Q0 6 2 6Q3.5 6 4 4.8', 4],
  D: ['M0 0V6H1.8Q4 6 4 3Q4 0 1.8 0Z', 4],
  E: ['M3.6 0H0V6H3.6M0 3H2.8', 3.6],
  F: ['M3.6 0H0V6M0 3H2.8', 3.6],
  G: ['M4 1.2Q3.5 0 2 0Q0 0 0 3Q0 6 2 6Q4 6 4 3.4H2.4', 4],
  H: ['M0 0V6M4 0V6M0 3H4', 4],
  I: ['M.5 0V6', 1],
  J: ['M3 0V4.5Q3 6 1.5 6Q0 6 0 4.5', 3],
  K: ['M0 0V6M4 0L0 3.6M1.4 2.5L4 6', 4],
  L: ['M0 0V6H3.4', 3.4],
  M: ['M0 6V0L2.3 4L4.6 0V6', 4.6],
  N: ['M0 6V0L4 6V0', 4],
  O: ['M2 0Q0 0 0 3Q0 6 2 6Q4 6 4 3Q4 0 2 0Z', 4],
  P: ['M0 6V0H2.3Q4 0 4 1.6Q4 3.2 2.3 3.2H0', 4],
  Q: ['M2 0Q0 0 0 3Q0 6 2 6Q4 6 4 3Q4 0 2 0ZM2.5 4.3L4.2 6.4', 4],
  R: ['M0 6V0H2.3Q4 0 4 1.6Q4 3.2 2.3 3.2H0M2 3.2L4 6', 4],
  S: ['M3.8 1Q3.3 0 2 0Q.2 0 .2 1.5Q.2 2.7 2 3Q4 3.4 4 4.6Q4 6 2 6Q.5 6 0 4.9', 4],
  T: ['M0 0H4M2 0V6', 4],
  U: ['M0 0V4Q0 6 2 6Q4 6 4 4V0', 4],
  V: ['M0 0L2 6L4 0', 4],
  W: ['M0 0L1.3 6L2.6 1.5L3.9 6L5.2 0', 5.2],
  X: ['M0 0L4 6M4 0L0 6', 4],
  Y: ['M0 0L2 3L4 0M2 3V6', 4],
  Z: ['M0 0H4L0 6H4', 4],
  '0': ['M2 0Q0 0 0 3Q0 6 2 6Q4 6 4 3Q4 0 2 0Z', 4],
  '1': ['M.6 1.2L2 0V6', 3],
  '2': ['M.2 1.3Q.5 0 2 0Q3.8 0 3.8 1.6Q3.8 2.6 2.8 3.6L0 6H4', 4],
  '3': ['M.2 .9Q.8 0 2 0Q3.7 0 3.7 1.5Q3.7 2.9 1.8 2.9Q4 2.9 4 4.5Q4 6 2 6Q.4 6 0 4.9', 4],
  '4': ['M3 6V0L0 4.2H4', 4],
  '5': ['M3.7 0H.6L.3 2.7Q1 2.2 2 2.2Q4 2.2 4 4.1Q4 6 2 6Q.5 6 0 5', 4],
  '6': ['M3.5 .5Q2.9 0 2.2 0Q0 0 0 3.6Q0 6 2 6Q4 6 4 4.1Q4 2.4 2.1 2.4Q.5 2.4 0 3.8', 4],
  '7': ['M0 0H4L1.4 6', 4],
  '8': [
    'M2 2.8Q.4 2.8 .4 1.4Q.4 0 2 0Q3.6 0 3.6 1.4Q3.6 2.8 2 2.8Q0 2.8 0 4.4Q0 6 2 6Q4 6 4 4.4Q4 2.8 2 2.8Z',
    4,
  ],
  '9': ['M.5 5.5Q1.1 6 1.8 6Q4 6 4 2.4Q4 0 2 0Q0 0 0 1.9Q0 3.6 1.9 3.6Q3.5 3.6 4 2.2', 4],
  '.': ['M.4 5.7V6', 1],
  ',': ['M.7 5.5L.2 6.8', 1],
  ':': ['M.4 2.1V2.4M.4 5.6V5.9', 1],
  '-': ['M.3 3.2H2.5', 2.8],
  '–': ['M.2 3.2H3.6', 3.8],
  '/': ['M0 6.4L3 -.3', 3],
  '(': ['M1.4 -.6Q0 1 0 3Q0 5 1.4 6.6', 1.5],
  ')': ['M0 -.6Q1.4 1 1.4 3Q1.4 5 0 6.6', 1.5],
  '+': ['M0 3.2H3.4M1.7 1.5V4.9', 3.4],
  '±': ['M0 2.4H3.4M1.7 .7V4.1M0 5.8H3.4', 3.4],
  '×': ['M.3 2L3.3 5M3.3 2L.3 5', 3.6],
  '=': ['M0 2.2H3.4M0 4.2H3.4', 3.4],
  '<': ['M3.2 1L0 3.2L3.2 5.4', 3.2],
  '>': ['M0 1L3.2 3.2L0 5.4', 3.2],
  Ø: ['M2 0Q0 0 0 3Q0 6 2 6Q4 6 4 3Q4 0 2 0ZM-.2 6.5L4.2 -.5', 4],
  '°': ['M.9 0Q0 0 0 .9Q0 1.8 .9 1.8Q1.8 1.8 1.8 .9Q1.8 0 .9 0Z', 2],
  m: ['M0 6V2.4M0 3.4Q.4 2.3 1.3 2.3Q2.3 2.3 2.3 3.4V6M2.3 3.4Q2.7 2.3 3.6 2.3Q4.6 2.3 4.6 3.4V6', 4.6],
  µ: ['M0 2V7.6M0 2V4.6Q0 6 1.6 6Q3.2 6 3.2 4.4V2M3.2 4.4Q3.2 6 3.8 6', 4],
  '′': ['M.8 0L.3 1.8', 1],
  "'": ['M.6 0V1.6', 1],
  '%': [
    'M0 6L4 0M.9 0Q0 0 0 1Q0 2 .9 2Q1.8 2 1.8 1Q1.8 0 .9 0ZM3.1 4Q2.2 4 2.2 5Q2.2 6 3.1 6Q4 6 4 5Q4 4 3.1 4Z',
    4,
  ],
  '&': ['M4 6L.8 1.6Q.4 0 1.7 0Q3 0 2.6 1.5L.6 3.3Q-.4 4.6 .5 5.5Q2 6.8 4 3.4', 4],
  '·': ['M.4 3.1V3.4', 1],
  '“': ['M.6 0L.3 1.6M1.8 0L1.5 1.6', 2.2],
  '”': ['M.6 0L.3 1.6M1.8 0L1.5 1.6', 2.2],
  '?': ['M.2 1.3Q.5 0 2 0Q3.8 0 3.8 1.6Q3.8 2.6 2 3.6V4.4M2 5.7V6', 4],
};
const gap = 1.5;
const space = 2.6;

/** Width in grid units of a line of lettering. */
function gridWidth(text: string): number {
  let width = 0;
  for (const letter of text) width += letter === ' ' ? space : glyph(letter)[1] + gap;
  return Math.max(0, width - gap);
}

function glyph(letter: string): readonly [string, number] {
  const found = glyphs[letter] ?? glyphs[letter.toUpperCase()];
  if (!found) throw new Error(`The lettering has no “${letter}”.`);
  return found;
}

/** Width in pixels of `text` at a capital height of `height` pixels. */
export const letteringWidth = (text: string, height: number): number => (gridWidth(text) * height) / 6;

/** How a line of lettering stands: its anchor point is on the baseline. */
export interface LetteringStyle {
  readonly height?: number;
  readonly colour: string;
  readonly anchor?: 'start' | 'middle' | 'end';
  /** Degrees, clockwise; -90 reads from below, as on a vertical dimension line. */
  readonly turn?: number;
}

/** A line of lettering as SVG. Throws for a letter that the table lacks, so that no sheet is published with a hole in it. */
export function lettering(x: number, y: number, text: string, style: LetteringStyle): string {
  const height = style.height ?? 12;
  const scale = height / 6;
  const width = gridWidth(text);
  let at = style.anchor === 'middle' ? -width / 2 : style.anchor === 'end' ? -width : 0;
  const paths: string[] = [];
  for (const letter of text) {
    if (letter !== ' ') {
      const [path, advance] = glyph(letter);
      paths.push(`<path transform="translate(${round(at)} -6)" d="${path}"/>`);
      at += advance + gap;
    } else at += space;
  }
  return (
    `<g transform="translate(${round(x)} ${round(y)}) rotate(${style.turn ?? 0}) scale(${round(scale)})" fill="none" ` +
    `stroke="${style.colour}" stroke-width="${round(1.5 / scale)}" stroke-linecap="round" stroke-linejoin="round">${paths.join('')}</g>`
  );
}

const round = (value: number): number => Math.round(value * 1000) / 1000;
