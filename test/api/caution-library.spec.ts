import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { LibraryEntry, LibraryUse } from '../../shared/contract/caution-library.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  cautionFor,
  completeContent,
  insertJoint,
  knifeFix,
  publishNew,
  type TestJoint,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [author, moderator] = await Promise.all([app.memberNamed('Author'), app.as('moderator')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const entries = '/api/desk/caution-library/entries';
const words = {
  name: 'Blade',
  signalWord: 'caution',
  hazards: ['blade'],
  hazard: 'A blade that slips.',
  consequence: 'Could cut hands.',
  avoidance: 'Cut away from yourself.',
  why: 'It was missing.',
};
const add = async (over: object = {}): Promise<LibraryEntry> =>
  (
    await moderator
      .post(entries)
      .send({ ...words, ...over })
      .expect(201)
  ).body;
const change = (entry: LibraryEntry, over: object, version = entry.version) =>
  moderator
    .put(`${entries}/${entry.id}`)
    .set('If-Match', `"${version}"`)
    .send({ ...words, ...over });
const list = async (): Promise<LibraryEntry[]> => (await moderator.get(entries).expect(200)).body.items;
const offered = async (): Promise<number[]> =>
  (await moderator.get('/api/desk/caution-library').expect(200)).body.items.map(
    (entry: LibraryEntry) => entry.id,
  );
const uses = async (entry: LibraryEntry): Promise<LibraryUse[]> =>
  (await moderator.get(`${entries}/${entry.id}/uses`).expect(200)).body.items;
/** A published write-up whose blade hazard is answered by a caution taken from the entry. */
const carrier = async (entry: LibraryEntry, title: string) => {
  const fix = knifeFix();
  const content = completeContent(joint, { title, fixes: [fix] });
  const taken = { ...cautionFor(fix.key, 'blade'), libraryId: entry.id as unknown as null };
  return publishNew(author, moderator, content, [taken]);
};

describe('the library', () => {
  it('takes a new entry at its end, offers it, and keeps who added it and why', async () => {
    const entry = await add({ name: 'Fresh blade' });
    expect(entry).toMatchObject({ name: 'Fresh blade', version: 1, retired: false, uses: 0 });
    expect((await list()).at(-1)!.id).toBe(entry.id);
    expect((await offered()).at(-1)).toBe(entry.id);
    const { items } = (await moderator.get(`${entries}/${entry.id}/versions`).expect(200)).body;
    expect(items).toMatchObject([
      { version: 1, change: 'added', why: 'It was missing.', by: { id: moderator.account.id } },
    ]);
    expect(
      await app.knex('audit_log').where({ subject_kind: 'library-caution', subject_id: entry.id }),
    ).toMatchObject([{ action: 'library-caution-added', reason: 'It was missing.' }]);
  });

  it('refuses words that are too short or too long, naming the field', async () => {
    const refused = await moderator.post(entries).send({ ...words, hazard: 'x', why: '' });
    expect(refused.status).toBe(422);
    expect(refused.body.fields.map((field: { path: string }) => field.path)).toEqual(['hazard', 'why']);
  });

  it('keeps each change as a version, and compares two of them word by word', async () => {
    const entry = await add();
    const changed = await change(entry, { consequence: 'Could cut eyes.', why: 'Eyes too.' });
    expect([changed.status, changed.body.version, changed.headers['etag']]).toEqual([200, 2, '"2"']);

    const comparison = await moderator.get(`${entries}/${entry.id}/comparison?from=1&to=2`).expect(200);

    expect(comparison.body.to).toMatchObject({ change: 'worded', why: 'Eyes too.' });
    expect(comparison.body.changed).toEqual([
      {
        field: 'consequence',
        label: 'What can happen',
        pieces: [
          { kind: 'same', text: 'Could cut ' },
          { kind: 'removed', text: 'hands' },
          { kind: 'added', text: 'eyes' },
          { kind: 'same', text: '.' },
        ],
      },
    ]);
    expect((await moderator.get(`${entries}/${entry.id}/comparison?from=1&to=9`)).status).toBe(404);
  });

  it('refuses a change of what has moved on, with what stands there now, and one that names no version', async () => {
    const entry = await add();
    await change(entry, { avoidance: 'Clamp the work.' }).expect(200);

    const late = await change(entry, { avoidance: 'Wear gloves.' });

    expect([late.status, late.body.type]).toEqual([412, '/problems/moved-on']);
    expect(late.body.current).toMatchObject({ version: 2, avoidance: 'Clamp the work.' });
    const blind = await moderator.put(`${entries}/${entry.id}`).send(words);
    expect([blind.status, blind.body.type]).toEqual([428, '/problems/precondition-needed']);
  });

  it('lets one of two changes at the same moment win', async () => {
    const entry = await add();
    const answers = await Promise.all([
      change(entry, { avoidance: 'Clamp the work.' }),
      change(entry, { avoidance: 'Wear gloves.' }),
    ]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 412]);
    const { items } = (await moderator.get(`${entries}/${entry.id}/versions`)).body;
    expect(items).toHaveLength(2);
  });

  it('offers a retired entry no longer, and a put-back one again', async () => {
    const entry = await add();
    const act = (verb: string, version: number) =>
      moderator
        .post(`${entries}/${entry.id}/${verb}`)
        .set('If-Match', `"${version}"`)
        .send({ why: 'Because.' });

    const retired = await act('retire', 1);
    expect([retired.status, retired.body.retired]).toEqual([200, true]);
    expect(await offered()).not.toContain(entry.id);
    expect((await act('retire', 2)).status).toBe(412);
    const back = await act('put-back', 2);
    expect([back.status, back.body.retired, back.body.version]).toEqual([200, false, 3]);
    expect(await offered()).toContain(entry.id);
  });

  it('is put in another order only as a whole', async () => {
    const [first, second] = [await add({ name: 'First' }), await add({ name: 'Second' })];
    const ids = (await list()).map((entry) => entry.id);
    const turned = [...ids.filter((id) => id !== second.id && id !== first.id), second.id, first.id];

    await moderator.put('/api/desk/caution-library/order').send({ ids: turned }).expect(200);

    expect((await list()).map((entry) => entry.id)).toEqual(turned);
    const partial = await moderator.put('/api/desk/caution-library/order').send({ ids: turned.slice(1) });
    expect([partial.status, partial.body.type]).toEqual([409, '/problems/moved-on']);
    expect((await list()).map((entry) => entry.id)).toEqual(turned);
  });
});

describe('the write-ups that carry an entry', () => {
  it('are listed with where it stands, and given the new words where chosen, each noted and told', async () => {
    const entry = await add();
    const chosen = await carrier(entry, 'Chosen to be worded anew');
    const left = await carrier(entry, 'Left as it is');
    const changed = (await change(entry, { avoidance: 'Clamp the work first.' }).expect(200)).body;
    const before = await uses(entry);
    expect(before.map((use) => [use.title, use.fixTitle, use.asEntry, use.published])).toEqual([
      ['Chosen to be worded anew', 'Trim the lip', false, true],
      ['Left as it is', 'Trim the lip', false, true],
    ]);
    const cautionId = before[0]!.cautionId;

    const applied = await moderator
      .post(`${entries}/${entry.id}/apply`)
      .set('If-Match', `"${changed.version}"`)
      .send({ cautionIds: [cautionId] });

    expect(applied.body.items.map((use: LibraryUse) => use.asEntry)).toEqual([true, false]);
    const avoidanceOn = async (slug: string) =>
      (await app.visitor().get(`/api/write-ups/${slug}`)).body.view.fixes[0].cautions[0].avoidance;
    expect(await avoidanceOn(chosen.slug)).toBe('Clamp the work first.');
    expect(await avoidanceOn(left.slug)).toBe('Cut away from your hand.');
    expect(
      await app.knex('audit_log').where({ action: 'caution-changed', subject_id: cautionId }),
    ).toHaveLength(1);
    expect(
      await app.knex('happenings').where({ kind: 'caution-changed', path: `/write-ups/${chosen.slug}` }),
    ).toHaveLength(1);
  });

  it('are worded anew all together or not at all', async () => {
    const entry = await add();
    await carrier(entry, 'Needs it answered');
    const [use] = await uses(entry);
    const changed = (await change(entry, { hazards: ['dust'] }).expect(200)).body;
    const apply = (cautionIds: number[], version = changed.version) =>
      moderator.post(`${entries}/${entry.id}/apply`).set('If-Match', `"${version}"`).send({ cautionIds });

    expect((await apply([use!.cautionId])).body.type).toBe('/problems/caution-missing');
    expect((await apply([use!.cautionId, 999_999_999])).status).toBe(422);
    expect((await apply([use!.cautionId], 1)).status).toBe(412);
    expect((await uses(entry))[0]!.asEntry).toBe(false);
    expect(
      await app.knex('audit_log').where({ action: 'caution-changed', subject_id: use!.cautionId }),
    ).toHaveLength(0);
  });
});
