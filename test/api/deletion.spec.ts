import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createLeaving } from '../../server/accounts/leaving.js';
import { createAuditLog } from '../../server/audit/audit.js';
import { createDeletion } from '../../server/deletion/deletion.js';
import { whatBecomes } from '../../server/deletion/what-becomes.js';
import { noRateLimits } from '../../server/http/rate-limits.js';
import { createLetters } from '../../server/mail/letters.js';
import { createMailQueue } from '../../server/mail/mail-queue.js';
import { createPhotos } from '../../server/photos/photos.js';
import { deletionWords } from '../../shared/contract/deletion.js';
import { jpeg } from '../fixtures/photos.js';
import { accountColumns } from './support/account-columns.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertFeature, reading } from './support/features.js';
import {
  completeContent,
  insertJoint,
  plainFix,
  publishNew,
  saveNewDraft,
  submitDraft,
  type TestJoint,
} from './support/write-ups.js';

const day = 24 * 60 * 60 * 1000;
let now = new Date('2026-12-01T12:00:00.000Z');
let app: TestApp;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp({ clock: () => now });
  moderator = await app.as('moderator');
  await app.as('administrator');
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

/** So many days later, the worker has been by. */
async function afterDays(days: number): Promise<void> {
  now = new Date(now.getTime() + days * day);
  const clock = (): Date => now;
  const { knex, photoDir, url } = app;
  await createDeletion({
    knex,
    clock,
    leaving: createLeaving(),
    mail: createMailQueue({ letters: createLetters(url), secret: 'any', clock }),
    limits: noRateLimits,
    audit: createAuditLog({ clock }),
    photos: createPhotos({ knex, photoDir, clock }).service,
    logger: pino({ level: 'silent' }),
  }).round();
}

const wish = (member: MemberAgent, over: object = {}) => ({
  password: member.account.password,
  words: deletionWords,
  handOverTo: null,
  ...over,
});
const ask = (member: MemberAgent, over: object = {}) =>
  member.post('/api/account/deletion').send(wish(member, over));
const status = async (member: MemberAgent) => (await member.get('/api/account/deletion').expect(200)).body;
const signInAs = (member: MemberAgent) =>
  app
    .visitor()
    .post('/api/account/sign-in')
    .send({ email: member.account.email, password: member.account.password });
const pageOf = async (slug: string) => (await app.visitor().get(`/api/write-ups/${slug}`).expect(200)).body;
const mailsTo = (member: MemberAgent): Promise<string[]> =>
  app.knex('mail_outbox').where('to_address', member.account.email).orderBy('id').pluck('subject');

async function photoOf(member: MemberAgent, width: number) {
  const { body } = await member
    .post('/api/photos')
    .field('alt', 'The lip under a straight edge')
    .attach('file', await jpeg(width, 400), 'lip.jpg')
    .expect(201);
  return body as { id: number; hash: string };
}
const fileOf = (photo: { hash: string }): string =>
  join(app.photoDir, photo.hash.slice(0, 2), `${photo.hash}-480.webp`);
const photoUse = (photo: { id: number }) => ({
  photoId: photo.id,
  alt: 'The lip under a straight edge',
  caption: '',
  callouts: [],
});

describe('asking for the deletion of an account', () => {
  it('tells what goes and what stays before anything is asked', async () => {
    const member = await app.memberNamed('Ann Auger');
    await member.post('/api/bench').send({ partId: joint.motor.id, revisionId: null }).expect(201);
    await saveNewDraft(member, completeContent(joint));

    expect(await status(member)).toMatchObject({
      deletionAt: null,
      lastAdministrator: false,
      counts: { benchItems: 1, drafts: 1, writeUps: 0 },
      handOver: null,
    });
  });

  it('sets a day a week ahead, mails it and lets everything be until then', async () => {
    const member = await app.memberNamed('Ben Broach');

    const { body } = await ask(member).expect(202);
    await afterDays(6.9);

    expect(body.deletionAt).toBe(new Date(now.getTime() + 0.1 * day).toISOString());
    expect(await mailsTo(member)).toEqual(['Your account will be deleted']);
    expect((await signInAs(member).expect(200)).body.account).toMatchObject({
      displayName: 'Ben Broach',
      deletionAt: body.deletionAt,
    });
  });

  it.each([
    ['another password', { password: 'not the password of mine' }, 'password'],
    ['other words', { words: 'delete it' }, 'words'],
    ['the name of nobody', { handOverTo: 'Nobody At All' }, 'handOverTo'],
    ['half an address', { handOverTo: 'half@' }, 'handOverTo'],
  ])('refuses %s and names the field', async (_what, over, path) => {
    const member = await app.memberNamed('Cat Chuck');

    const { body } = await ask(member, over).expect(422);

    expect(body.fields).toMatchObject(
      [{ path, remedy: expect.any(String) }].map((field) =>
        path === 'handOverTo' && 'handOverTo' in over && String(over.handOverTo).includes('@')
          ? { path }
          : field,
      ),
    );
    expect((await status(member)).deletionAt).toBeNull();
  });

  it('refuses a name that several members have', async () => {
    await app.memberNamed('Twin Screw');
    await app.memberNamed('Twin Screw');
    const { body } = await ask(await app.memberNamed('Dan Die'), { handOverTo: 'Twin Screw' }).expect(422);
    expect(body.fields).toMatchObject([{ path: 'handOverTo' }]);
  });

  it('can be called off, and then nothing happens', async () => {
    const member = await app.memberNamed('Eve End-Mill');
    await ask(member).expect(202);

    const { body } = await member.delete('/api/account/deletion').expect(200);
    await afterDays(30);

    expect(body.deletionAt).toBeNull();
    await signInAs(member).expect(200);
  });

  it('is not open to the only administrator until there is another', async () => {
    await app.knex('accounts').where({ role: 'administrator' }).update({ role: 'member' });
    const only = await app.as('administrator');
    expect(await status(only)).toMatchObject({ lastAdministrator: true });
    const { body } = await ask(only).expect(403);
    expect(body.remedy).toContain('another member');

    await app.as('administrator');
    await ask(only).expect(202);
  });
});

