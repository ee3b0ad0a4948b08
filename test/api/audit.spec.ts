import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { AuditLine } from '../../shared/contract/audit.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { throughAllPages } from './support/pages.js';
import { cautionFor, completeContent, insertJoint, knifeFix, publishNew } from './support/write-ups.js';

let app: TestApp;
let administrator: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [administrator, moderator] = await Promise.all([app.as('administrator'), app.as('moderator')]);
});
afterAll(() => app.close());

const insert = (over: object = {}) =>
  app.knex('audit_log').insert({
    at: new Date('2026-03-04T23:59:59.999Z'),
    actor_id: moderator.account.id,
    action: 'edition-returned',
    subject_kind: 'edition',
    subject_id: 999_999_999,
    subject_name: 'A thing',
    reason: '',
    details: null,
    ...over,
  });
const found = (query: string) => throughAllPages<AuditLine>(administrator, `/api/admin/audit?${query}`);
const exported = async (query: string) => {
  const answer = await administrator
    .get(`/api/admin/audit/export?${query}`)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks).toString('utf8')));
    });
  return { headers: answer.headers, status: answer.status, text: String(answer.body) };
};

describe('the audit log', () => {
  it('is only added to: the database refuses to change or delete an entry', async () => {
    const [id] = await insert({ subject_name: 'Stays as it is' });
    await expect(app.knex('audit_log').where({ id }).update({ reason: 'Another.' })).rejects.toThrow(
      /only added to/,
    );
    await expect(app.knex('audit_log').where({ id }).delete()).rejects.toThrow(/only added to/);
    expect(await app.knex('audit_log').where({ id }).first()).toMatchObject({ reason: '' });
  });

  it('lists the newest first, each once over small pages, with its details in words', async () => {
    const name = `Paged ${Date.now()}`;
    for (const number of [1, 2, 3])
      await insert({
        subject_name: `${name} ${number}`,
        details: JSON.stringify({ from: 'member', to: 'maker' }),
      });
    const lines = await found(`words=${encodeURIComponent(name)}`);
    expect(lines.map((line) => line.subject.name)).toEqual([`${name} 3`, `${name} 2`, `${name} 1`]);
    expect(lines[0]).toMatchObject({
      actor: { displayName: 'Test moderator' },
      details: ['from: member', 'to: maker'],
    });
  });

  it('is searched by who, action, kind, words of name or reason, and days, all together', async () => {
    const mark = `mark${Date.now()}`;
    const member = await app.memberNamed(`Doer ${mark}`);
    await insert({ subject_name: `${mark} named`, actor_id: member.account.id });
    await insert({ reason: `Because of ${mark}`, action: 'edition-published' });
    await insert({
      subject_name: `${mark} later`,
      at: new Date('2026-03-05T00:00:00.000Z'),
      subject_kind: 'part',
    });
    const names = async (query: string) =>
      (await found(`words=${mark}&${query}`)).map((line) => line.subject.name);

    expect(await names('')).toEqual([`${mark} later`, 'A thing', `${mark} named`]);
    expect(await names(`who=${encodeURIComponent(`Doer ${mark}`)}`)).toEqual([`${mark} named`]);
    expect(await names('action=edition-published')).toEqual(['A thing']);
    expect(await names('kind=part')).toEqual([`${mark} later`]);
    expect(await names('to=2026-03-04')).toEqual(['A thing', `${mark} named`]);
    expect(await names('from=2026-03-05')).toEqual([`${mark} later`]);
    expect(await names('from=2026-03-04&to=2026-03-04&action=edition-returned')).toEqual([`${mark} named`]);
    expect(await names('who=%25')).toEqual([]);
  });

  it('refuses a day that is none and a field that it does not know', async () => {
    expect((await administrator.get('/api/admin/audit?from=2026-02-31')).status).toBe(422);
    expect((await administrator.get('/api/admin/audit?colour=red')).status).toBe(422);
    expect((await administrator.get('/api/admin/audit?cursor=nowhere')).status).toBe(422);
  });
});

describe('the exported log', () => {
  it('is CSV by RFC 4180 whose cells no spreadsheet takes for formulas', async () => {
    const mark = `csv${Date.now()}`;
    await insert({ subject_name: '=cmd|calc', reason: `${mark}, "quoted"\nsecond line` });
    const { headers, text } = await exported(`form=csv&words=${mark}`);
    expect(headers['content-type']).toContain('text/csv');
    expect(headers['content-disposition']).toMatch(/^attachment; filename="audit-\d{4}-\d\d-\d\d\.csv"$/);
    const [head, ...rest] = text.split('\r\n');
    expect(head).toBe('\uFEFFid,at,who id,who,action,in words,kind,thing id,thing,reason,details');
    expect(rest).toHaveLength(2);
    expect(rest[0]).toContain(
      `,edition-returned,edition returned,edition,999999999,'=cmd|calc,"${mark}, ""quoted""\nsecond line",`,
    );
    expect(rest[1]).toBe('');
  });

  it('is JSON Lines with every entry that the filter finds, the oldest first, over several batches', async () => {
    const mark = `jsonl${Date.now()}`;
    const rows = Array.from({ length: 1203 }, (_, index) => ({
      at: new Date(),
      actor_id: null,
      action: 'edition-returned',
      subject_kind: 'edition',
      subject_id: 500_000_000 + index,
      subject_name: mark,
      reason: '',
    }));
    await app.knex.batchInsert('audit_log', rows, 500);
    const { headers, text } = await exported(`form=jsonl&words=${mark}`);
    expect(headers['content-type']).toContain('application/jsonl');
    const lines = text
      .trimEnd()
      .split('\n')
      .map((line) => JSON.parse(line) as AuditLine);
    expect(lines.map((line) => line.subject.id)).toEqual(rows.map((row) => row.subject_id));
    expect(lines[0]!.actor).toBeNull();
  });

  it('is the head alone where nothing is found, and refuses a form that it does not know', async () => {
    const { text } = await exported('form=csv&words=nothing-has-these-words');
    expect(text.split('\r\n')).toHaveLength(2);
    expect((await exported('form=jsonl&words=nothing-has-these-words')).text).toBe('');
    expect((await administrator.get('/api/admin/audit/export?form=xml')).status).toBe(422);
  });
});

describe('what the log has on one thing', () => {
  it('is read by moderators: of a write-up also what happened to its editions and cautions', async () => {
    const author = await app.memberNamed('Author');
    const joint = await insertJoint(app.knex);
    const fix = knifeFix();
    const { slug, writeUpId } = await publishNew(
      author,
      moderator,
      completeContent(joint, { fixes: [fix] }),
      [cautionFor(fix.key, 'blade')],
    );
    await moderator
      .post(`/api/desk/write-ups/${slug}/withdraw`)
      .send({ reason: 'It is not right any more.', instead: null })
      .expect(200);

    const { items } = (await moderator.get(`/api/desk/audit/write-up/${writeUpId}`).expect(200)).body;

    expect(items.map((line: AuditLine) => line.action)).toEqual([
      'write-up-withdrawn',
      'edition-published',
      'caution-placed',
    ]);
    expect((await author.get(`/api/desk/audit/write-up/${writeUpId}`)).status).toBe(403);
  });

  it('names the actions and kinds there are for the filter', async () => {
    await insert();
    const { body } = await administrator.get('/api/admin/audit/names').expect(200);
    expect(body.actions).toContain('edition-returned');
    expect(body.kinds).toContain('edition');
  });
});
