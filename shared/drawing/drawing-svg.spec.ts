import { describe, expect, it } from 'vitest';
import { drawingSvg } from './drawing-svg.js';
import { drawJoint } from './joint-drawing.js';
import type { Drawing } from './shapes.js';

const read = (value: number) => ({ value, uncertainty: 0.02, source: { kind: 'own-reading' as const } });
const lip = drawJoint({
  kind: 'boss-recess',
  a: { dimensions: { diameter: read(22.5), height: read(1.5) }, attributes: {}, process: 'printed' },
  b: { dimensions: { diameter: read(19.5), depth: read(2) }, attributes: {}, process: 'machined' },
  nameA: 'bracket Rev 1',
  nameB: 'motor Rev C',
})!;

describe('a drawing as a file', () => {
  it('holds every shape and figure of the drawing', () => {
    const svg = drawingSvg(lip);
    const paths = lip.shapes.filter(({ kind }) => kind === 'path').length;
    const dimensions = lip.shapes.filter(({ kind }) => kind === 'dimension').length;
    expect(svg.match(/<path /g)).toHaveLength(paths + 2 * dimensions);
    for (const shape of lip.shapes) if (shape.kind !== 'path') expect(svg).toContain(`>${shape.text}</text>`);
  });

  it('tells in text what it shows', () => {
    expect(drawingSvg(lip)).toContain(`<title>${lip.description[0]}</title>`);
  });

  it('needs nothing from elsewhere', () => {
    expect(drawingSvg(lip).replace('http://www.w3.org/2000/svg', '')).not.toMatch(
      /https?:|<style|<script|@import/,
    );
  });

  it('is as much taller as its caption needs', () => {
    expect(drawingSvg(lip, 'From readings')).toContain(`height="${lip.height + 26}"`);
    expect(drawingSvg(lip)).toContain(`height="${lip.height}"`);
  });

  it('takes names as words, whatever stands in them', () => {
    const hostile: Drawing = {
      ...lip,
      shapes: [{ kind: 'label', at: [0, 0], text: '</text><script>alert("1")</script>', anchor: 'start' }],
      description: ['<b>&'],
    };
    const svg = drawingSvg(hostile, '<i>');
    expect(svg).not.toMatch(/<script|<b>|<i>/);
    expect(svg).toContain('&lt;script&gt;alert(&quot;1&quot;)');
  });
});
