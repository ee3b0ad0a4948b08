import { dimensionAnchor, dimensionHeads, dimensionLines } from './dimension-lines.js';
import type { Drawing, Shape, ShapeRole } from './shapes.js';

/** Ink on white paper, as the day theme draws it: a file has no theme to follow. */
const ink = '#12335f';
const quiet = '#52616f';
const brass = '#7d5c0d';
const danger = '#b0121b';

const styles: Record<ShapeRole, string> = {
  a: `stroke="${ink}" stroke-width="1.7" fill="url(#hatch-a)"`,
  b: `stroke="${ink}" stroke-width="1.7" fill="url(#hatch-b)"`,
  overlap: `stroke="${danger}" stroke-width="1.2" fill="${danger}" fill-opacity="0.65"`,
  gap: `stroke="${quiet}" stroke-width="0.8" stroke-dasharray="3 2" fill="#fff"`,
  shim: `stroke="${brass}" stroke-width="0.8" fill="#b48a26"`,
  free: `stroke="${brass}" stroke-width="0.8" fill="#b48a26"`,
  centre: `stroke="${ink}" stroke-width="0.7" stroke-dasharray="10 3 2 3" fill="none"`,
  thin: `stroke="${ink}" stroke-width="0.7" fill="none"`,
  ghost: `stroke="${quiet}" stroke-width="0.9" stroke-dasharray="4 3" fill="none"`,
};

/**
 * A drawing as an SVG file that stands for itself: no styles, fonts or scripts from elsewhere. `caption` stands below it.
 */
export function drawingSvg(drawing: Drawing, caption = ''): string {
  const foot = caption === '' ? 0 : 26;
  const { width, height } = drawing;
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height + foot}" width="${width}" height="${height + foot}" font-family="monospace" font-size="12">`,
    `<title>${escape(drawing.description[0] ?? '')}</title>`,
    `<desc>${escape(drawing.description.join(' '))}</desc>`,
    `<defs>${hatch('a', 45)}${hatch('b', -45)}</defs>`,
    `<rect width="${width}" height="${height + foot}" fill="#fff"/>`,
    ...drawing.shapes.map(drawn),
    caption === '' ? '' : `<text x="8" y="${height + 16}" fill="${quiet}">${escape(caption)}</text>`,
    '</svg>',
  ].join('\n');
}

function hatch(name: 'a' | 'b', angle: number): string {
  return `<pattern id="hatch-${name}" width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(${angle})"><rect width="6" height="6" fill="#fff"/><line x1="0" y1="0" x2="0" y2="6" stroke="${ink}" stroke-width="0.7"/></pattern>`;
}

function drawn(shape: Shape): string {
  switch (shape.kind) {
    case 'path':
      return `<path d="${shape.d}" fill-rule="evenodd" stroke-linejoin="round" ${styles[shape.role]}/>`;
    case 'label':
      return text(shape.at, shape.anchor, shape.text, `fill="${ink}"`);
    case 'dimension':
      return [
        `<path d="${dimensionLines(shape)}" fill="none" stroke="${brass}" stroke-width="0.75"/>`,
        `<path d="${dimensionHeads(shape)}" fill="${brass}"/>`,
        text(
          shape.textAt,
          dimensionAnchor(shape),
          shape.text,
          `fill="${brass}"${shape.derived ? ' font-style="italic"' : ''}`,
        ),
      ].join('');
  }
}

function text([x, y]: readonly [number, number], anchor: string, words: string, style: string): string {
  return `<text x="${x}" y="${y}" text-anchor="${anchor}" ${style}>${escape(words)}</text>`;
}

function escape(words: string): string {
  return words.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;');
}
