import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fromJson } from '../../server/rows.js';
import type { Photo } from '../../shared/contract/photos.js';
import type { MemberAgent } from '../api/support/agents.js';
import { pause, startSite, type Site } from './support/site.js';

let site: Site;
let author: MemberAgent;

beforeAll(async () => {
  site = await startSite();
  author = await site.member('member', 'Author');
});
afterAll(() => site.stop());

/** A photo that no other one equals, with enough in it to take a while. */
async function grain(seed: number): Promise<Buffer> {
  const [width, height] = [960, 720];
  const pixels = Buffer.alloc(width * height * 3);
  let state = seed + 1;
  for (let index = 0; index < pixels.length; index += 1) {
    state = (state * 1_103_515_245 + 12_345) & 0x7fffffff;
    pixels[index] = state >> 16;
  }
  return sharp(pixels, { raw: { width, height, channels: 3 } })
    .jpeg({ quality: 60 })
    .toBuffer();
}

const upload = (bytes: Buffer) =>
  author.post('/api/photos').field('alt', 'Grain for a test').attach('file', bytes, 'grain.jpg');

/** Sends the photos one after the other until one is not answered with 201. */
async function uploadUntilRefused(photos: readonly Buffer[]): Promise<Photo[]> {
  const stored: Photo[] = [];
  for (const bytes of photos) {
    const answer = await upload(bytes).then(
      (response) => response,
      () => null,
    );
    if (answer?.status !== 201) return stored;
    stored.push(answer.body);
  }
  return stored;
}

async function widthsServed(hash: string, widths: readonly number[]): Promise<(number | undefined)[]> {
  return Promise.all(
    widths.map(async (width) => {
      const answer = await fetch(`${site.address}/photos/${hash}-${width}.webp`);
      if (!answer.ok) return answer.status;
      return (await sharp(Buffer.from(await answer.arrayBuffer())).metadata()).width;
    }),
  );
}

describe('photos that are being uploaded', () => {
  it.each(['server', 'database'] as const)(
    'are all there with all their files when the %s is killed, and one that was cut off can be sent again',
    async (what) => {
      const offset = what === 'server' ? 0 : 100;
      const photos = await Promise.all([0, 1, 2, 3].map((seed) => grain(offset + seed)));
      const uploading = uploadUntilRefused(photos);
      const before = Number(await countOfPhotos());
      while (Number(await countOfPhotos()) < before + 2) await pause(50);
      await pause(400);

      if (what === 'server') await site.killServer();
      else await site.killDatabase();
      const acknowledged = await uploading;
      if (what === 'server') await site.startServer();
      else await site.startDatabase();

      expect(acknowledged.length).toBeGreaterThanOrEqual(2);
      for (const { hash, widths } of acknowledged) expect(await widthsServed(hash, widths)).toEqual(widths);
      const rows: { hash: string; widths: unknown }[] = await site.knex('photos').select('hash', 'widths');
      const known = rows.map(({ hash }) => hash);
      expect(known).toEqual(expect.arrayContaining(acknowledged.map(({ hash }) => hash)));
      for (const row of rows) {
        const widths = fromJson<number[]>(row.widths);
        expect(await widthsServed(row.hash, widths)).toEqual(widths);
      }
      const again = await upload(photos[Math.min(acknowledged.length, photos.length - 1)]!);
      expect(again.status).toBe(201);
    },
  );
});

async function countOfPhotos(): Promise<number> {
  const row = await site.knex('photos').first(site.knex.raw('COUNT(*) AS count'));
  return Number((row as unknown as { count: number }).count);
}
