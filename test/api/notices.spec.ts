import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { WatchMail } from '../../server/mail/watch-mail.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { throughAllPages } from './support/pages.js';
import { watchingOf, type Watching } from './support/watching.js';
import { completeContent, insertJoint, publishNew } from './support/write-ups.js';

let app: TestApp;
let ada: MemberAgent;
let bo: MemberAgent;
let part: TestPart;
let watching: Watching;
let now: Date;

beforeEach(async () => {
  now = new Date('2026-12-02T10:00:00Z');
  app = await startTestApp({ clock: () => now });
  ada = await app.memberNamed('Ada Winder');
  bo = await app.memberNamed('Bo Lathe');
  part = await insertPart(app.knex, { name: 'Motor M' });
  watching = watchingOf(app, () => now);
});
afterEach(() => app.close());

interface Told {
  readonly id: number;
  readonly title: string;
  readonly because: string;
  readonly read: boolean;
  readonly safety: boolean;
  readonly about: { name: string } | null;
}
const noticesOf = async (member: MemberAgent, query: object = {}): Promise<Told[]> =>
  (await member.get('/api/my/notices').query(query).expect(200)).body.items;
const titlesOf = async (member: MemberAgent, query?: object): Promise<string[]> =>
  (await noticesOf(member, query)).map(({ title }) => title);
const mails = () => app.knex('mail_outbox').orderBy('id').select('dedupe_key', 'category', 'body_text');
const watch = (member: MemberAgent, subject: string, id: number) =>
  member.put(`/api/watches/${subject}/${id}`).expect(204);
const agreeToBench = (member: MemberAgent) =>
  member.patch('/api/account/profile').send({ benchWatch: true }).expect(200);
const own = (member: MemberAgent, revisionId: number | null) =>
  member.post('/api/bench').send({ partId: part.id, revisionId }).expect(201);

describe('what happens', () => {
  it('is told to who watches the part, a revision of it or the question, but not to who did it', async () => {
    await watch(ada, 'part', part.id);
    await watch(bo, 'revision', part.revisions[0]!.id);
    await watching.happen({ title: 'On Rev A', about: { revisions: [part.revisions[0]!.id] } });
    await watching.happen({ title: 'On Rev B', about: { revisions: [part.revisions[1]!.id] } });
    await watching.happen({ title: 'By Ada', about: { parts: [part.id] }, actorId: ada.account.id });

    await watching.tell();

    expect(await titlesOf(ada)).toEqual(['On Rev B', 'On Rev A']);
    expect(await noticesOf(bo)).toMatchObject([
      { title: 'On Rev A', because: 'watch', about: { name: 'Motor M Rev A' } },
    ]);
  });

  it('is told once to who is reached in several ways, in the app and by mail', async () => {
    await watch(ada, 'part', part.id);
    await watch(ada, 'revision', part.revisions[0]!.id);
    await own(ada, part.revisions[0]!.id);
    await agreeToBench(ada);
    await watching.happen({
      about: { parts: [part.id], revisions: [part.revisions[0]!.id] },
      people: [{ accountId: ada.account.id, atOnce: false }],
    });

    await watching.tell();

    expect(await noticesOf(ada)).toMatchObject([{ because: 'person' }]);
    expect(await mails()).toHaveLength(1);
  });

  it('reaches a joint’s watchers through a write-up on its two parts', async () => {
    const joint = await insertJoint(app.knex);
    const published = await publishNew(bo, await app.as('moderator'), completeContent(joint));
    const features = await Promise.all(
      [joint.motor, joint.bracket].map(async ({ id }, index) => {
        const [featureId] = await app.knex('features').insert({
          part_id: id,
          slug: `face-${index}`,
          name: 'Face',
          kind: index === 0 ? 'boss' : 'recess',
          process: 'machined',
        });
        return featureId!;
      }),
    );
    const [jointId] = await app.knex('joints').insert({
      slug: 'lip-in-recess',
      name: 'Lip in recess',
      kind: 'boss-recess',
      feature_a: features[0],
      feature_b: features[1],
    });
    await watch(ada, 'joint', jointId!);
    await watching.happen({ title: 'A trial', about: { writeUps: [published.writeUpId] } });

    await watching.tell();

    expect(await noticesOf(ada)).toMatchObject([
      { title: 'A trial', about: { name: 'Lip in recess' } },
      { title: 'New: Bracket rocks on the raised lip', about: { name: 'Lip in recess' } },
    ]);
  });
});

