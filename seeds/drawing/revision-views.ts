import { figure } from './geometry.js';
import { Sheet, ink, type Point } from './sheet.js';

const subtitle = 'WHAT TO LOOK AT · DIMENSIONS IN mm';

export interface MotorView {
  readonly title: string;
  /** Diameter of the recess round the shaft, mm. */
  readonly recess: number;
  /** On the label. */
  readonly stripe: boolean;
  readonly letter?: string;
  readonly squareDot?: boolean;
  readonly plug: 'rear' | 'side';
  readonly shaftFlat: boolean;
}

/** A focus motor from the front and from the side with its label. Body 42 mm, shaft 5 mm. */
export function motorView(view: MotorView): string {
  const sheet = new Sheet(view.title, subtitle);
  const scale = 220 / 42;
  const front: Point = [270, 280];
  const recess = (view.recess / 2) * scale;
  const shaft = 2.5 * scale;
  sheet
    .box(front[0] - 110, front[1] - 110, 220, 220, 'none')
    .circle(front, recess, 'brass', 'shim')
    .circle(front, shaft, 'outline', 'none')
    .centre(front, 140)
    .across(front[0] - recess, front[0] + recess, 480, `RECESS Ø${figure(view.recess)}`, front[1]);
  for (const [x, y] of [
    [-84, -84],
    [84, -84],
    [84, 84],
    [-84, 84],
  ] as const)
    sheet.circle([front[0] + x, front[1] + y], 9);
  if (view.shaftFlat) {
    sheet
      .line(
        [front[0] + shaft * 0.6, front[1] - shaft * 0.8],
        [front[0] + shaft * 0.6, front[1] + shaft * 0.8],
      )
      .label([front[0] + shaft * 0.6, front[1]], [430, 100], 'FLAT ON THE SHAFT', ink.brass);
  }
  const left = 540;
  const long = 240;
  sheet
    .box(left, 170, long, 220, 'none')
    .box(left - 60, 268, 60, 24, 'none')
    .line([left - 80, 280], [left + long + 40, 280], 'axis');
  if (view.plug === 'rear')
    sheet
      .box(left + long, 330, 26, 36, 'print')
      .label([left + long + 13, 350], [800, 450], 'PLUG AT THE REAR');
  else
    sheet
      .box(left + long - 70, 390, 44, 26, 'print')
      .label([left + long - 48, 404], [790, 460], 'PLUG AT THE SIDE');
  sheet.box(left + 40, 200, 160, 120, 'none', 'thin');
  if (view.stripe) {
    sheet
      .add(`<rect x="${left + 40}" y="212" width="160" height="16" fill="${ink.blue}"/>`)
      .label([left + 70, 220], [left + 110, 110], 'BLUE STRIPE', ink.brass);
  }
  if (view.letter !== undefined)
    sheet.text(left + 120, 290, view.letter, { height: 40, anchor: 'middle', colour: ink.brass });
  if (view.squareDot) {
    sheet
      .add(`<rect x="${left + 160}" y="266" width="18" height="18" fill="${ink.blue}"/>`)
      .label([left + 169, 275], [left + 200, 130], 'SQUARE DOT', ink.brass);
  }
  return sheet.toSvg();
}

export interface BracketView {
  readonly title: string;
  /** Dots underneath. */
  readonly dots: number;
  /** Diameter and height of the lip, mm. */
  readonly lip: number;
  readonly lipHeight: number;
  readonly ribs: boolean;
}

/** A belt bracket from underneath, and the lip cut. Plate 58 × 76 mm, shaft hole 14 mm. */
export function bracketView(view: BracketView): string {
  const sheet = new Sheet(view.title, subtitle);
  const scale = 290 / 76;
  const [width, height] = [58 * scale, 290];
  const middle: Point = [250, 270];
  sheet.box(middle[0] - width / 2, middle[1] - height / 2, width, height, 'none');
  if (view.ribs) {
    for (const x of [-84, 84])
      sheet.box(middle[0] + x - 6, middle[1] - height / 2 + 44, 12, height - 88, 'print', 'thin');
    sheet.label([middle[0] + 84, middle[1] - 60], [420, 120], 'RIBS', ink.brass);
  }
  sheet.circle(middle, 7 * scale, 'outline', 'none').centre(middle, 70);
  for (let dot = 0; dot < view.dots; dot++) {
    const x = middle[0] + (dot - (view.dots - 1) / 2) * 26;
    sheet.add(`<circle cx="${x}" cy="${middle[1] + 110}" r="7" fill="${ink.brass}"/>`);
  }
  sheet.text(middle[0], 460, `${view.dots} ${view.dots === 1 ? 'DOT' : 'DOTS'} UNDERNEATH`, {
    height: 14,
    anchor: 'middle',
    colour: ink.brass,
  });
  // The lip is drawn at twice the scale of the plate and four times as high, so that its height shows.
  const wide = 2 * scale;
  const high = 4 * scale;
  const centre = 620;
  const [top, thick] = [330, 44];
  const [lip, hole] = [(view.lip / 2) * wide, 7 * wide];
  const up = view.lipHeight * high;
  for (const side of [-1, 1]) {
    sheet.cut(
      [
        [centre + side * hole, top + thick],
        [centre + side * 150, top + thick],
        [centre + side * 150, top],
        [centre + side * lip, top],
        [centre + side * lip, top - up],
        [centre + side * hole, top - up],
      ],
      'print',
    );
  }
  sheet
    .line([centre, top - up - 40], [centre, top + thick + 40], 'axis')
    .across(centre - lip, centre + lip, top - up - 60, `LIP Ø${figure(view.lip)}`, top - up)
    .down(top - up, top, centre + 180, `${figure(view.lipHeight)} HIGH`, [centre + lip, centre + 150])
    .text(centre, 460, 'LIP CUT, ITS HEIGHT ENLARGED', { height: 12, anchor: 'middle' });
  return sheet.toSvg();
}
