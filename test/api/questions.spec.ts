import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { emptySeat, worksheetVersion } from '../../shared/contract/worksheet.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart } from './support/catalogue.js';
import { completeContent, insertJoint, plainFix, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let asker: MemberAgent;
let other: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [asker, other] = await Promise.all([app.memberNamed('Asker'), app.memberNamed('Other')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const worksheet = {
  kind: 'seat',
  version: worksheetVersion,
  inputs: { ...emptySeat, bossDiameter: 32.1, recessDiameter: 32 },
  result: {
    sentence: 'The boss may not enter.',
    figures: [{ name: 'gap', label: 'Gap', value: 1.5, uncertainty: 0.02, unit: 'mm' }],
  },
};
const question = (over: object = {}) => ({
  title: 'Why does the bracket still rock?',
  text: 'It rocks about the *raised* lip, whatever I tighten.',
  parts: [
    { partId: joint.motor.id, revisionId: joint.motor.revisions[1]!.id },
    { partId: joint.bracket.id, revisionId: null },
  ],
  symptoms: [joint.symptom],
  readings: [{ dimension: 'lip diameter', value: 32.1, unit: 'mm', instrument: 'caliper' }],
  worksheet,
  ...over,
});
const ask = async (over: object = {}): Promise<string> =>
  (await asker.post('/api/questions').send(question(over)).expect(201)).body.slug;
const page = async (slug: string) => (await app.visitor().get(`/api/questions/${slug}`).expect(200)).body;
const list = async (query: string) => (await app.visitor().get(`/api/questions?${query}`).expect(200)).body;
const slugsOf = (body: { items: { slug: string }[] }) => body.items.map((item) => item.slug);
const fieldsOf = (body: { fields: { path: string }[] }) => body.fields.map((field) => field.path);

async function publish() {
  const fix = plainFix();
  const moderator = await app.as('moderator');
  return { fix, ...(await publishNew(other, moderator, completeContent(joint, { fixes: [fix] }))) };
}

describe('asking', () => {
  it('stands with its parts, revisions, symptoms, readings and worksheet for anybody to read', async () => {
    const { status, body } = await asker.post('/api/questions').send(question());
    expect(status).toBe(201);
    expect(body).toMatchObject({
      title: 'Why does the bracket still rock?',
      parts: [
        { part: { slug: joint.motor.slug }, revision: { label: 'Rev B' } },
        { part: { slug: joint.bracket.slug }, revision: null },
      ],
      symptoms: [{ slug: joint.symptom }],
      readings: [{ dimension: 'lip diameter', value: 32.1, unit: 'mm', instrument: 'caliper' }],
      worksheet,
      person: { id: asker.account.id, displayName: 'Asker' },
      replyCount: 0,
      settledBy: null,
      replies: [],
    });
    expect(body.slug).toMatch(/^why-does-the-bracket-still-rock-\d+$/);
    expect(body.text.html).toContain('<em>raised</em>');
    expect(await page(body.slug)).toEqual(body);
  });

  it('gives two questions of one title two addresses', async () => {
    expect(await ask()).not.toBe(await ask());
  });

  it('gives a title in other letters an address too', async () => {
    const slug = await ask({ title: 'Почему качается?' });
    expect(slug).toMatch(/^question-\d+$/);
    expect((await page(slug)).title).toBe('Почему качается?');
  });

  it.each([
    ['title', { title: 'Rocks' }],
    ['text', { text: 'Too short.' }],
    ['parts', { parts: [] }],
    ['parts.0.partId', { parts: [{ partId: 999_999_999, revisionId: null }] }],
    ['symptoms.0', { symptoms: ['no-such-symptom'] }],
    [
      'readings.0.value',
      { readings: [{ dimension: 'lip', value: 'wide', unit: 'mm', instrument: 'caliper' }] },
    ],
    ['worksheet.version', { worksheet: { ...worksheet, version: 99 } }],
  ])('is refused with the field %s named, and nothing is stored', async (path, over) => {
    const before = await app.knex('questions').count({ count: '*' });
    const { status, body } = await asker.post('/api/questions').send(question(over));
    expect(status).toBe(422);
    expect(fieldsOf(body)).toContain(path);
    expect(await app.knex('questions').count({ count: '*' })).toEqual(before);
  });

  it('is refused for a revision of another part and for a part named twice', async () => {
    const [motor, bracket] = [joint.motor, joint.bracket];
    const foreign = [{ partId: motor.id, revisionId: bracket.revisions[0]!.id }];
    const twice = [
      { partId: motor.id, revisionId: null },
      { partId: motor.id, revisionId: null },
    ];
    const answers = await Promise.all(
      [foreign, twice].map((parts) => asker.post('/api/questions').send(question({ parts })).expect(422)),
    );
    expect(answers.map(({ body }) => fieldsOf(body))).toEqual([['parts.0.revisionId'], ['parts.1']]);
  });

  it('makes hostile text harmless', async () => {
    const hostile =
      '<script>alert(1)</script> <img src=x onerror=alert(1)> [go](javascript:alert(1)) and more';
    const slug = await ask({ title: '<script>alert(1)</script>', text: hostile });
    await other.post(`/api/questions/${slug}/replies`).send({ text: hostile, worksheet: null }).expect(201);
    const { title, text, replies } = await page(slug);
    expect(title).toBe('<script>alert(1)</script>');
    for (const html of [text.html, replies[0].text.html])
      expect(html).not.toMatch(/<script|<[^>]+onerror|href="javascript/i);
  });
});

describe('the list', () => {
  it('shows the newest first, page after page', async () => {
    const part = await insertPart(app.knex);
    const parts = [{ partId: part.id, revisionId: null }];
    const [first, second, third] = [await ask({ parts }), await ask({ parts }), await ask({ parts })];
    const one = await list(`part=${part.slug}&limit=2`);
    expect(slugsOf(one)).toEqual([third, second]);
    const two = await list(`part=${part.slug}&limit=2&cursor=${one.next}`);
    expect([slugsOf(two), two.next]).toEqual([[first], null]);
  });

  it('is narrowed to a part and to what is open or settled', async () => {
    const part = await insertPart(app.knex);
    const parts = [{ partId: part.id, revisionId: part.revisions[0]!.id }];
    const [open, settled] = [await ask({ parts }), await ask({ parts })];
    const { slug, fix } = await publish();
    await asker
      .post(`/api/questions/${settled}/settled`)
      .send({ writeUpSlug: slug, fixKey: fix.key })
      .expect(200);
    expect(slugsOf(await list(`part=${part.slug}&open=true`))).toEqual([open]);
    expect(slugsOf(await list(`part=${part.slug}&open=false`))).toEqual([settled]);
  });

  it('names the field of a cursor that is none', async () => {
    const { status, body } = await app.visitor().get('/api/questions?cursor=nonsense');
    expect([status, fieldsOf(body)]).toEqual([422, ['cursor']]);
  });
});

describe('replying', () => {
  it('adds to the replies in the order of time, with a worksheet', async () => {
    const slug = await ask();
    const reply = (who: MemberAgent, text: string, sheet: object | null) =>
      who.post(`/api/questions/${slug}/replies`).send({ text, worksheet: sheet });
    const one = await reply(other, 'Lay a *disc* behind it.', worksheet);
    const two = await reply(asker, 'I will.', null);
    expect([one.status, two.status]).toEqual([201, 201]);
    expect(one.body).toMatchObject({ worksheet, person: { displayName: 'Other' } });
    const { replies, replyCount } = await page(slug);
    expect(replies).toEqual([one.body, two.body]);
    expect(replyCount).toBe(2);
  });

  it.each(['', '   ', 'x'.repeat(4001)])(
    'is refused with its text named where that is empty or too long',
    async (text) => {
      const slug = await ask();
      const { status, body } = await other
        .post(`/api/questions/${slug}/replies`)
        .send({ text, worksheet: null });
      expect([status, fieldsOf(body)]).toEqual([422, ['text']]);
      expect((await page(slug)).replies).toEqual([]);
    },
  );

  it('finds no question at an address that nobody asked', async () => {
    const { status } = await other
      .post('/api/questions/no-such-question/replies')
      .send({ text: 'Yes.', worksheet: null });
    expect(status).toBe(404);
  });
});

describe('what settled it', () => {
  it('is named by the asker and taken back again', async () => {
    const slug = await ask();
    const { slug: writeUpSlug, fix } = await publish();
    const { body } = await asker
      .post(`/api/questions/${slug}/settled`)
      .send({ writeUpSlug, fixKey: fix.key })
      .expect(200);
    expect(body.settledBy).toEqual({
      writeUpSlug,
      writeUpTitle: 'Bracket rocks on the raised lip',
      fixKey: fix.key,
      fixTitle: fix.title,
    });
    expect(await page(slug)).toEqual(body);
    await asker.delete(`/api/questions/${slug}/settled`).expect(200);
    expect((await page(slug)).settledBy).toBeNull();
  });

  it('is not for others to name or to take back', async () => {
    const slug = await ask();
    const { slug: writeUpSlug, fix } = await publish();
    const settled = { writeUpSlug, fixKey: fix.key };
    const named = await other.post(`/api/questions/${slug}/settled`).send(settled);
    expect([named.status, named.body.type]).toEqual([403, '/problems/not-allowed']);
    expect((await page(slug)).settledBy).toBeNull();
    await asker.post(`/api/questions/${slug}/settled`).send(settled).expect(200);
    await other.delete(`/api/questions/${slug}/settled`).expect(403);
    expect((await page(slug)).settledBy).not.toBeNull();
  });

  it('has to be a fix of a published edition', async () => {
    const slug = await ask();
    const { slug: writeUpSlug, fix } = await publish();
    const settle = (body: object) => asker.post(`/api/questions/${slug}/settled`).send(body).expect(422);
    const noWriteUp = await settle({ writeUpSlug: 'no-such-write-up', fixKey: fix.key });
    const noFix = await settle({ writeUpSlug, fixKey: 'no-such-fix' });
    expect([fieldsOf(noWriteUp.body), fieldsOf(noFix.body)]).toEqual([['writeUpSlug'], ['fixKey']]);
    expect((await page(slug)).settledBy).toBeNull();
  });
});
