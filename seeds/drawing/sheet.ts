import { type LetteringStyle, lettering, letteringWidth } from './lettering.js';

/** Inks of the sheet: outlines and text, measured values, what collides, and the faint lines. */
export const ink = {
  blue: '#1d3f72',
  brass: '#8a5d0b',
  red: '#c0202a',
  faint: '#8fa3c2',
  tint: '#e9eef6',
  glass: '#d5e6f2',
  paper: '#ffffff',
};

/** Size of every sheet in pixels, landscape 3 : 2. */
export const sheetSize = { width: 960, height: 640 } as const;

export type Point = readonly [x: number, y: number];
export type Hatch = 'steel' | 'print' | 'shim' | 'glass' | 'none';
type Line = 'outline' | 'thin' | 'faint' | 'hidden' | 'axis' | 'red' | 'brass';

const lines: Record<Line, string> = {
  outline: `stroke="${ink.blue}" stroke-width="2.6"`,
  thin: `stroke="${ink.blue}" stroke-width="1.1"`,
  faint: `stroke="${ink.faint}" stroke-width="0.8"`,
  hidden: `stroke="${ink.blue}" stroke-width="1.3" stroke-dasharray="8 5"`,
  axis: `stroke="${ink.blue}" stroke-width="1.1" stroke-dasharray="22 5 4 5"`,
  red: `stroke="${ink.red}" stroke-width="2.2"`,
  brass: `stroke="${ink.brass}" stroke-width="1.2"`,
};
const fills: Record<Hatch, string> = {
  steel: 'url(#steel)',
  print: 'url(#print)',
  shim: 'url(#shim)',
  glass: ink.glass,
  none: ink.paper,
};

const definitions = `<defs>
<pattern id="steel" width="11" height="11" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><rect width="11" height="11" fill="${ink.paper}"/><path d="M0 0V11" stroke="${ink.blue}" stroke-width="1.2"/></pattern>
<pattern id="print" width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(-45)"><rect width="9" height="9" fill="${ink.tint}"/><path d="M0 0V9" stroke="${ink.blue}" stroke-width="1"/></pattern>
<pattern id="shim" width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><rect width="6" height="6" fill="#f6e7c4"/><path d="M0 0V6" stroke="${ink.brass}" stroke-width="1.4"/></pattern>
<pattern id="clash" width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><rect width="6" height="6" fill="#fbdcdc"/><path d="M0 0V6M0 0H6" stroke="${ink.red}" stroke-width="1.3"/></pattern>
</defs>`;

/** One drawing sheet: pieces are laid down in order, later ones over earlier ones. All lengths in pixels. */
export class Sheet {
  readonly #pieces: string[] = [];

  constructor(
    private readonly title: string,
    private readonly subtitle: string,
  ) {}

  add(svg: string): this {
    this.#pieces.push(svg);
    return this;
  }

  line(from: Point, to: Point, kind: Line = 'outline'): this {
    return this.add(`<path d="M${at(from)}L${at(to)}" fill="none" ${lines[kind]}/>`);
  }

  path(d: string, kind: Line = 'outline', fill: Hatch | 'open' = 'open'): this {
    return this.add(
      `<path d="${d}" fill="${fill === 'open' ? 'none' : fills[fill]}" ${lines[kind]} stroke-linejoin="round"/>`,
    );
  }

  /** A closed outline, hatched where it is cut. */
  cut(points: readonly Point[], hatch: Hatch, kind: Line = 'outline'): this {
    return this.path(`M${points.map(at).join('L')}Z`, kind, hatch);
  }

  box(x: number, y: number, width: number, height: number, hatch: Hatch, kind: Line = 'outline'): this {
    return this.cut(
      [
        [x, y],
        [x + width, y],
        [x + width, y + height],
        [x, y + height],
      ],
      hatch,
      kind,
    );
  }

  circle(centre: Point, radius: number, kind: Line = 'outline', fill: Hatch | 'open' = 'open'): this {
    const [x, y] = centre;
    return this.add(
      `<circle cx="${n(x)}" cy="${n(y)}" r="${n(radius)}" fill="${fill === 'open' ? 'none' : fills[fill]}" ${lines[kind]}/>`,
    );
  }

  /** Where two solids claim the same room. */
  clash(points: readonly Point[]): this {
    return this.add(`<path d="M${points.map(at).join('L')}Z" fill="url(#clash)" ${lines.red}/>`);
  }

  /** Crossed centre lines. */
  centre(point: Point, reach: number): this {
    const [x, y] = point;
    return this.line([x - reach, y], [x + reach, y], 'axis').line([x, y - reach], [x, y + reach], 'axis');
  }

  text(x: number, y: number, text: string, style: Partial<LetteringStyle> = {}): this {
    return this.add(lettering(x, y, text, { colour: ink.blue, ...style }));
  }

  /** A word with a line that ends in a dot on what it names. */
  label(on: Point, stand: Point, text: string, colour: string = ink.blue): this {
    const width = letteringWidth(text, 12);
    const leftwards = stand[0] < on[0];
    const y = stand[1];
    const x = leftwards ? Math.max(stand[0], 54 + width) : Math.min(stand[0], sheetSize.width - 54 - width);
    this.add(
      `<path d="M${at(on)}L${at([x, y])}H${n(leftwards ? x - 8 : x + 8)}" fill="none" stroke="${colour}" stroke-width="1.1"/>`,
    );
    this.add(`<circle cx="${n(on[0])}" cy="${n(on[1])}" r="3" fill="${colour}"/>`);
    this.add(backing(leftwards ? x - 14 - width : x + 14, y - 8, width, 18));
    return this.text(leftwards ? x - 14 : x + 14, y + 6, text, {
      colour,
      anchor: leftwards ? 'end' : 'start',
    });
  }