describe('an account whose days of grace are over', () => {
  it('leaves no name, address, password, session, bench, stock, draft or mail', async () => {
    const member = await app.memberNamed('Fay File');
    await member.post('/api/bench').send({ partId: joint.motor.id, revisionId: null }).expect(201);
    await saveNewDraft(member, completeContent(joint, { title: 'A draft of hers only' }));
    const returned = await submitDraft(member, await saveNewDraft(member, completeContent(joint)));
    await moderator
      .post(`/api/desk/editions/${returned.id}/return`)
      .send({ reason: 'Say which revision it was.' })
      .expect(204);
    await ask(member).expect(202);

    await afterDays(7.1);

    const { id, email } = member.account;
    expect(await app.knex('accounts').where({ id }).first()).toMatchObject({
      display_name: 'a former member',
      email: `a former member ${id}`,
      confirmed_at: null,
      deleted_at: now,
    });
    for (const [table, column] of [
      ['bench_items', 'account_id'],
      ['sessions', 'account_id'],
      ['account_tokens', 'account_id'],
      ['mail_outbox', 'account_id'],
      ['editions', 'author_id'],
      ['write_ups', 'created_by'],
    ] as const)
      expect([table, await app.knex(table).where(column, id)]).toEqual([table, []]);
    await signInAs(member).expect(401);
    expect((await member.get('/api/account/session').expect(200)).body.account).toBeNull();
    await app
      .visitor()
      .post('/api/account/sign-up')
      .send({ email, displayName: 'New', password: 'a new long password' })
      .expect(202);
  });

  it('leaves what was published, under a former member', async () => {
    const member = await app.memberNamed('Gus Gauge');
    const other = await app.memberNamed('Other of Gus');
    const fix = plainFix();
    const { slug } = await publishNew(member, moderator, completeContent(joint, { fixes: [fix] }));
    const boss = await insertFeature(app.knex, joint.motor, 'boss');
    const revisionId = joint.motor.revisions[0]!.id;
    await member
      .post('/api/measurements')
      .send(reading(boss, revisionId, 'diameter', 22.5))
      .expect(201);
    await other
      .post(`/api/write-ups/${slug}/trials`)
      .send({ fixKey: fix.key, outcome: 'held', revisionIds: [revisionId], note: '', figure: null })
      .expect(201);
    await ask(other).expect(202);
    await ask(member).expect(202);

    await afterDays(7.1);

    const page = await pageOf(slug);
    expect(page.edition.author.displayName).toBe('a former member');
    expect(page.trials).toMatchObject([{ person: { displayName: 'a former member' }, outcome: 'held' }]);
    const measured = await app
      .visitor()
      .get(`/api/parts/${joint.motor.slug}/features/${boss.slug}/dimensions/diameter`)
      .expect(200);
    expect(JSON.stringify(measured.body)).toContain('a former member');
    expect(JSON.stringify([page, measured.body])).not.toContain('Gus Gauge');
  });

  it('takes the photos along that only its drafts showed, with their files', async () => {
    const member = await app.memberNamed('Hal Hone');
    const shown = await photoOf(member, 600);
    const inDraft = await photoOf(member, 610);
    const unused = await photoOf(member, 620);
    const { slug } = await publishNew(
      member,
      moderator,
      completeContent(joint, { photos: [photoUse(shown)] }),
    );
    await saveNewDraft(member, completeContent(joint, { photos: [photoUse(inDraft), photoUse(shown)] }));
    expect([shown, inDraft, unused].map(fileOf).map(existsSync)).toEqual([true, true, true]);
    await ask(member).expect(202);

    await afterDays(7.1);

    expect(await app.knex('photos').where('owner_id', member.account.id).pluck('id')).toEqual([shown.id]);
    expect([shown, inDraft, unused].map(fileOf).map(existsSync)).toEqual([true, false, false]);
    expect(await app.knex('photo_removals')).toEqual([]);
    expect((await pageOf(slug)).view.photos).toHaveLength(1);
  });

  it('leaves the file of a photo that somebody else sent as well', async () => {
    const [member, other] = [await app.memberNamed('Ida Indicator'), await app.memberNamed('Other of Ida')];
    const photo = await photoOf(member, 630);
    await photoOf(other, 630);
    await ask(member).expect(202);

    await afterDays(7.1);

    expect(existsSync(fileOf(photo))).toBe(true);
  });

  it('is noted in the log without the name that was', async () => {
    const member = await app.memberNamed('Jo Jig');
    await ask(member).expect(202);
    await afterDays(7.1);
    expect(
      await app.knex('audit_log').where({ action: 'account-deleted', subject_id: member.account.id }),
    ).toMatchObject([{ actor_id: null, subject_name: 'a former member' }]);
  });
});

