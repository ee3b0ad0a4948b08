import { Sheet, ink, type Point } from './sheet.js';

export interface Plot {
  readonly title: string;
  readonly acrossName: string;
  readonly upName: string;
  readonly across: readonly [from: number, to: number];
  readonly up: readonly [from: number, to: number];
  readonly series: readonly {
    readonly name: string;
    readonly colour: 'blue' | 'brass' | 'red';
    readonly points: readonly Point[];
    readonly joined?: boolean;
  }[];
  /** A limit drawn across the sheet, such as an acceptance figure. */
  readonly limit?: { readonly value: number; readonly name: string };
}

/** Readings against a scale, in the manner of an inspection record. */
export function plotSheet(plot: Plot): string {
  const sheet = new Sheet(plot.title, 'INSPECTION RECORD · READINGS AS TAKEN');
  const [left, right, top, bottom] = [120, 720, 70, 470];
  const px = (value: number): number =>
    left + ((value - plot.across[0]) / (plot.across[1] - plot.across[0])) * (right - left);
  const py = (value: number): number =>
    bottom - ((value - plot.up[0]) / (plot.up[1] - plot.up[0])) * (bottom - top);
  sheet.box(left, top, right - left, bottom - top, 'none');
  for (let tick = 0; tick <= 4; tick++) {
    const x = plot.across[0] + ((plot.across[1] - plot.across[0]) * tick) / 4;
    const y = plot.up[0] + ((plot.up[1] - plot.up[0]) * tick) / 4;
    if (tick > 0 && tick < 4)
      sheet.line([px(x), top], [px(x), bottom], 'faint').line([left, py(y)], [right, py(y)], 'faint');
    sheet
      .text(px(x), bottom + 24, tidy(x), { anchor: 'middle' })
      .text(left - 12, py(y) + 6, tidy(y), { anchor: 'end' });
  }
  sheet.text((left + right) / 2, bottom + 54, plot.acrossName, { anchor: 'middle', height: 13 });
  sheet.text(56, (top + bottom) / 2, plot.upName, { anchor: 'middle', height: 13, turn: -90 });
  if (plot.limit) {
    sheet.line([left, py(plot.limit.value)], [right, py(plot.limit.value)], 'red');
    sheet.text(right + 12, py(plot.limit.value) + 5, plot.limit.name, { colour: ink.red, height: 11 });
  }
  plot.series.forEach((series, index) => {
    const kind = series.colour === 'blue' ? 'outline' : series.colour;
    if (series.joined !== false)
      sheet.path(
        `M${series.points.map(([x, y]) => `${px(x).toFixed(1)} ${py(y).toFixed(1)}`).join('L')}`,
        kind,
      );
    for (const [x, y] of series.points) sheet.circle([px(x), py(y)], 5, kind, 'none');
    sheet
      .line([740, 90 + index * 30], [770, 90 + index * 30], kind)
      .text(780, 95 + index * 30, series.name, { colour: ink[series.colour], height: 11 });
  });
  return sheet.toSvg();
}

const tidy = (value: number): string => String(Math.round(value * 1000) / 1000).replace('-', '–');
