import type { Photo } from '../../shared/contract/photos.js';
import { renderSheet } from '../drawing/render.js';
import { sheetSize } from '../drawing/sheet.js';
import { demoParts } from './parts.js';
import { demoRevisionDrawings } from './revision-drawings.js';
import { known } from './seed-catalogue.js';
import { demoWriteUps } from './write-ups.js';

/** Outlines of parts are shown small. */
const partWidth = 720;

type StorePhoto = (bytes: Buffer, alt: string, ownerId: number) => Promise<Photo>;

/** Renders and stores every drawing of every edition; gives photo ids by the drawing's SVG. */
export async function storeWriteUpDrawings(
  storePhoto: StorePhoto,
  accounts: ReadonlyMap<string, number>,
): Promise<Map<string, number>> {
  const drawings = demoWriteUps.flatMap((writeUp) => {
    let content = writeUp.content;
    const all = [...content.drawings];
    for (const later of writeUp.later) {
      content = later.change(content);
      all.push(...content.drawings);
    }
    return all.map((item) => ({
      key: item.svg,
      svg: item.svg,
      alt: item.alt,
      owner: known(accounts, writeUp.by),
      width: sheetSize.width,
    }));
  });
  return storeAll(storePhoto, drawings);
}

/** Renders and stores the drawing of every part; gives photo ids by the part's slug. The first administrator owns them. */
export function storePartDrawings(
  storePhoto: StorePhoto,
  accounts: ReadonlyMap<string, number>,
): Promise<Map<string, number>> {
  const owner = known(accounts, 'administrator');
  const drawings = demoParts.map((part) => ({
    key: part.slug,
    svg: part.drawing,
    alt: `Outline drawing of ${part.name}: ${part.about}`.slice(0, 300),
    owner,
    width: partWidth,
  }));
  return storeAll(storePhoto, drawings);
}

/** Renders and stores what tells revisions apart; gives photo ids by `part:letter`. The first administrator owns them. */
export function storeRevisionDrawings(
  storePhoto: StorePhoto,
  accounts: ReadonlyMap<string, number>,
): Promise<Map<string, number>> {
  const owner = known(accounts, 'administrator');
  const drawings = demoRevisionDrawings.map(({ part, letter, alt, svg }) => ({
    key: `${part}:${letter}`,
    svg,
    alt,
    owner,
    width: sheetSize.width,
  }));
  return storeAll(storePhoto, drawings);
}

async function storeAll(
  storePhoto: StorePhoto,
  drawings: readonly { key: string; svg: string; alt: string; owner: number; width: number }[],
): Promise<Map<string, number>> {
  const distinct = [...new Map(drawings.map((item) => [item.key, item])).values()];
  const stored = await Promise.all(
    distinct.map(
      async ({ key, svg, alt, owner, width }) =>
        [key, (await storePhoto(await renderSheet(svg, width), alt, owner)).id] as const,
    ),
  );
  return new Map(stored);
}
