import { gunzipSync } from 'node:zlib';
import { join } from 'node:path';
import { readdir } from 'node:fs/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeDump } from '../../server/dump/dump-file.js';
import { DumpRecord } from '../../shared/contract/dump-records.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertFeature, insertJointOf, reading } from './support/features.js';
import {
  cautionFor,
  completeContent,
  insertJoint,
  knifeFix,
  publishNew,
  saveNewDraft,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let slug: string;
const path = '/dump/shimlore.jsonl.gz';

beforeAll(async () => {
  app = await startTestApp();
  author = await app.memberNamed('Ada Lathe');
  const [moderator, tester] = [await app.as('moderator'), await app.memberNamed('Bo Collet')];
  const joint = await insertJoint(app.knex);
  const [revisionA, revisionB] = [joint.motor.revisions[0]!.id, joint.bracket.revisions[0]!.id];
  const boss = await insertFeature(app.knex, joint.motor, 'boss');
  const recess = await insertFeature(app.knex, joint.bracket, 'recess');
  const seat = await insertJointOf(app.knex, 'boss-recess', boss, recess);
  await author
    .post('/api/measurements')
    .send(reading(boss, revisionA, 'diameter', 22.5))
    .expect(201);
  await author
    .post(`/api/joints/${seat}/reports`)
    .send({ revisionA, revisionB, sat: false, note: 'It rocked.' });
  const fix = knifeFix();
  ({ slug } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }), [
    cautionFor(fix.key, 'blade'),
  ]));
  await saveNewDraft(author, completeContent(joint, { title: 'Never handed in' }));
  await tester
    .post(`/api/write-ups/${slug}/trials`)
    .send({ fixKey: fix.key, outcome: 'held', revisionIds: [revisionA], note: 'Held.', figure: 0.05 })
    .expect(201);
  const question = await author
    .post('/api/questions')
    .send({
      title: 'Why does it still rock?',
      text: 'It rocks about the lip, whatever I tighten.',
      parts: [{ partId: joint.motor.id, revisionId: null }],
      symptoms: [],
      readings: [],
      worksheet: null,
    })
    .expect(201);
  await tester
    .post(`/api/questions/${question.body.slug}/replies`)
    .send({ text: 'It was the screw.', worksheet: null })
    .expect(201);
});
afterAll(() => app.close());

const place = () => ({ folder: join(app.photoDir, 'dump'), publicAddress: app.url });
async function fetchDump(): Promise<{ text: string; records: DumpRecord[] }> {
  await makeDump(app.knex, place(), new Date());
  const answer = await fetch(app.url + path);
  const text = gunzipSync(Buffer.from(await answer.arrayBuffer())).toString('utf8');
  return {
    text,
    records: text
      .trimEnd()
      .split('\n')
      .map((line) => DumpRecord.parse(JSON.parse(line))),
  };
}
const ofKind = <K extends DumpRecord['kind']>(records: DumpRecord[], kind: K) =>
  records.filter((record): record is Extract<DumpRecord, { kind: K }> => record.kind === kind);

describe('the dump of published knowledge', () => {
  it('is announced as not there while none is made', async () => {
    expect((await app.visitor().get('/api/dump').expect(200)).body).toEqual({ dump: null });
    const answer = await app.visitor().get(path).expect(404);
    expect(answer.headers['content-type']).toContain('application/problem+json');
  });

  it('has lines of the declared shape, the first with licence and counts', async () => {
    const { records } = await fetchDump();
    const [header, ...body] = records;

    expect(header).toMatchObject({ kind: 'shimlore', version: 1, licence: 'CC-BY-SA-4.0', address: app.url });
    const counts = Object.fromEntries(
      [...new Set(body.map(({ kind }) => kind))].map((kind) => [kind, ofKind(records, kind).length]),
    );
    expect(header).toMatchObject({ counts });
    expect(Object.keys(counts).sort()).toEqual([
      'caution',
      'consensus',
      'feature',
      'fit-report',
      'joint',
      'maker',
      'part',
      'question',
      'reading',
      'reply',
      'revision',
      'trial',
      'write-up',
    ]);
  });

  it('credits by name, and holds no address, no identity of a person and no draft', async () => {
    const { text, records } = await fetchDump();

    expect(ofKind(records, 'write-up')).toMatchObject([{ slug, authors: ['Ada Lathe'], edition: 1 }]);
    expect(ofKind(records, 'reading')).toMatchObject([{ by: 'Ada Lathe', value: 22.5 }]);
    expect(ofKind(records, 'trial')).toMatchObject([{ by: 'Bo Collet', writeUp: slug }]);
    expect(text).not.toContain(author.account.email);
    expect(text).not.toContain('Never handed in');
    expect(text).not.toMatch(/"(?:account|author|person)Id"/);
  });

  it('leaves out what is taken down, set aside or withdrawn', async () => {
    const off = { taken_down_at: new Date(), taken_down_reason: 'Spam.' };
    for (const table of ['trials', 'questions', 'fit_reports']) await app.knex(table).update(off);
    await app.knex('measurements').update({ set_aside_at: new Date() });
    const writeUp = await app.knex('write_ups').where({ slug }).first('published_edition_id');
    await app.knex('write_ups').where({ slug }).update({ published_edition_id: null });
    try {
      const kinds = new Set((await fetchDump()).records.map(({ kind }) => kind));
      for (const kind of [
        'trial',
        'question',
        'reply',
        'fit-report',
        'reading',
        'write-up',
        'caution',
      ] as const)
        expect(kinds.has(kind)).toBe(false);
    } finally {
      await app.knex('write_ups').where({ slug }).update(writeUp);
      for (const table of ['trials', 'questions', 'fit_reports'])
        await app.knex(table).update({ taken_down_at: null, taken_down_reason: null });
      await app.knex('measurements').update({ set_aside_at: null });
    }
  });

  it('can be kept, asked for again and read in pieces, without a cookie', async () => {
    await makeDump(app.knex, place(), new Date());
    const whole = await fetch(app.url + path);
    const bytes = Buffer.from(await whole.arrayBuffer());
    expect(whole.headers.getSetCookie()).toEqual([]);
    expect(whole.headers.get('cache-control')).toMatch(/^public/);
    expect(whole.headers.get('content-encoding')).toBeNull();
    expect(whole.headers.get('last-modified')).toBeTruthy();
    // Not by fetch, which asks for a fresh copy by itself whenever a condition is set.
    await app.visitor().get(path).set('If-None-Match', whole.headers.get('etag')!).expect(304);
    const piece = await fetch(app.url + path, { headers: { Range: 'bytes=2-9' } });
    expect([piece.status, Buffer.from(await piece.arrayBuffer())]).toEqual([206, bytes.subarray(2, 10)]);
  });

  it('takes the place of the one before and leaves nothing beside', async () => {
    await makeDump(app.knex, place(), new Date());
    await makeDump(app.knex, place(), new Date());
    expect((await readdir(place().folder)).sort()).toEqual(['shimlore.json', 'shimlore.jsonl.gz']);
  });

  it('comes with its schema and with samples of each kind', async () => {
    await makeDump(app.knex, place(), new Date());
    const schema = await fetch(`${app.url}/dump/schema.json`);
    expect(await schema.json()).toMatchObject({ $schema: expect.stringContaining('json-schema.org') });
    expect(schema.headers.getSetCookie()).toEqual([]);
    const { dump } = (await app.visitor().get('/api/dump').expect(200)).body;
    expect(dump.samples.map(({ kind }: { kind: string }) => kind)).toEqual(
      dump.counts.map(({ kind }: { kind: string }) => kind),
    );
  });
});
