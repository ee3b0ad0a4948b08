import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { PartSummary } from '../../shared/contract/hardware.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { throughAllPages } from './support/pages.js';
import { insertPart, insertSymptom } from './support/catalogue.js';
import { completeContent, insertJoint, publishNew, saveNewDraft } from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [author, moderator] = await Promise.all([app.as('member'), app.as('moderator')]);
});
afterAll(() => app.close());

describe('the list of parts', () => {
  it('goes through all parts by name, each once, however small its pages', async () => {
    await insertPart(app.knex, { name: 'Paged alpha' });
    await insertPart(app.knex, { name: 'Paged beta' });
    await insertPart(app.knex, { name: 'Paged beta', maker: 'Another maker' });
    await insertPart(app.knex, { name: 'Paged gamma' });
    const parts = await throughAllPages<PartSummary>(app.visitor(), '/api/parts', { q: 'paged' });
    const names = parts.map((part) => part.name);
    expect(names).toEqual(['Paged alpha', 'Paged beta', 'Paged beta', 'Paged gamma']);
  });

  it('finds every word in the name of the part or of its maker, and takes wildcards for themselves', async () => {
    const part = await insertPart(app.knex, {
      name: 'Belt kit 100%',
      maker: 'Quillon Works',
      kind: 'belt-kit',
    });
    const found = async (query: object): Promise<string[]> =>
      (await app.visitor().get('/api/parts').query(query).expect(200)).body.items.map(
        (item: { slug: string }) => item.slug,
      );
    expect(await found({ q: 'quillon belt' })).toEqual([part.slug]);
    expect(await found({ q: '100%' })).toEqual([part.slug]);
    expect(await found({ q: 'quillon rotator' })).toEqual([]);
    expect(await found({ kind: 'belt-kit', maker: part.makerSlug })).toEqual([part.slug]);
  });

  it('lists revisions from the oldest to the newest and counts published write-ups only', async () => {
    const joint = await insertJoint(app.knex);
    await saveNewDraft(author, completeContent(joint));
    const before = await app.visitor().get('/api/parts').query({ maker: joint.motor.makerSlug });
    expect(before.body.items[0]).toMatchObject({ name: 'Motor M', writeUps: 0 });
    await publishNew(author, moderator, completeContent(joint));
    const after = await app.visitor().get('/api/parts').query({ maker: joint.motor.makerSlug });
    expect(after.body.items[0].writeUps).toBe(1);
    expect(after.body.items[0].revisions.map((revision: { label: string }) => revision.label)).toEqual([
      'Rev A',
      'Rev B',
      'Rev C',
    ]);
  });

  it('refuses a cursor that is none, and a kind that is none, naming the field', async () => {
    for (const [field, value] of [
      ['cursor', 'nonsense'],
      ['kind', 'spoon'],
      ['limit', '1000'],
      ['stray', '1'],
    ] as const) {
      const { status, body } = await app
        .visitor()
        .get('/api/parts')
        .query({ [field]: value });
      expect([status, body.fields[0].path]).toEqual([422, field]);
    }
  });
});

describe('the page of a part', () => {
  it('shows revisions with their days, features, and for which revisions each write-up holds', async () => {
    const joint = await insertJoint(app.knex);
    await app
      .knex('features')
      .insert({ part_id: joint.motor.id, slug: 'lip', name: 'Raised lip', kind: 'boss' });
    const { slug } = await publishNew(author, moderator, completeContent(joint));
    const { body } = await app.visitor().get(`/api/parts/${joint.motor.slug}`).expect(200);
    expect(body).toMatchObject({
      name: 'Motor M',
      photo: null,
      features: [{ slug: 'lip', name: 'Raised lip', kind: 'boss' }],
    });
    expect(body.revisions.map((revision: { soldFrom: string | null }) => revision.soldFrom)).toEqual([
      '2024-03-01',
      null,
      null,
    ]);
    expect(body.writeUps).toEqual([
      { slug, title: 'Bracket rocks on the raised lip', holdsFor: ['Rev A'], notFor: ['Rev B'] },
    ]);
  });

  it('answers 404 with a problem for a part that is not there', async () => {
    const { status, body } = await app.visitor().get('/api/parts/no-such-part');
    expect([status, body.type]).toEqual([404, '/problems/not-found']);
  });
});

describe('makers and symptoms', () => {
  it('lists makers by name and symptoms in the order of the list', async () => {
    const part = await insertPart(app.knex, { maker: 'Aardvark Tooling' });
    const makers = (await app.visitor().get('/api/makers').expect(200)).body.items;
    expect(makers[0]).toMatchObject({ slug: part.makerSlug, name: 'Aardvark Tooling' });
    const [first, second] = [await insertSymptom(app.knex, 'Zeta'), await insertSymptom(app.knex, 'Alpha')];
    const slugs = (await app.visitor().get('/api/symptoms').expect(200)).body.items.map(
      (each: { slug: string }) => each.slug,
    );
    expect(slugs.indexOf(first)).toBeLessThan(slugs.indexOf(second));
    expect(slugs).toContain(second);
  });
});
