import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { leftOut, sections } from '../../server/export/sections.js';
import { OwnData, type SectionName } from '../../shared/contract/export.js';
import { jpegFromTelephone } from '../fixtures/photos.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { accountColumns } from './support/account-columns.js';
import { takeAway } from './support/archive.js';
import { insertFeature, insertJointOf, reading } from './support/features.js';
import {
  completeContent,
  insertJoint,
  plainFix,
  publishNew,
  saveNewDraft,
  submitDraft,
} from './support/write-ups.js';

let app: TestApp;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  moderator = await app.as('moderator');
});
afterAll(() => app.close());

const dataOf = (files: ReadonlyMap<string, Buffer>): OwnData =>
  OwnData.parse(JSON.parse(files.get('data.json')!.toString('utf8')));

/** A member who has used everything there is. */
async function busyMember(name: string) {
  const member = await app.memberNamed(name);
  const other = await app.memberNamed(`Not ${name}`);
  const joint = await insertJoint(app.knex);
  const [motor, bracket] = [joint.motor, joint.bracket];
  const revisionIds = [motor.revisions[0]!.id, bracket.revisions[0]!.id];
  const boss = await insertFeature(app.knex, motor, 'boss');
  const recess = await insertFeature(app.knex, bracket, 'recess');
  const seat = await insertJointOf(app.knex, 'boss-recess', boss, recess);
  const photo = await member
    .post('/api/photos')
    .field('alt', 'The lip under a straight edge')
    .attach('file', await jpegFromTelephone(), 'lip.jpg')
    .expect(201);
  await member.post('/api/bench').send({ partId: motor.id, revisionId: revisionIds[0] });
  await member
    .post('/api/measurements')
    .send(reading(boss, revisionIds[0]!, 'diameter', 22.5))
    .expect(201);
  await member
    .post(`/api/joints/${seat}/reports`)
    .send({ revisionA: revisionIds[0], revisionB: revisionIds[1], sat: false, note: 'It rocked.' });
  const fix = plainFix();
  const { slug } = await publishNew(
    member,
    moderator,
    completeContent(joint, {
      fixes: [fix],
      photos: [{ photoId: photo.body.id, alt: 'The lip under a straight edge', caption: '', callouts: [] }],
    }),
  );
  const returned = await submitDraft(member, await saveNewDraft(member, completeContent(joint)));
  await moderator
    .post(`/api/desk/editions/${returned.id}/return`)
    .send({ reason: 'Say which revision it was.' })
    .expect(204);
  await saveNewDraft(member, completeContent(joint, { title: 'Only begun' }));
  await other
    .post(`/api/write-ups/${slug}/trials`)
    .send({ fixKey: fix.key, outcome: 'held', revisionIds, note: 'Held for the other one.', figure: 0.05 })
    .expect(201);
  const question = await member
    .post('/api/questions')
    .send({
      title: 'Why does it still rock?',
      text: 'It rocks about the lip, whatever I tighten.',
      parts: [{ partId: motor.id, revisionId: null }],
      symptoms: [],
      readings: [],
      worksheet: null,
    })
    .expect(201);
  await member
    .post(`/api/questions/${question.body.slug}/replies`)
    .send({ text: 'It was the screw.', worksheet: null })
    .expect(201);
  await other
    .post(`/api/questions/${question.body.slug}/replies`)
    .send({ text: 'Words of the other one.', worksheet: null })
    .expect(201);
  return { member, other, photo: photo.body, slug };
}

