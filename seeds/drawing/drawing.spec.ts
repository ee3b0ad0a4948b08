import { describe, expect, it } from 'vitest';
import sharp from 'sharp';
import { demoParts } from '../demo/parts.js';
import { demoRevisionDrawings } from '../demo/revision-drawings.js';
import { demoWriteUps } from '../demo/write-ups.js';
import { lettering, letteringWidth } from './lettering.js';
import { renderSheet } from './render.js';
import { seatSection } from './sections.js';

describe('the lettering', () => {
  it('makes a line twice as wide at twice the height', () => {
    expect(letteringWidth('LIP Ø22.5', 24)).toBeCloseTo(2 * letteringWidth('LIP Ø22.5', 12), 9);
  });

  it('refuses a letter that it does not have, so that no sheet has a hole in it', () => {
    expect(() => lettering(0, 0, 'SPALT 漢', { colour: '#000' })).toThrow(/漢/);
  });
});

describe('the sheets of the demo', () => {
  it('are all different', () => {
    const sheets = [
      ...demoParts.map((part) => part.drawing),
      ...demoRevisionDrawings.map((drawing) => drawing.svg),
      ...demoWriteUps.flatMap((writeUp) => writeUp.content.drawings.map((item) => item.svg)),
    ];
    expect(new Set(sheets).size).toBe(sheets.length);
    expect(sheets.length).toBeGreaterThanOrEqual(85);
  });

  it('have alternative texts of 20 to 300 characters', () => {
    const texts = demoWriteUps.flatMap((writeUp) => writeUp.content.drawings.map((item) => item.alt));
    expect(texts.filter((text) => text.length < 20 || text.length > 300)).toEqual([]);
  });

  it('hold no length that is not a number', () => {
    const sheets = [
      ...demoParts.map((part) => part.drawing),
      ...demoRevisionDrawings.map((drawing) => drawing.svg),
      ...demoWriteUps.flatMap((writeUp) => writeUp.content.drawings.map((item) => item.svg)),
    ];
    expect(sheets.filter((svg) => /NaN|undefined|Infinity/.test(svg))).toEqual([]);
  });
});

describe('a seat section', () => {
  const seat = {
    title: 'SEAT',
    upper: 'PLATE',
    lower: 'BODY',
    boss: 22.5,
    bossHeight: 1.7,
    recess: 19.5,
    recessDepth: 2,
  };

  it('marks an overlap where the boss is wider than the recess, and none where it enters', () => {
    expect(seatSection(seat)).toContain('fill="url(#clash)"');
    expect(seatSection({ ...seat, boss: 19.2 })).not.toContain('fill="url(#clash)"');
  });

  it('renders to a PNG of the width asked for', async () => {
    const { format, width, height } = await sharp(await renderSheet(seatSection(seat), 480)).metadata();
    expect({ format, width, height }).toEqual({ format: 'png', width: 480, height: 320 });
  });
});