describe('handing write-ups over', () => {
  async function offered(from: string, to: string) {
    const giver = await app.memberNamed(from);
    const taker = await app.memberNamed(to);
    const { slug } = await publishNew(giver, moderator, completeContent(joint));
    await ask(giver, { handOverTo: to }).expect(202);
    const [offer] = (await taker.get('/api/my/hand-overs').expect(200)).body.items;
    return { giver, taker, slug, offer };
  }
  const mayEdit = async (member: MemberAgent, slug: string): Promise<boolean> =>
    (await member.get(`/api/write-ups/${slug}`).expect(200)).body.mayEdit;

  it('asks the other one by mail and on their page', async () => {
    const { taker, slug, offer } = await offered('Kim Key', 'Lee Lathe');
    expect(offer).toMatchObject({ from: 'Kim Key', state: 'waiting', writeUps: [{ slug }] });
    expect(await mailsTo(taker)).toEqual(['Kim Key asks you to look after their write-ups']);
  });

  it('lets whoever takes them write the next editions once the giver is gone', async () => {
    const { giver, taker, slug, offer } = await offered('Max Mill', 'Ned Nut');
    await taker.post(`/api/my/hand-overs/${offer.id}/taken`).expect(200);
    expect((await status(giver)).handOver).toMatchObject({ addressedTo: 'Ned Nut', state: 'taken' });
    expect(await mayEdit(taker, slug)).toBe(false);

    await afterDays(7.1);

    expect(await mayEdit(taker, slug)).toBe(true);
    expect((await pageOf(slug)).edition.author.displayName).toBe('a former member');
    expect(await app.knex('hand_overs').where({ id: offer.id }).first()).toMatchObject({
      state: 'done',
      addressed_to: '',
    });
  });

  it('keeps the account for an answer, but not for longer than the offer stands', async () => {
    const { giver, taker, slug, offer } = await offered('Oda Oil', 'Pat Pin');

    await afterDays(7.1);
    await signInAs(giver).expect(200);
    await afterDays(7);

    await signInAs(giver).expect(401);
    expect(await mayEdit(taker, slug)).toBe(false);
    await taker.post(`/api/my/hand-overs/${offer.id}/taken`).expect(404);
  });

  it('can be declined, which the giver is told, and the write-ups stay', async () => {
    const { giver, taker, slug, offer } = await offered('Quin Quill', 'Ray Rack');
    const { body } = await taker.post(`/api/my/hand-overs/${offer.id}/declined`).expect(200);
    expect(body.items).toEqual([]);
    expect(await mailsTo(giver)).toContain('Your write-ups were not taken');

    await afterDays(7.1);

    expect((await pageOf(slug)).edition.author.displayName).toBe('a former member');
    expect(await mayEdit(taker, slug)).toBe(false);
  });

  it('is off when the deletion is called off, and nobody else can take it', async () => {
    const { giver, taker, offer } = await offered('Sue Saw', 'Tim Tap');
    const stranger = await app.memberNamed('Stranger');
    await stranger.post(`/api/my/hand-overs/${offer.id}/taken`).expect(404);

    await giver.delete('/api/account/deletion').expect(200);

    expect((await taker.get('/api/my/hand-overs').expect(200)).body.items).toEqual([]);
    await taker.post(`/api/my/hand-overs/${offer.id}/taken`).expect(404);
  });

  it('does not tell whether an address has an account', async () => {
    const taker = await app.memberNamed('Una Under');
    const [known, unknown] = [await app.memberNamed('Vic Vice'), await app.memberNamed('Wes Wedge')];

    const toKnown = await ask(known, { handOverTo: taker.account.email }).expect(202);
    const toNobody = await ask(unknown, { handOverTo: 'nobody@members.example' }).expect(202);

    expect({ ...toNobody.body.handOver, addressedTo: '' }).toEqual({
      ...toKnown.body.handOver,
      addressedTo: '',
    });
    expect(await mailsTo(taker)).toHaveLength(1);
  });
});

describe('the list of what becomes of things', () => {
  it('names every column of the database that names an account', async () => {
    const columns = await accountColumns(app.knex);
    expect(columns.filter((column) => !(column in whatBecomes))).toEqual([]);
    expect(Object.keys(whatBecomes).filter((column) => !columns.includes(column))).toEqual([]);
  });
});
