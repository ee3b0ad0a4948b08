import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { SearchResults } from '../../shared/contract/search.js';
import { startTestApp, type Agent, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, insertSymptom, type TestPart } from './support/catalogue.js';
import { indexIsInStep } from './support/search.js';
import { completeContent, insertJoint, newKey, plainFix, publishNew } from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp({ search: true });
  author = await app.memberNamed('Author');
  moderator = await app.as('moderator');
});
afterAll(() => app.close());

async function searched(agent: Agent, query: Record<string, unknown>): Promise<SearchResults> {
  const answer = await agent.get('/api/search').query(query);
  expect(answer.status, JSON.stringify(answer.body)).toBe(200);
  return answer.body;
}

const slugsOf = (results: SearchResults): string[] => results.items.map((item) => item.slug);

/** A motor that other parts go on; each write-up of a scene is about it. */
interface Scene {
  readonly motor: TestPart;
  readonly bracket: TestPart;
  readonly symptom: string;
  readonly word: string;
  readonly slugs: Record<string, string>;
}

let scenes = 0;

/**
 * Four write-ups that share a word no other scene has: one holds for the motor's Rev A and was found not to for Rev B, one
 * holds for Rev B, one says nothing about either, one is about other parts.
 */
async function scene(): Promise<Scene> {
  const word = ['quibblet', 'zornak', 'vimplor', 'dascet', 'yurfel', 'hompric', 'wexlan'][scenes++]!;
  const motor = await insertPart(app.knex, {
    name: `Motor ${word}`,
    kind: 'focus-motor',
    revisions: ['Rev A', 'Rev B', 'Rev C'],
  });
  const bracket = await insertPart(app.knex, { name: `Bracket ${word}`, revisions: ['v1'] });
  const other = await insertPart(app.knex, { name: `Clamp ${word}`, kind: 'clamp', revisions: ['v1'] });
  const symptom = await insertSymptom(app.knex, `Symptom ${word}`);
  const [a, b, c] = motor.revisions.map((revision) => revision.id) as [number, number, number];
  const publish = async (
    title: string,
    part: TestPart,
    revisions: { revisionId: number; holds: boolean }[],
    fix: Parameters<typeof plainFix>[0] = {},
  ) => {
    const base = completeContent(
      { motor, bracket, symptom },
      { title: `${title} ${word}`, fixes: [plainFix({ key: newKey(), ...fix })] },
    );
    const content = {
      ...base,
      joints: [
        {
          a: { partId: part.id, feature: 'boss', revisions },
          b: {
            partId: bracket.id,
            feature: 'recess',
            revisions: [{ revisionId: bracket.revisions[0]!.id, holds: true }],
          },
        },
      ],
    };
    return (await publishNew(author, moderator, content)).slug;
  };
  const slugs = {
    forA: await publish('Alpha', motor, [
      { revisionId: a, holds: true },
      { revisionId: b, holds: false },
    ]),
    forB: await publish('Beta', motor, [{ revisionId: b, holds: true }], {
      kind: 'reposition',
      permanence: 'leaves-a-mark',
    }),
    silent: await publish('Gamma', motor, [{ revisionId: c, holds: true }]),
    elsewhere: await publish('Delta', other, [{ revisionId: other.revisions[0]!.id, holds: true }], {
      kind: 'swap',
    }),
  };
  await indexIsInStep(app);
  return { motor, bracket, symptom, word, slugs };
}