  /** Horizontal dimension between two x, its line at `y`; extension lines start at `fromY`. Values stand in brass. */
  across(
    x1: number,
    x2: number,
    y: number,
    text: string,
    fromY: number | readonly [number, number],
    colour: string = ink.brass,
  ): this {
    const [one, other] = typeof fromY === 'number' ? [fromY, fromY] : fromY;
    this.#extension([x1, one], [x1, y]).#extension([x2, other], [x2, y]);
    const width = letteringWidth(text, 13);
    const inside = Math.abs(x2 - x1) > width + 44;
    this.#arrows([x1, y], [x2, y], Math.abs(x2 - x1) > 36, colour);
    const middle = inside ? (x1 + x2) / 2 : Math.max(x1, x2) + 34 + width / 2;
    this.add(backing(middle - width / 2, y - 22, width, 16));
    return this.text(middle, y - 7, text, { colour, height: 13, anchor: 'middle' });
  }

  /** Vertical dimension between two y, its line at `x`; the figure reads from the right-hand side. */
  down(
    y1: number,
    y2: number,
    x: number,
    text: string,
    fromX: number | readonly [number, number],
    colour: string = ink.brass,
  ): this {
    const [one, other] = typeof fromX === 'number' ? [fromX, fromX] : fromX;
    this.#extension([one, y1], [x, y1]).#extension([other, y2], [x, y2]);
    const height = Math.abs(y2 - y1);
    const width = letteringWidth(text, 13);
    this.#arrows([x, y1], [x, y2], height > 36, colour);
    if (height > width + 24) {
      this.add(backing(x - 22, (y1 + y2) / 2 - width / 2, 10, width));
      return this.text(x - 7, (y1 + y2) / 2, text, { colour, height: 13, anchor: 'middle', turn: -90 });
    }
    const outward = x >= (one + other) / 2;
    const start = outward ? x + 12 : x - 12 - width;
    this.add(backing(start, (y1 + y2) / 2 - 9, width, 18));
    return this.text(start, (y1 + y2) / 2 + 6, text, { colour, height: 13 });
  }

  toSvg(): string {
    const { width, height } = sheetSize;
    const block = Math.max(300, letteringWidth(this.title, 13) + 36, letteringWidth(this.subtitle, 10) + 36);
    const left = width - 24 - block;
    return (
      `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}">${definitions}` +
      `<rect width="${width}" height="${height}" fill="${ink.paper}"/>` +
      this.#pieces.join('') +
      `<rect x="24" y="24" width="${width - 48}" height="${height - 48}" fill="none" stroke="${ink.blue}" stroke-width="1.6"/>` +
      `<path d="M${n(left)} ${height - 24}V${height - 84}H${width - 24}M${n(left)} ${height - 50}H${width - 24}" fill="none" stroke="${ink.blue}" stroke-width="1.6"/>` +
      lettering(left + 16, height - 60, this.title, { colour: ink.blue, height: 13 }) +
      lettering(left + 16, height - 32, this.subtitle, { colour: ink.blue, height: 10 }) +
      `</svg>`
    );
  }

  #extension(from: Point, to: Point): this {
    const dx = Math.sign(to[0] - from[0]) * 5;
    const dy = Math.sign(to[1] - from[1]) * 5;
    return this.line([from[0] + dx, from[1] + dy], [to[0] + dx, to[1] + dy], 'thin');
  }

  /** Arrow heads between the extension lines, or from outside where there is no room. */
  #arrows(from: Point, to: Point, inside: boolean, colour: string): void {
    const length = Math.hypot(to[0] - from[0], to[1] - from[1]) || 1;
    const ux = (to[0] - from[0]) / length;
    const uy = (to[1] - from[1]) / length;
    const head = ([x, y]: Point, sign: number): string =>
      `M${at([x, y])}L${at([x + sign * (ux * 11 - uy * 3.4), y + sign * (uy * 11 + ux * 3.4)])}L${at([x + sign * (ux * 11 + uy * 3.4), y + sign * (uy * 11 - ux * 3.4)])}Z`;
    const sign = inside ? 1 : -1;
    const tail = inside ? 0 : 26;
    this.add(
      `<path d="M${at([from[0] - ux * tail, from[1] - uy * tail])}L${at([to[0] + ux * tail, to[1] + uy * tail])}" stroke="${colour}" stroke-width="1.1"/>` +
        `<path d="${head(from, sign)}${head(to, -sign)}" fill="${colour}"/>`,
    );
  }
}

const n = (value: number): string => String(Math.round(value * 100) / 100);
const at = ([x, y]: Point): string => `${n(x)} ${n(y)}`;
/** Paper behind a figure, so that hatching does not run through it. */
const backing = (x: number, y: number, width: number, height: number): string =>
  `<rect x="${n(x - 4)}" y="${n(y)}" width="${n(width + 8)}" height="${n(height)}" fill="${ink.paper}" opacity="0.92"/>`;
