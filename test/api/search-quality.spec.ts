import { afterAll, beforeAll, expect, test } from 'vitest';
import { judgeSearch, judgementLines } from '../../search-fixtures/judge-search.js';
import { seedDemo } from '../../seeds/demo.js';
import { hashPassword } from '../../server/accounts/password.js';
import type { Photo } from '../../shared/contract/photos.js';
import { startTestApp, type TestApp } from './support/app.js';
import { indexIsInStep } from './support/search.js';

/** What the worst engine measured for this product reached on its first day; ours is far above. */
const floor = 0.85;

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ search: true });
  await seedDemo({ knex: app.knex, storePhoto: rowWithoutFiles, now: new Date(), hashPassword });
  await indexIsInStep(app);
});
afterAll(() => app.close());

let photos = 0;

/** Search reads what the database says of a photo; encoding ninety of them would only cost time. */
async function rowWithoutFiles(_bytes: Buffer, alt: string, ownerId: number): Promise<Photo> {
  photos += 1;
  const photo = {
    hash: String(photos).padStart(64, '0'),
    width: 960,
    height: 720,
    widths: [480, 960],
    placeholder: 'data:,',
    alt,
  };
  const [id] = await app
    .knex('photos')
    .insert({ ...photo, widths: JSON.stringify(photo.widths), owner_id: ownerId, created_at: new Date() });
  return { id: id!, ...photo };
}

test('when the judged queries are asked of the demo, then what answers them stands on top', async () => {
  const visitor = app.visitor();
  const judgement = await judgeSearch(
    async (query) =>
      (await visitor.get('/api/search').query({ q: query.q, limit: query.limit }).expect(200)).body,
  );
  console.log(judgementLines(judgement).join('\n'));
  expect(judgement.mean).toBeGreaterThanOrEqual(floor);
});