describe('owners', () => {
  it('are told of their bench only once they agreed, and no longer when they take it back', async () => {
    await own(ada, null);
    expect((await ada.get('/api/account/session')).body.account.benchWatch).toBeNull();
    await watching.happen({ title: 'Before', about: { parts: [part.id] } });
    await watching.tell();
    await agreeToBench(ada);
    await watching.happen({ title: 'Between', about: { parts: [part.id] } });
    await watching.tell();
    await ada.patch('/api/account/profile').send({ benchWatch: false }).expect(200);
    await watching.happen({ title: 'After', about: { parts: [part.id] } });
    await watching.tell();

    expect(await titlesOf(ada)).toEqual(['Between']);
  });

  it('hear of a revision if they have it or do not know which they have, and of the part in any case', async () => {
    const cy = await app.memberNamed('Cy Unsure');
    await own(ada, part.revisions[0]!.id);
    await own(bo, part.revisions[1]!.id);
    await own(cy, null);
    for (const owner of [ada, bo, cy]) await agreeToBench(owner);
    await watching.happen({
      title: 'Reading on Rev A',
      about: { parts: [part.id], revisions: [part.revisions[0]!.id] },
    });
    await watching.happen({ title: 'A new revision', about: { parts: [part.id] } });

    await watching.tell();

    expect(await titlesOf(ada)).toEqual(['A new revision', 'Reading on Rev A']);
    expect(await titlesOf(bo)).toEqual(['A new revision']);
    expect(await titlesOf(cy)).toEqual(['A new revision', 'Reading on Rev A']);
    expect((await noticesOf(ada))[0]).toMatchObject({ because: 'bench', about: { name: 'Motor M Rev A' } });
  });
});

describe('telling', () => {
  it('that breaks off between its steps leaves no trace, and tells each once when it is done again', async () => {
    await watch(ada, 'part', part.id);
    await watch(bo, 'part', part.id);
    await watching.happen({ about: { parts: [part.id] } });
    const dying: WatchMail = {
      ...watching.mail,
      async queueNotices(trx, notices) {
        await watching.mail.queueNotices(trx, notices);
        throw new Error('the process ended here');
      },
    };

    await expect(watching.tell(dying)).rejects.toThrow('the process ended here');
    expect(await app.knex('notices')).toEqual([]);
    expect(await mails()).toEqual([]);

    await watching.tell();
    await watching.tell();
    expect([await titlesOf(ada), await titlesOf(bo)].map(({ length }) => length)).toEqual([1, 1]);
    expect(await mails()).toHaveLength(2);
  });

  it('by three workers at once tells each person of each event once', async () => {
    await watch(ada, 'part', part.id);
    await watch(bo, 'part', part.id);
    for (let event = 0; event < 12; event += 1) await watching.happen({ about: { parts: [part.id] } });

    await Promise.all([watching.tell(), watching.tell(), watching.tell()]);
    // Whoever found every waiting event in other hands has stopped; what is left is told now.
    await watching.tell();

    expect(await app.knex('happenings').whereNull('told_at')).toEqual([]);
    expect(await app.knex('notices')).toHaveLength(24);
    const keys = (await mails()).map((mail) => mail.dedupe_key);
    expect([keys.length, new Set(keys).size]).toEqual([24, 24]);
  });

  it('sends exactly one mail of a published write-up to its watcher, through the app’s own workers', async () => {
    const joint = await insertJoint(app.knex);
    await watch(ada, 'part', joint.motor.id);
    await watch(ada, 'part', joint.bracket.id);
    const { slug } = await publishNew(bo, await app.as('moderator'), completeContent(joint));

    const [mail] = await app.mailbox.waitFor(ada.account.email);
    await Promise.all(app.workers.map((worker) => worker.stop()));

    expect(await app.mailbox.list(ada.account.email)).toHaveLength(1);
    expect(mail?.text).toContain(`${app.url}/write-ups/${slug}`);
    expect(mail?.text).toContain('You get this because you watch');
    expect(mail?.headers['list-unsubscribe-post']).toBe('List-Unsubscribe=One-Click');
  });

  it('mails readings and trials to nobody at once', async () => {
    await watch(ada, 'part', part.id);
    await watching.happen({ kind: 'reading-recorded', about: { parts: [part.id] } });
    await watching.happen({ kind: 'trial-reported', about: { parts: [part.id] } });
    await watching.happen({ kind: 'revision-added', title: 'Rev C', about: { parts: [part.id] } });

    await watching.tell();

    expect(await noticesOf(ada)).toHaveLength(3);
    expect((await mails()).map(({ body_text: text }) => String(text).includes('Rev C'))).toEqual([true]);
  });
});