describe('what a member takes away', () => {
  it('is an archive with everything they wrote, in the declared shape', async () => {
    const { member, photo, slug } = await busyMember('Ada Lathe');

    const { answer, files } = await takeAway(member);
    const data = dataOf(files);

    expect(answer.headers['content-type']).toBe('application/zip');
    expect(answer.headers['content-disposition']).toMatch(
      /^attachment; filename=shimlore-own-data-[\d-]+\.zip$/,
    );
    expect(answer.headers['cache-control']).toBe('private, no-store');
    expect(data.account).toMatchObject([{ email: member.account.email, displayName: 'Ada Lathe' }]);
    expect(data.bench).toMatchObject([{ part: 'Motor M', revision: 'Rev A' }]);
    expect(data.readings).toMatchObject([
      { part: 'Motor M', revision: 'Rev A', value: 22.5, entered: [22.5] },
    ]);
    expect(data.fitReports).toMatchObject([{ sat: false, note: 'It rocked.' }]);
    expect(data.questions).toMatchObject([{ title: 'Why does it still rock?', parts: ['Motor M'] }]);
    expect(data.replies).toMatchObject([{ text: 'It was the screw.' }]);
    expect(data.editions.map(({ writeUp, state, title }) => [writeUp, state, title])).toEqual([
      [slug, 'published', 'Bracket rocks on the raised lip'],
      [null, 'returned', 'Bracket rocks on the raised lip'],
      [null, 'draft', 'Only begun'],
    ]);
    expect(data.photos).toMatchObject([
      { file: `${photo.hash}.webp`, alternativeText: 'The lip under a straight edge' },
    ]);
    expect(files.get('README.txt')!.toString('utf8')).toContain('CC-BY-SA-4.0');
  });

  it('has each photo as a WebP at the largest width kept', async () => {
    const { member, photo } = await busyMember('Bo Collet');

    const { files } = await takeAway(member);

    expect([...files.keys()]).toEqual(['README.txt', 'data.json', `photos/${photo.hash}.webp`]);
    const { format, width } = await sharp(files.get(`photos/${photo.hash}.webp`)).metadata();
    expect([format, width]).toEqual(['webp', Math.max(...photo.widths)]);
  });

  it('tells what the desk decided about it, and why', async () => {
    const { member } = await busyMember('Cy Reamer');

    const { decisions } = dataOf((await takeAway(member)).files);

    expect(decisions).toContainEqual(
      expect.objectContaining({ action: 'edition-returned', reason: 'Say which revision it was.' }),
    );
  });

  it('holds no secret and nothing of anybody else', async () => {
    const { member, other } = await busyMember('Di Spindle');

    const text = (await takeAway(member)).files.get('data.json')!.toString('utf8');

    for (const foreign of [
      '$argon2',
      'sha256',
      'Held for the other one',
      'Words of the other one',
      other.account.email,
    ])
      expect(text).not.toContain(foreign);
  });

  it('is whole for somebody who has done nothing yet', async () => {
    const data = dataOf((await takeAway(await app.memberNamed('Ed Blank'))).files);

    expect(data.account).toHaveLength(1);
    expect(data.editions).toEqual([]);
  });

  it('is made only so often an hour', async () => {
    const limited = await startTestApp({ rateLimits: true });
    try {
      const member = await limited.memberNamed('Flo Hurry');
      for (let time = 0; time < 10; time += 1) await member.get('/api/account/export').expect(200);

      const { body } = await member.get('/api/account/export').expect(429);
      expect(body.type).toBe('/problems/too-many-requests');
    } finally {
      await limited.close();
    }
  });
});

describe('the list of what an export holds', () => {
  it('has every section of the contract once', () => {
    const promised = Object.keys(OwnData.shape).filter(
      (name) => !['format', 'version', 'createdAt'].includes(name),
    ) as SectionName[];
    expect(sections.map(({ name }) => name)).toEqual(promised);
  });

  it('names every column of the database that names an account, or says why it is left out', async () => {
    const columns = await accountColumns(app.knex);
    const told = sections.map(({ table, owner }) => `${table}.${owner}`);

    expect(columns.length).toBeGreaterThan(20);
    expect(columns.filter((column) => !told.includes(column) && !(column in leftOut))).toEqual([]);
    expect(
      Object.keys(leftOut).filter((column) => !columns.includes(column) || told.includes(column)),
    ).toEqual([]);
  });
});
