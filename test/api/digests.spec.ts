import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { WatchMail } from '../../server/mail/watch-mail.js';
import { unsubscribeToken } from '../../server/mail/unsubscribe-token.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { watchingOf, type Watching } from './support/watching.js';

let app: TestApp;
let ada: MemberAgent;
let motor: TestPart;
let bracket: TestPart;
let watching: Watching;
let now: Date;

beforeEach(async () => {
  now = new Date('2026-12-02T10:00:00Z');
  app = await startTestApp({ clock: () => now });
  ada = await app.memberNamed('Ada Winder');
  motor = await insertPart(app.knex, { name: 'Motor M' });
  bracket = await insertPart(app.knex, { name: 'Bracket K' });
  watching = watchingOf(app, () => now);
  for (const { id } of [motor, bracket]) await ada.put(`/api/watches/part/${id}`).expect(204);
});
afterEach(() => app.close());

const rhythm = (mailRhythm: string) => ada.patch('/api/account/profile').send({ mailRhythm }).expect(200);
const on = ({ id }: TestPart) => ({ about: { parts: [id] } });
const keys = (): Promise<string[]> => app.knex('mail_outbox').orderBy('id').pluck('dedupe_key');
const digestKey = (period: string) => `digest:${ada.account.id}:${period}`;
const at = async (instant: string): Promise<void> => {
  now = new Date(instant);
  await watching.tell();
  await watching.digest();
};

describe('a daily digest', () => {
  beforeEach(() => rhythm('daily'));

  it('comes once, at its hour, with what happened before it; the rest comes the day after', async () => {
    await watching.happen({ title: 'In the morning', ...on(motor) });
    await at('2026-12-02T15:59:59.999Z');
    expect(await keys()).toEqual([]);

    await at('2026-12-02T16:00:00Z');
    await watching.happen({ title: 'On the hour', ...on(motor) });
    await at('2026-12-02T20:00:00Z');
    expect(await keys()).toEqual([digestKey('day:2026-12-02')]);

    await at('2026-12-03T16:00:00Z');
    await at('2026-12-04T16:00:00Z');
    expect(await keys()).toEqual([digestKey('day:2026-12-02'), digestKey('day:2026-12-03')]);
    const texts: string[] = await app.knex('mail_outbox').orderBy('id').pluck('body_text');
    expect(texts.map((text) => [text.includes('In the morning'), text.includes('On the hour')])).toEqual([
      [true, false],
      [false, true],
    ]);
  });

  it('groups by what is watched, gathers readings and trials, and is not a line longer than what happened', async () => {
    for (let count = 0; count < 3; count += 1)
      await watching.happen({ kind: 'reading-recorded', path: `/parts/${motor.slug}`, ...on(motor) });
    await watching.happen({ kind: 'trial-reported', title: 'Trial of “Disc”', ...on(bracket) });
    await watching.happen({ kind: 'revision-added', title: 'Rev C <b>', ...on(motor) });
    await at('2026-12-02T16:00:00Z');

    const [mail] = await app.mailbox.waitFor(ada.account.email);

    expect(mail?.subject).toBe('Today on what you watch: 5 things happened');
    expect(mail?.text).toContain(
      `Motor M\n- 3 new readings\n  ${app.url}/parts/${motor.slug}\n- Rev C <b>\n  ${app.url}/hardware`,
    );
    expect(mail?.text).toContain('Bracket K\n- Trial of “Disc”\n');
    expect(mail?.html).toContain('<h2');
    expect(mail?.html).toContain('Rev C &lt;b&gt;');
    expect(mail?.headers['list-unsubscribe-post']).toBe('List-Unsubscribe=One-Click');
    expect(mail?.headers['list-unsubscribe']).toContain('/api/mail/unsubscribe?token=');
  });

  it('is not made when nothing happened', async () => {
    await at('2026-12-02T16:00:00Z');
    expect([await keys(), await app.knex('digests')]).toEqual([[], []]);
  });

  it('that breaks off is made whole the next time, and by three workers at once is made once', async () => {
    await watching.happen({ title: 'Told once', ...on(motor) });
    now = new Date('2026-12-02T16:00:00Z');
    await watching.tell();
    const dying: WatchMail = {
      ...watching.mail,
      async queueDigest(trx, digest) {
        await watching.mail.queueDigest(trx, digest);
        throw new Error('the process ended here');
      },
    };
    await expect(watching.digest(dying)).rejects.toThrow('the process ended here');
    expect(await keys()).toEqual([]);

    await Promise.all([watching.digest(), watching.digest(), watching.digest()]);

    expect(await keys()).toEqual([digestKey('day:2026-12-02')]);
    expect(await app.knex('notices').whereNull('mailed_at')).toEqual([]);
  });
});

