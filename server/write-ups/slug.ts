const longest = 100;

/** Letters that are no base letter with an accent. */
const spelled: Record<string, string> = {
  ß: 'ss',
  æ: 'ae',
  œ: 'oe',
  ø: 'o',
  ł: 'l',
  đ: 'd',
  þ: 'th',
  ð: 'd',
};

/**
 * Words of a title as they stand in an address: lower-case Latin letters without accents, digits and hyphens, at most 100
 * characters, cut between words. A title without any of these gives `write-up`.
 */
export function slugFrom(title: string): string {
  const words = title
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[ßæœøłđþð]/g, (letter) => spelled[letter] ?? '')
    .split(/[^a-z0-9]+/)
    .filter((word) => word !== '');
  let slug = '';
  for (const word of words) {
    const longer = slug === '' ? word : `${slug}-${word}`;
    if (longer.length > longest) break;
    slug = longer;
  }
  return slug || words[0]?.slice(0, longest) || 'write-up';
}

/** The base itself, or with the least number from 2 up that is not taken. */
export function freeSlug(base: string, taken: ReadonlySet<string>): string {
  if (!taken.has(base)) return base;
  let number = 2;
  while (taken.has(`${base}-${number}`)) number += 1;
  return `${base}-${number}`;
}
