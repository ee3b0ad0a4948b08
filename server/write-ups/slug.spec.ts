import { describe, expect, it } from 'vitest';
import { Slug } from '../../shared/contract/primitives.js';
import { freeSlug, slugFrom } from './slug.js';

describe('slug', () => {
  it.each([
    ['Bracket rocks on the raised lip', 'bracket-rocks-on-the-raised-lip'],
    ['  Größe 22.5 mm — “too wide”!  ', 'grosse-22-5-mm-too-wide'],
    ['Échappée', 'echappee'],
    ['日本語', 'write-up'],
    ['', 'write-up'],
    ['<script>alert(1)</script>', 'script-alert-1-script'],
  ])('makes of “%s” %s', (title, slug) => {
    expect(slugFrom(title)).toBe(slug);
  });

  it('cuts a long title between words, and a single long word where it must', () => {
    const long = slugFrom('gears '.repeat(40));
    expect(long.length).toBeLessThanOrEqual(100);
    expect(long.endsWith('-gears')).toBe(true);
    expect(slugFrom('g'.repeat(140))).toBe('g'.repeat(100));
  });

  it('is always one that an address takes', () => {
    for (const title of ['a--b', '-', 'ÄÖÜ ß', 'x'.repeat(300)])
      expect(Slug.safeParse(slugFrom(title)).success).toBe(true);
  });

  it('takes the least free number where the base is taken', () => {
    expect(freeSlug('lip', new Set())).toBe('lip');
    expect(freeSlug('lip', new Set(['lip']))).toBe('lip-2');
    expect(freeSlug('lip', new Set(['lip', 'lip-2', 'lip-4']))).toBe('lip-3');
  });
});
