import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { seedDemo, type DemoSurroundings } from '../../seeds/demo.js';
import { demoAccounts } from '../../seeds/demo/accounts.js';
import { demoWriteUps } from '../../seeds/demo/write-ups.js';
import type { Revision } from '../../shared/contract/hardware.js';
import { hashPassword } from '../../server/accounts/password.js';
import { startTestApp, type TestApp } from './support/app.js';

let app: TestApp;
const now = new Date('2026-11-30T12:00:00Z');

/** Keeps a photo's row without making its files, which takes most of the time and is tested elsewhere. */
const storePhoto: DemoSurroundings['storePhoto'] = async (bytes, alt, ownerId) => {
  const photo = {
    hash: createHash('sha256').update(bytes).digest('hex'),
    width: 960,
    height: 640,
    placeholder: 'data:image/webp;base64,',
    alt,
  };
  const [id] = await app
    .knex('photos')
    .insert({ ...photo, widths: '[480,960]', owner_id: ownerId, created_at: now });
  return { id: id!, ...photo, widths: [480, 960] };
};
const seed = (): Promise<void> => seedDemo({ knex: app.knex, storePhoto, now, hashPassword });
const published = demoWriteUps.flatMap((writeUp) =>
  writeUp.state === 'published' && writeUp.slug ? [writeUp.slug] : [],
);

beforeAll(async () => {
  app = await startTestApp();
  await seed();
}, 300_000);
afterAll(() => app.close());

describe('the seeded demo', () => {
  it('shows every published write-up with fixes, and each hazardous one with a caution', async () => {
    const visitor = app.visitor();
    for (const slug of published) {
      const { body } = await visitor.get(`/api/write-ups/${slug}`).expect(200);
      expect(body.view.fixes.length, slug).toBeGreaterThan(0);
      expect(body.view.photos.length, slug).toBeGreaterThan(0);
    }
    const { body } = await visitor
      .get('/api/write-ups/belt-bracket-lip-does-not-enter-the-m1-recess')
      .expect(200);
    const trim = body.view.fixes.find((fix: { key: string }) => fix.key === 'trim-the-lip-off');
    expect(trim.cautions.flatMap((caution: { hazards: string[] }) => caution.hazards)).toContain(
      'power-tool',
    );
    expect(body.editionCount).toBe(4);
  });

  it('has fixes of every standing, and at least one that a maker has made right', async () => {
    const standings = await app.knex('fixes').distinct('standing').pluck('standing');
    expect(standings.sort()).toEqual(['made-right', 'measured', 'told', 'tried']);
    expect(
      await app.knex('fixes').whereNotNull('made_right_from').where('standing', '!=', 'made-right'),
    ).toEqual([]);
  });

  it('asks 150 questions, some six in ten settled by a fix that stands, and answers most', async () => {
    const [{ all }] = (await app.knex('questions').count({ all: '*' })) as [{ all: number }];
    expect(Number(all)).toBe(150);
    const settled = await app
      .knex('questions as q')
      .join('fixes as f', (on) =>
        on.on('f.write_up_id', 'q.settled_write_up_id').andOn('f.fix_key', 'q.settled_fix_key'),
      );
    expect(settled.length / 150).toBeCloseTo(0.6, 1);
    const [{ replied }] = (await app.knex('question_replies').countDistinct({ replied: 'question_id' })) as [
      { replied: number },
    ];
    expect(Number(replied)).toBeGreaterThan(110);
  });

  it('has at least sixty published write-ups and four hundred trials', async () => {
    expect(published.length).toBeGreaterThanOrEqual(60);
    const [{ all }] = (await app.knex('trials').count({ all: '*' })) as [{ all: number }];
    expect(Number(all)).toBeGreaterThanOrEqual(400);
  });

  it('has trials that carry a worksheet', async () => {
    expect((await app.knex('trials').whereNotNull('worksheet')).length).toBeGreaterThan(3);
  });

  it('shows at every revision of the M1 and of the belt bracket what tells it apart', async () => {
    for (const slug of ['tarn-m1', 'stonebridge-belt-bracket']) {
      const { body } = await app.visitor().get(`/api/parts/${slug}`).expect(200);
      const shown = (body.revisions as Revision[]).map(({ label, photos }) => [
        label,
        photos.map(({ photo }) => photo.alt.includes(label)),
      ]);
      expect(shown).toEqual(['Rev A', 'Rev B', 'Rev C', 'Rev D'].map((label) => [label, [true]]));
    }
  });

  it('points each write-up at its last published edition and asks for it to be indexed', async () => {
    const rows: { published: number; last: number }[] = await app
      .knex('write_ups')
      .join('editions', 'editions.write_up_id', 'write_ups.id')
      .where('editions.state', 'published')
      .groupBy('write_ups.id', 'write_ups.published_edition_id')
      .select({ published: 'write_ups.published_edition_id' })
      .max({ last: 'editions.id' });
    expect(rows).toHaveLength(published.length);
    expect(rows.filter((row) => row.published !== row.last)).toEqual([]);
    expect(await app.knex('search_outbox').pluck('write_up_id')).toHaveLength(published.length);
  });

  it('leaves nothing dated after now or more than four years before', async () => {
    const earliest = new Date(now.getTime() - 4 * 365 * 86_400_000);
    for (const table of ['accounts', 'write_ups', 'editions', 'trials', 'bench_items']) {
      const range = await app
        .knex(table)
        .min({ first: 'created_at' })
        .max({ last: 'created_at' })
        .first<{ first: Date; last: Date }>();
      expect(range.first.getTime(), table).toBeGreaterThan(earliest.getTime());
      expect(range.last.getTime(), table).toBeLessThanOrEqual(now.getTime());
    }
  });

  it('has three editions on the desk, one returned with its reason and four drafts', async () => {
    const count = async (state: string): Promise<number> =>
      (await app.knex('editions').where({ state })).length;
    expect({
      submitted: await count('submitted'),
      returned: await count('returned'),
      draft: await count('draft'),
    }).toEqual({ submitted: 3, returned: 1, draft: 4 });
    expect(await app.knex('editions').where({ state: 'returned' }).whereNull('return_reason')).toEqual([]);
  });

  it.each(demoAccounts.map((account) => [account.key, account] as const))(
    'lets the %s sign in',
    async (_key, account) => {
      const { body } = await app
        .visitor()
        .post('/api/account/sign-in')
        .send({ email: account.email, password: account.password })
        .expect(200);
      expect(body.account).toMatchObject({ displayName: account.displayName, role: account.role });
    },
  );

  it('refuses to be made twice', async () => {
    await expect(seed()).rejects.toThrow(/already there/);
  });
});
