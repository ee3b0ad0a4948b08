import { Sheet, sheetSize, type Point } from './sheet.js';

/** Plain shapes that parts are drawn as; lengths in mm. */
export type Outline =
  | { readonly shape: 'tube'; readonly diameter: number; readonly length: number; readonly shield: number }
  | {
      readonly shape: 'ring';
      readonly outer: number;
      readonly inner: number;
      readonly length: number;
      readonly holes?: number;
    }
  | {
      readonly shape: 'plate';
      readonly width: number;
      readonly height: number;
      readonly bore: number;
      readonly thickness: number;
    }
  | { readonly shape: 'motor'; readonly body: number; readonly length: number; readonly shaft: number }
  | { readonly shape: 'gear'; readonly teeth: number; readonly module: number; readonly width: number }
  | { readonly shape: 'bar'; readonly width: number; readonly length: number; readonly height: number }
  | {
      readonly shape: 'box';
      readonly width: number;
      readonly height: number;
      readonly depth: number;
      readonly opening: number;
    }
  | { readonly shape: 'strip'; readonly length: number; readonly width: number };

const figure = (value: number): string => (Number.isInteger(value) ? `${value}` : value.toFixed(1));

/** Two views of a part with its main dimensions: from the front on the left, from the side on the right. */
export function partOutline(title: string, outline: Outline): string {
  const sheet = new Sheet(title.toUpperCase(), 'OUTLINE · DIMENSIONS IN mm');
  const front: Point = [290, 280];
  const side: Point = [680, 280];
  const middle = sheetSize.height / 2;
  if (outline.shape === 'strip') {
    const scale = 700 / outline.length;
    const height = Math.max(24, outline.width * scale);
    sheet.box(120, 250, 700, height, 'shim').line([150, 250 + height / 2], [790, 250 + height / 2], 'hidden');
    sheet.box(60, 250 + height * 0.2, 60, height * 0.6, 'print').line([820, 250 + height / 2], [880, 380]);
    sheet
      .across(120, 820, 470, `HEATED LENGTH ${figure(outline.length)}`, 250 + height)
      .down(250, 250 + height, 900, figure(outline.width), 820);
    sheet
      .label([90, 250 + height * 0.3], [150, 130], 'CLOSURE')
      .label([400, 250 + height / 2], [470, 140], 'HEATING WIRE');
    return sheet.toSvg();
  }
  if (outline.shape === 'tube') {
    const scale = 640 / (outline.length * 1.25);
    const half = (outline.diameter / 2) * scale;
    const shield = (outline.shield / 2) * scale;
    const start = 140;
    const body = outline.length * scale;
    sheet
      .box(start, middle - 40 - shield, body * 0.28, shield * 2, 'none')
      .box(start + body * 0.28, middle - 40 - half, body * 0.55, half * 2, 'none');
    sheet.box(start + body * 0.83, middle - 40 - half * 0.85, body * 0.17, half * 1.7, 'none');
    for (let knurl = 0; knurl < 6; knurl++) {
      const x = start + body * (0.85 + knurl * 0.024);
      sheet.line([x, middle - 40 - half * 0.85], [x, middle - 40 + half * 0.85], 'thin');
    }
    sheet.line([start - 40, middle - 40], [start + body + 50, middle - 40], 'axis');
    sheet.across(start, start + body, 500, `LENGTH ${figure(outline.length)}`, [
      middle - 40 + shield,
      middle - 40 + half * 0.85,
    ]);
    sheet.down(middle - 40 - shield, middle - 40 + shield, 84, `SHIELD Ø${figure(outline.shield)}`, start);
    sheet.down(
      middle - 40 - half,
      middle - 40 + half,
      start + body + 70,
      `TUBE Ø${figure(outline.diameter)}`,
      start + body * 0.8,
    );
    sheet.label([start + body * 0.93, middle - 40 - half * 0.6], [start + body * 0.96, 110], 'FOCUS RING');
    return sheet.toSvg();
  }
  if (outline.shape === 'ring') {
    const scale = 300 / outline.outer;
    const [outer, inner] = [150, (outline.inner / 2) * scale];
    sheet
      .circle(front, outer, 'outline', 'none')
      .circle(front, inner, 'outline', 'none')
      .centre(front, outer + 26);
    for (let hole = 0; hole < (outline.holes ?? 0); hole++) {
      const angle = (hole / (outline.holes ?? 1)) * 2 * Math.PI + 0.5;
      sheet.circle(
        [
          front[0] + Math.cos(angle) * (outer + inner) * 0.5,
          front[1] + Math.sin(angle) * (outer + inner) * 0.5,
        ],
        8,
      );
    }
    const long = Math.min(180, Math.max(34, outline.length * scale));
    for (const sign of [1, -1])
      sheet.box(
        side[0] - long / 2,
        sign > 0 ? side[1] + inner : side[1] - outer,
        long,
        outer - inner,
        'steel',
      );
    sheet
      .line([side[0] - long / 2, side[1] - inner], [side[0] - long / 2, side[1] + inner])
      .line([side[0] + long / 2, side[1] - inner], [side[0] + long / 2, side[1] + inner]);
    sheet.line([side[0] - long, side[1]], [side[0] + long, side[1]], 'axis');
    sheet
      .across(front[0] - outer, front[0] + outer, 490, `Ø${figure(outline.outer)}`, front[1])
      .across(side[0] - long / 2, side[0] + long / 2, 490, figure(outline.length), side[1] + outer);
    sheet.down(
      side[1] - inner,
      side[1] + inner,
      side[0] + long / 2 + 60,
      `Ø${figure(outline.inner)}`,
      side[0] + long / 2,
    );
    return sheet.toSvg();
  }
  if (outline.shape === 'gear') {
    const pitch = outline.module * outline.teeth;
    const radius = 140;
    const tooth = (outline.module / pitch) * radius * 2;
    const points: string[] = [];
    for (let index = 0; index < outline.teeth * 4; index++) {
      const angle = (index / (outline.teeth * 4)) * 2 * Math.PI;
      const r = index % 4 < 2 ? radius + tooth : radius - tooth;
      points.push(
        `${(front[0] + r * Math.cos(angle)).toFixed(1)} ${(front[1] + r * Math.sin(angle)).toFixed(1)}`,
      );
    }
    sheet
      .path(`M${points.join('L')}Z`, 'outline', 'none')
      .circle(front, radius, 'axis')
      .circle(front, radius * 0.62, 'outline', 'none')
      .centre(front, radius + 34);
    const wide = Math.max(30, (outline.width / pitch) * radius * 2);
    for (const sign of [1, -1])
      sheet.box(
        side[0] - wide / 2,
        sign > 0 ? side[1] + radius * 0.62 : side[1] - radius - tooth,
        wide,
        radius * 0.38 + tooth,
        'steel',
      );
    for (const sign of [1, -1])
      sheet.line(
        [side[0] + (sign * wide) / 2, side[1] - radius * 0.62],
        [side[0] + (sign * wide) / 2, side[1] + radius * 0.62],
      );
    sheet.line([side[0] - wide / 2 - 36, side[1]], [side[0] + wide / 2 + 36, side[1]], 'axis');
    sheet
      .across(front[0] - radius, front[0] + radius, 500, `PITCH Ø${figure(pitch)}`, front[1])
      .across(side[0] - wide / 2, side[0] + wide / 2, 500, figure(outline.width), side[1] + radius + tooth);
    sheet.text(48, 62, `${outline.teeth} TEETH · MODULE ${outline.module}`, { height: 14 });
    return sheet.toSvg();
  }
  if (outline.shape === 'motor') {
    const scale = 220 / outline.body;
    sheet
      .box(front[0] - 110, front[1] - 110, 220, 220, 'none')
      .circle(front, 60, 'outline', 'none')
      .circle(front, Math.max(10, (outline.shaft / 2) * scale), 'outline', 'steel')
      .centre(front, 140);
    for (const [x, y] of [
      [-84, -84],
      [84, -84],
      [84, 84],
      [-84, 84],
    ] as const)
      sheet.circle([front[0] + x, front[1] + y], 9);
    const long = Math.min(230, outline.length * scale);
    sheet
      .box(side[0] - long / 2, side[1] - 110, long, 220, 'none')
      .box(side[0] - long / 2 - 70, side[1] - 12, 70, 24, 'none')
      .box(side[0] - long / 2 - 12, side[1] - 60, 12, 120, 'none');
    sheet
      .line([side[0] - long / 2 - 100, side[1]], [side[0] + long / 2 + 30, side[1]], 'axis')
      .box(side[0] + long / 2, side[1] + 60, 26, 30, 'print');
    sheet
      .across(front[0] - 110, front[0] + 110, 480, `BODY ${figure(outline.body)}`, front[1] + 110)
      .across(side[0] - long / 2, side[0] + long / 2, 480, figure(outline.length), side[1] + 110);
    sheet.label([front[0], front[1]], [420, 100], `SHAFT Ø${figure(outline.shaft)}`);
    return sheet.toSvg();
  }
  if (outline.shape === 'plate') {
    const scale = 260 / Math.max(outline.width, outline.height);
    const [w, h] = [outline.width * scale, outline.height * scale];
    sheet
      .box(front[0] - w / 2, front[1] - h / 2, w, h, 'none')
      .circle(front, (outline.bore / 2) * scale, 'outline', 'none')
      .centre(front, Math.max(w, h) / 2 + 20);
    for (const [x, y] of [
      [-1, -1],
      [1, -1],
      [1, 1],
      [-1, 1],
    ] as const)
      sheet.circle([front[0] + x * (w / 2 - 22), front[1] + y * (h / 2 - 22)], 8);
    const thick = Math.max(22, outline.thickness * scale);
    sheet
      .box(side[0], side[1] - h / 2, thick, h, 'print')
      .line([side[0] - 40, side[1]], [side[0] + thick + 40, side[1]], 'axis');
    sheet
      .across(front[0] - w / 2, front[0] + w / 2, 480, figure(outline.width), front[1] + h / 2)
      .down(front[1] - h / 2, front[1] + h / 2, 96, figure(outline.height), front[0] - w / 2);
    sheet
      .across(side[0], side[0] + thick, 480, figure(outline.thickness), side[1] + h / 2)
      .label(
        [front[0] + (outline.bore / 2) * scale * 0.7, front[1] - (outline.bore / 2) * scale * 0.7],
        [480, 110],
        `BORE Ø${figure(outline.bore)}`,
      );
    return sheet.toSvg();
  }
  if (outline.shape === 'bar') {
    const scale = Math.min(420 / outline.length, 260 / outline.width);
    const [w, h] = [outline.length * scale, Math.max(40, outline.width * scale)];
    sheet
      .box(90, 200, w, h, 'none')
      .circle([90 + w * 0.2, 200 + h / 2], 9)
      .circle([90 + w * 0.8, 200 + h / 2], 9)
      .line([60, 200 + h / 2], [90 + w + 30, 200 + h / 2], 'axis');
    const endScale = Math.min(scale, 180 / outline.width);
    const [e, v] = [outline.width * endScale, Math.max(26, outline.height * endScale)];
    sheet.cut(
      [
        [640, 200 + v],
        [640 + e * 0.14, 200],
        [640 + e * 0.86, 200],
        [640 + e, 200 + v],
      ],
      'steel',
    );
    const under = 262 + Math.max(h, v);
    sheet
      .across(90, 90 + w, under, figure(outline.length), 200 + h)
      .across(640, 640 + e, under, figure(outline.width), 200 + v)
      .down(200, 200 + v, 640 + e + 50, figure(outline.height), [640 + e * 0.86, 640 + e]);
    return sheet.toSvg();
  }
  const scale = 300 / Math.max(outline.width, outline.height);
  const [w, h] = [outline.width * scale, outline.height * scale];
  const deep = Math.max(40, Math.min(240, outline.depth * scale));
  sheet
    .box(front[0] - w / 2, front[1] - h / 2, w, h, 'none')
    .circle(front, (outline.opening / 2) * scale, 'outline', 'none')
    .circle(front, (outline.opening / 2) * scale - 9, 'thin')
    .centre(front, Math.max(w, h) / 2 + 20);
  sheet
    .box(side[0] - deep / 2, side[1] - h / 2, deep, h, 'none')
    .box(
      side[0] - deep / 2 - 16,
      side[1] - (outline.opening / 2) * scale,
      16,
      outline.opening * scale,
      'steel',
    );
  sheet.line([side[0] - deep / 2 - 50, side[1]], [side[0] + deep / 2 + 40, side[1]], 'axis');
  sheet
    .across(front[0] - w / 2, front[0] + w / 2, 500, figure(outline.width), front[1] + h / 2)
    .across(side[0] - deep / 2, side[0] + deep / 2, 500, figure(outline.depth), side[1] + h / 2);
  sheet.label(
    [front[0] + 12, front[1] - (outline.opening / 2) * scale + 4],
    [490, 90],
    `OPENING Ø${figure(outline.opening)}`,
  );
  return sheet.toSvg();
}