describe('a caution on a fix that somebody tried', () => {
  const caution = () =>
    watching.happen({
      kind: 'caution-placed',
      title: 'WARNING: sharp edge',
      people: [{ accountId: ada.account.id, atOnce: true }],
    });

  it('is mailed at once to who wants no mail, with why it comes and without a one-click stop', async () => {
    await ada.patch('/api/account/profile').send({ mailRhythm: 'none', noticeMail: false }).expect(200);
    await caution();
    await watching.tell();

    const [mail] = await app.mailbox.waitFor(ada.account.email);

    expect(mail?.subject).toBe('WARNING: sharp edge');
    expect(mail?.text).toContain('whatever rhythm you chose, because you tried the fix');
    expect(mail?.headers).not.toHaveProperty('list-unsubscribe');
    expect(await noticesOf(ada)).toMatchObject([{ safety: true, because: 'person' }]);
  });

  it('is not mailed to who refused just that, and stands among the notices', async () => {
    await ada.patch('/api/account/profile').send({ mailRhythm: 'none', safetyMail: false }).expect(200);
    await caution();
    await watching.tell();

    expect(await mails()).toEqual([]);
    expect(await titlesOf(ada)).toEqual(['WARNING: sharp edge']);
  });
});

describe('the page of notices', () => {
  beforeEach(async () => {
    await watch(ada, 'part', part.id);
    await own(ada, null);
    for (const title of ['First', 'Second', 'Third'])
      await watching.happen({ title, about: { parts: [part.id] } });
    await watching.happen({
      title: 'For Ada',
      people: [{ accountId: ada.account.id, atOnce: false }],
    });
    await watching.tell();
  });

  it('goes through all of them once, the newest first, and narrows to a kind', async () => {
    const all = await throughAllPages<Told>(ada, '/api/my/notices');
    expect(all.map(({ title }) => title)).toEqual(['For Ada', 'Third', 'Second', 'First']);
    expect(await titlesOf(ada, { about: 'person' })).toEqual(['For Ada']);
    expect(await titlesOf(ada, { about: 'part' })).toEqual(['Third', 'Second', 'First']);
    expect(await titlesOf(ada, { about: 'bench' })).toEqual([]);
  });

  it('counts what is unread, marks some or all up to one read, and takes a marking back', async () => {
    const unread = async () => (await ada.get('/api/my/notices/count').expect(200)).body.unread;
    const [newest, third] = await noticesOf(ada);
    expect(await unread()).toBe(4);

    await ada
      .post('/api/my/notices/read')
      .send({ ids: [newest!.id] })
      .expect(200);
    expect(await unread()).toBe(3);
    now = new Date(now.getTime() + 1000);
    const { body } = await ada.post('/api/my/notices/read').send({ through: third!.id }).expect(200);
    expect(await unread()).toBe(0);

    await ada.post('/api/my/notices/unread').send({ readAt: body.readAt }).expect(204);
    expect(await titlesOf(ada, { unread: 'true' })).toEqual(['Third', 'Second', 'First']);
  });

  it('is nobody else’s to read or mark', async () => {
    const [first] = await noticesOf(ada);
    expect(await noticesOf(bo)).toEqual([]);
    await bo
      .post('/api/my/notices/read')
      .send({ ids: [first!.id] })
      .expect(200);
    expect((await ada.get('/api/my/notices/count').expect(200)).body.unread).toBe(4);
  });
});