describe('what holds for the reader comes first', () => {
  test('when a visitor names a revision, then write-ups that hold for it come first, those for others and the rest last', async () => {
    const { word, slugs, motor } = await scene();
    const results = await searched(app.visitor(), { q: word, mine: motor.revisions[1]!.id });
    expect(slugsOf(results)[0]).toBe(slugs['forB']);
    expect(slugsOf(results)[1]).toBe(slugs['silent']);
    expect(slugsOf(results).slice(2).sort()).toEqual([slugs['forA'], slugs['elsewhere']].sort());
    expect(results.items.map((item) => item.applicability.verdict).slice(0, 2)).toEqual([
      'holds',
      'not-known',
    ]);
    const forOthers = results.items.find((item) => item.slug === slugs['forA']);
    expect(forOthers?.applicability).toEqual({
      verdict: 'written-for-others',
      reasons: [
        {
          verdict: 'written-for-others',
          part: motor.name,
          mine: { ...motor.revisions[1], partId: motor.id },
          holdsFor: ['Rev A'],
        },
      ],
    });
    expect(results.items.find((item) => item.slug === slugs['elsewhere'])?.applicability).toEqual({
      verdict: 'not-yours',
      reasons: [],
    });
    expect(results).toMatchObject({ total: 4, benchSize: 1, next: null });
  });

  test('when a member searches, then the bench on the server counts and the one in the address does not', async () => {
    const { word, slugs, motor } = await scene();
    const member = await app.memberNamed('Bench owner');
    await member
      .post('/api/bench')
      .send({ partId: motor.id, revisionId: motor.revisions[0]!.id })
      .expect(201);
    const results = await searched(member, { q: word, mine: motor.revisions[1]!.id });
    expect(slugsOf(results)[0]).toBe(slugs['forA']);
    expect(results.items[0]?.applicability.verdict).toBe('holds');
    expect(results.benchSize).toBe(1);
  });

  test('when a member has not said which revision it is, then nothing is said to hold or not to hold', async () => {
    const { word, motor, slugs } = await scene();
    const member = await app.memberNamed('Bench owner without revision');
    await member.post('/api/bench').send({ partId: motor.id, revisionId: null }).expect(201);
    const results = await searched(member, { q: word });
    expect(results.items.map((item) => item.applicability.verdict)).toEqual([
      'not-known',
      'not-known',
      'not-known',
      'not-yours',
    ]);
    expect(slugsOf(results)[3]).toBe(slugs['elsewhere']);
    expect(results.benchSize).toBe(0);
  });

  test('when pages are small, then they give each write-up once, in the same order as one large page', async () => {
    const { word, motor } = await scene();
    const whole = await searched(app.visitor(), { q: word, mine: motor.revisions[1]!.id });
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const page: SearchResults = await searched(app.visitor(), {
        q: word,
        mine: motor.revisions[1]!.id,
        limit: 1,
        ...(cursor ? { cursor } : {}),
      });
      expect(page.items).toHaveLength(1);
      expect(page.total).toBe(4);
      seen.push(...slugsOf(page));
      cursor = page.next ?? undefined;
    } while (cursor);
    expect(seen).toEqual(slugsOf(whole));
  });
});

describe('facets', () => {
  test('when a value is chosen, then its facet still counts the others and the other facets count what is left', async () => {
    const { word, slugs, motor } = await scene();
    const results = await searched(app.visitor(), { q: word, kind: 'shim', part: motor.slug });
    expect(slugsOf(results).sort()).toEqual([slugs['forA'], slugs['silent']].sort());
    expect(results.facets.kind).toEqual([
      { value: 'shim', label: 'Shim', count: 2 },
      { value: 'reposition', label: 'Reposition', count: 1 },
    ]);
    expect(results.facets.part.find((value) => value.value === motor.slug)).toEqual({
      value: motor.slug,
      label: motor.name,
      count: 2,
    });
    expect(results.facets.permanence).toEqual([{ value: 'reversible', label: 'reversible', count: 2 }]);
    expect(results.facets.standing).toEqual([{ value: 'told', label: 'told', count: 2 }]);
    expect(results.facets.symptom).toEqual([
      { value: expect.any(String), label: `Symptom ${word}`, count: 2 },
    ]);
    expect(results.facets.revision.map(({ label, count }) => ({ label, count }))).toEqual([
      { label: `${motor.name} Rev A`, count: 1 },
      { label: `${motor.name} Rev B`, count: 0 },
      { label: `${motor.name} Rev C`, count: 1 },
    ]);
  });

  test('when no part is chosen, then no revisions are offered', async () => {
    expect((await searched(app.visitor(), { q: 'quibblet' })).facets.revision).toEqual([]);
  });

  test('when a chosen value finds nothing, then it stands there with none, so that it can be left', async () => {
    const { word } = await scene();
    const results = await searched(app.visitor(), { q: word, standing: 'measured' });
    expect(results.items).toEqual([]);
    expect(results.facets.standing).toEqual([
      { value: 'told', label: 'told', count: 4 },
      { value: 'measured', label: 'measured', count: 0 },
    ]);
  });
});