describe('the other rhythms', () => {
  it('weekly: one on Monday for the whole week', async () => {
    await rhythm('weekly');
    await watching.happen({ title: 'On Wednesday', ...on(motor) });
    await at('2026-12-04T17:00:00Z');
    await watching.happen({ title: 'On Friday', ...on(bracket) });
    await at('2026-12-07T15:00:00Z');
    expect(await keys()).toEqual([]);

    await at('2026-12-07T16:00:00Z');

    expect(await keys()).toEqual([digestKey('week:2026-12-07')]);
    const { body_text: text } = await app.knex('mail_outbox').first('body_text');
    expect(text).toMatch(/On Wednesday[^]*On Friday/);
  });

  it('at once: what is gathered comes in the evening, what was mailed does not come again', async () => {
    await watching.happen({ kind: 'reading-recorded', title: 'A reading', ...on(motor) });
    await watching.happen({ kind: 'revision-added', title: 'Rev C', ...on(motor) });
    await at('2026-12-02T16:00:00Z');

    const mails = await app.knex('mail_outbox').orderBy('id').select('dedupe_key', 'body_text');
    expect(mails.map(({ dedupe_key: key }) => String(key).split(':')[0])).toEqual(['notice', 'digest']);
    expect(mails[1].body_text).toContain('A reading');
    expect(mails[1].body_text).not.toContain('Rev C');
  });

  it('none: nothing is mailed, nor is it later when mail is wanted again', async () => {
    await rhythm('daily');
    await watching.happen({ title: 'Waiting', ...on(motor) });
    await watching.tell();
    await rhythm('none');
    await watching.happen({ title: 'Not wanted', ...on(motor) });
    await at('2026-12-02T16:00:00Z');
    await rhythm('daily');
    await at('2026-12-03T16:00:00Z');

    expect(await keys()).toEqual([]);
    expect((await ada.get('/api/my/notices').expect(200)).body.items).toHaveLength(2);
  });
});

describe('the link at the foot of a mail', () => {
  const token = () => unsubscribeToken('a session secret for the tests only', ada.account.id);
  const choose = (body: object) =>
    app
      .visitor()
      .post('/api/mail/choices')
      .send({ token: token(), ...body });
  const choices = async (watch?: string) =>
    (
      await app
        .visitor()
        .get('/api/mail/choices')
        .query({ token: token(), ...(watch ? { watch } : {}) })
    ).body;

  it('names the watch the mail came from and ends just that', async () => {
    const watch = `part/${motor.id}`;
    expect(await choices(watch)).toEqual({
      rhythm: 'at-once',
      benchWatch: false,
      watch: { subject: 'part', id: motor.id, name: 'Motor M' },
    });

    await choose({ choice: 'end-watch', watch }).expect(204);

    expect((await choices(watch)).watch).toBeNull();
    expect((await ada.get('/api/my/watches/keys')).body.keys).toEqual([`part/${bracket.id}`]);
  });

  it('has it weekly instead, or not at all, and never more than before', async () => {
    await choose({ choice: 'weekly' }).expect(204);
    expect((await choices()).rhythm).toBe('weekly');
    await choose({ choice: 'none' }).expect(204);
    expect((await ada.get('/api/account/session')).body.account).toMatchObject({
      mailRhythm: 'none',
      noticeMail: false,
      safetyMail: true,
    });
    await choose({ choice: 'weekly' }).expect(204);
    expect((await choices()).rhythm).toBe('none');
  });

  it('ends what is told of the bench', async () => {
    await ada.patch('/api/account/profile').send({ benchWatch: true }).expect(200);
    await choose({ choice: 'end-watch', watch: 'bench' }).expect(204);
    expect((await ada.get('/api/account/session')).body.account.benchWatch).toBe(false);
  });

  it('does nothing with a token made up', async () => {
    const answer = await app
      .visitor()
      .post('/api/mail/choices')
      .send({ token: `${ada.account.id}.${'A'.repeat(43)}`, choice: 'none' });
    expect([answer.status, answer.body.type]).toEqual([422, '/problems/token-not-valid']);
    expect((await choices()).rhythm).toBe('at-once');
  });

  it('pressed by a mail program stops notices and digests, those that wait too', async () => {
    await watching.happen({ title: 'Waiting', ...on(motor) });
    await watching.tell();
    const { unsubscribe_url: address } = await app.knex('mail_outbox').first('unsubscribe_url');

    expect((await fetch(address, { method: 'POST' })).status).toBe(204);
    for (const worker of app.workers) worker.start();
    const end = Date.now() + 10_000;
    const waits = () => app.knex('mail_outbox').whereNull('given_up_at').whereNull('sent_at');
    while ((await waits()).length > 0 && Date.now() < end) await new Promise((done) => setTimeout(done, 50));

    expect(await app.knex('mail_outbox').pluck('sent_at')).toEqual([null]);
    expect(await app.mailbox.list(ada.account.email)).toEqual([]);
  });
});