describe('words', () => {
  test('when words match, then they are marked in title and excerpt, and nothing else is', async () => {
    const { slugs } = await scene();
    const word = 'hompric';
    const results = await searched(app.visitor(), { q: `alpha ${word} rocks` });
    const hit = results.items.find((item) => item.slug === slugs['forA']) ?? results.items[0]!;
    expect(hit.title.filter((run) => run.hit).map((run) => run.text.toLowerCase())).toContain('alpha');
    expect(hit.excerpt.some((run) => run.hit && /rock/i.test(run.text))).toBe(true);
    expect(JSON.stringify(hit)).not.toMatch(/[\uE000\uE001]/);
  });

  test('when a text holds markup, then it comes back as text', async () => {
    const { motor, bracket, symptom } = await scene();
    const content = completeContent(
      { motor, bracket, symptom },
      { title: 'Krumvet <img src=x onerror=alert(1)>', noticed: 'krumvet <script>alert(1)</script> here' },
    );
    await publishNew(author, moderator, content);
    await indexIsInStep(app);
    const [hit] = (await searched(app.visitor(), { q: 'krumvet' })).items;
    expect(hit?.title.map((run) => run.text).join('')).toBe('Krumvet <img src=x onerror=alert(1)>');
    expect(hit?.excerpt.map((run) => run.text).join('')).toContain('<script>alert(1)</script>');
  });

  test('when figures are written otherwise than in the write-up, then they are found, and figures one digit off are not', async () => {
    const joint = await insertJoint(app.knex);
    const revisionId = joint.motor.revisions[0]!.id;
    const figures = (lip: number, recess: number) =>
      [['raised lip diameter', lip] as const, ['recess diameter', recess] as const].map(
        ([dimension, value]) => ({
          key: newKey(),
          revisionId,
          dimension,
          value,
          unit: 'mm' as const,
          instrument: 'caliper' as const,
          uncertainty: 0.02,
        }),
      );
    const publish = (title: string, readings: ReturnType<typeof figures>) =>
      publishNew(author, moderator, completeContent(joint, { title, readings }));
    const wanted = await publish('Measured one', figures(31.73, 28.64));
    await publish('Measured other', figures(31.78, 28.69));
    await indexIsInStep(app);
    for (const q of ['31.73 lip 28.64 recess', '31,73mm lip', 'ø31.730', '1.249 in lip']) {
      expect(slugsOf(await searched(app.visitor(), { q }))[0], q).toBe(wanted.slug);
    }
    expect(slugsOf(await searched(app.visitor(), { q: '31.73' }))).toEqual([wanted.slug]);
  });

  test('when nothing is asked, then the newest come first', async () => {
    const results = await searched(app.visitor(), { limit: 50 });
    const days = results.items.map((item) => item.publishedAt);
    expect(days.length).toBeGreaterThan(3);
    expect(days).toEqual([...days].sort().reverse());
  });

  test('when nothing matches, then the list is empty and says so', async () => {
    expect(await searched(app.visitor(), { q: 'xqzvkjw' })).toMatchObject({
      items: [],
      total: 0,
      next: null,
    });
  });
});

describe('what cannot be taken', () => {
  test.each([
    [{ q: 'x'.repeat(201) }, 'q'],
    [{ part: 'no slug' }, 'part.0'],
    [{ part: '"] OR id > 0 OR partSlugs IN ["' }, 'part.0'],
    [{ revision: '1 OR 1=1' }, 'revision.0'],
    [{ kind: 'magic' }, 'kind.0'],
    [{ mine: '-3' }, 'mine.0'],
    [{ cursor: 'nonsense' }, 'cursor'],
    [{ limit: 51 }, 'limit'],
    [{ sort: 'id' }, 'sort'],
  ])('when the query is %j, then the field is named', async (query, path) => {
    const answer = await app.visitor().get('/api/search').query(query);
    expect(answer.status).toBe(422);
    expect(answer.body.fields[0].path).toBe(path);
  });

  test.each([
    '"',
    '""',
    '-',
    '\\',
    '%',
    "'; drop table parts; --",
    '\u0000',
    '🔭',
    '\uE000x\uE001',
    '"not closed',
    'a AND NOT OR (',
    '..',
    '*',
    '-lip',
  ])('when the words are %j, then there is an answer', async (q) => {
    expect([200, 422]).toContain((await app.visitor().get('/api/search').query({ q })).status);
  });
});
