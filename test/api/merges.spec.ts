import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import { fromJson } from '../../server/rows.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { insertFeature, insertJointOf, reading, record, type TestFeature } from './support/features.js';
import { insertMark } from './support/marks.js';
import { completeContent, insertJoint, publishNew, saveNewDraft } from './support/write-ups.js';

let app: TestApp;
let member: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [member, moderator] = await Promise.all([app.memberNamed('Owner'), app.as('moderator')]);
});
afterAll(() => app.close());

const merge = (kind: 'part' | 'revision' | 'feature', from: number, into: number, revisionMap?: object[]) =>
  moderator.post('/api/desk/merges').send({ kind, from, into, ...(revisionMap && { revisionMap }) });
const revisionId = (part: TestPart, at: number): number => part.revisions[at]!.id;
const bench = (who: MemberAgent, part: TestPart, revision: number | null) =>
  who.post('/api/bench').send({ partId: part.id, revisionId: revision }).expect(201);
const benchOf = async (who: MemberAgent): Promise<[string, string | null][]> =>
  (await who.get('/api/bench').expect(200)).body.items.map(
    (item: { part: { slug: string }; revision: { label: string } | null }) => [
      item.part.slug,
      item.revision?.label ?? null,
    ],
  );
const pageOf = async (slug: string) => (await app.visitor().get(`/api/parts/${slug}`).expect(200)).body;
const report = (who: MemberAgent, joint: string, a: number, b: number, sat: boolean) =>
  who.post(`/api/joints/${joint}/reports`).send({ revisionA: a, revisionB: b, sat, note: '' }).expect(201);
const contentOf = async (editionId: number): Promise<EditionContent> => {
  const row = await app.knex('editions').where('id', editionId).first('content');
  return typeof row.content === 'string' ? JSON.parse(row.content) : row.content;
};

/** The same part twice, each with a recess; the duplicate's Rev A is the other's Rev A, its Rev X is missing there. */
async function twice(): Promise<{ kept: TestPart; gone: TestPart; map: { from: number; into: number }[] }> {
  const kept = await insertPart(app.knex, { revisions: ['Rev A', 'Rev B'] });
  const gone = await insertPart(app.knex, { revisions: ['Rev A', 'Rev X'] });
  return { kept, gone, map: [{ from: revisionId(gone, 0), into: revisionId(kept, 0) }] };
}

describe('merging a part into another', () => {
  it('leads from its old address, and from those that led there before, to the one that stays', async () => {
    const { kept, gone, map } = await twice();
    const last = await insertPart(app.knex, { revisions: ['v1'] });
    await merge('part', gone.id, kept.id, map).expect(200, { slug: kept.slug });
    await merge('part', kept.id, last.id).expect(200, { slug: last.slug });
    for (const slug of [gone.slug, kept.slug]) {
      expect((await pageOf(slug)).slug).toBe(last.slug);
      const { body } = await app.visitor().get(`/api/parts/${slug}/which-one`).expect(200);
      expect(body.part.slug).toBe(last.slug);
    }
  });

  it('answers at the old address with the measurements and readings of the part that stays', async () => {
    const { kept, gone, map } = await twice();
    const recess = await insertFeature(app.knex, kept, 'recess');
    await record(member, reading(recess, revisionId(kept, 0), 'diameter', 19.5));
    await merge('part', gone.id, kept.id, map).expect(200);
    for (const path of ['measurements', `features/${recess.slug}/dimensions/diameter`]) {
      const [old, now] = await Promise.all(
        [gone.slug, kept.slug].map((slug) => app.visitor().get(`/api/parts/${slug}/${path}`).expect(200)),
      );
      expect(old!.body).toEqual(now!.body);
      expect(JSON.stringify(old!.body)).toContain('19.5');
    }
    await app.visitor().get('/api/parts/never-was-there/measurements').expect(404);
  });

  it('moves revisions that are not the other’s behind them on the time line', async () => {
    const { kept, gone, map } = await twice();
    await merge('part', gone.id, kept.id, map).expect(200);
    const labels = (await pageOf(kept.slug)).revisions.map((revision: { label: string }) => revision.label);
    expect(labels).toEqual(['Rev A', 'Rev B', 'Rev X']);
  });

  it('moves benches, and leaves one entry where both parts stood on one in the same revision', async () => {
    const { kept, gone, map } = await twice();
    const [both, one] = [await app.memberNamed('Both'), await app.memberNamed('One')];
    await bench(both, kept, revisionId(kept, 0));
    await bench(both, gone, revisionId(gone, 0));
    await bench(both, gone, null);
    await bench(one, gone, revisionId(gone, 1));
    await merge('part', gone.id, kept.id, map).expect(200);
    expect(await benchOf(both)).toEqual([
      [kept.slug, 'Rev A'],
      [kept.slug, null],
    ]);
    expect(await benchOf(one)).toEqual([[kept.slug, 'Rev X']]);
  });

  it('puts readings of the same feature together and makes the consensus anew; another feature moves over', async () => {
    const { kept, gone, map } = await twice();
    const recess = await insertFeature(app.knex, kept, 'recess');
    const same = await insertFeature(app.knex, gone, 'recess');
    await app.knex('features').where('id', same.id).update({ slug: recess.slug });
    const boss = await insertFeature(app.knex, gone, 'boss');
    await record(
      member,
      reading(recess, revisionId(kept, 0), 'diameter', 19.5),
      reading(same, revisionId(gone, 0), 'diameter', 19.6),
      reading(boss, revisionId(gone, 1), 'diameter', 22.5),
    );
    await merge('part', gone.id, kept.id, map).expect(200);
    const { body } = await app.visitor().get(`/api/parts/${kept.slug}/measurements`).expect(200);
    const known = body.features.flatMap(
      (feature: {
        id: number;
        revisions: { revision: { label: string }; dimensions: { consensus: object }[] }[];
      }) =>
        feature.revisions.flatMap(({ revision, dimensions }) =>
          dimensions.map(({ consensus }) => [feature.id, revision.label, consensus]),
        ),
    );
    expect(known).toHaveLength(2);
    expect(known).toContainEqual([
      recess.id,
      'Rev A',
      expect.objectContaining({ count: 2, mean: expect.closeTo(19.55, 6) }),
    ]);
    expect(known).toContainEqual([boss.id, 'Rev X', expect.objectContaining({ count: 1, mean: 22.5 })]);
  });

  it('moves marks, and puts answers to the same words together', async () => {
    const { kept, gone, map } = await twice();
    await insertMark(app.knex, kept, 'screw on the left', [true, null]);
    await insertMark(app.knex, gone, 'screw on the left', [false, true]);
    await insertMark(app.knex, gone, 'grey anodizing', [null, true]);
    await merge('part', gone.id, kept.id, map).expect(200);
    const { body } = await app.visitor().get(`/api/parts/${kept.slug}/which-one`).expect(200);
    const [a, x] = [revisionId(kept, 0), revisionId(gone, 1)];
    expect(
      body.marks.map(({ text, revisions }: { text: string; revisions: object }) => [text, revisions]),
    ).toEqual([
      [
        'screw on the left',
        [
          { revisionId: a, shows: true },
          { revisionId: x, shows: true },
        ],
      ],
      ['grey anodizing', [{ revisionId: x, shows: true }]],
    ]);
  });

  it('is refused where both have a label that nothing is said of, and changes nothing', async () => {
    const { kept, gone } = await twice();
    const { body } = await merge('part', gone.id, kept.id).expect(422);
    expect(body.fields[0]).toMatchObject({
      path: 'revisionMap',
      message: 'leaves out Rev A, which both parts have',
    });
    expect((await pageOf(gone.slug)).id).toBe(gone.id);
  });

  it.each([
    ['itself', async (a: TestPart) => [a.id, a.id, []], 'into'],
    ['a part that is not there', async (a: TestPart) => [a.id, 999_999_999, []], 'into'],
    [
      'a map from another part’s revision',
      async (a: TestPart, b: TestPart) => [a.id, b.id, [{ from: revisionId(b, 0), into: revisionId(b, 0) }]],
      'revisionMap.0.from',
    ],
    [
      'a map to its own revision',
      async (a: TestPart, b: TestPart) => [a.id, b.id, [{ from: revisionId(a, 0), into: revisionId(a, 1) }]],
      'revisionMap.0.into',
    ],
  ] as const)('is refused with %s, naming the field', async (_, make, path) => {
    const [a, b] = [await insertPart(app.knex), await insertPart(app.knex)];
    const [from, into, map] = (await make(a, b)) as [number, number, object[]];
    expect((await merge('part', from, into, map).expect(422)).body.fields[0].path).toBe(path);
  });
});

describe('write-ups on what is merged', () => {
  it('name the part and the revision that stay, in every edition, and are indexed anew', async () => {
    const joint = await insertJoint(app.knex);
    const kept = await insertPart(app.knex, { kind: 'focus-motor', revisions: ['Rev A', 'Rev B'] });
    const content = completeContent(joint);
    const published = await publishNew(member, moderator, content);
    const draft = await saveNewDraft(member, content);
    await app.knex('search_outbox').delete();
    const map = [
      { from: revisionId(joint.motor, 0), into: revisionId(kept, 0) },
      { from: revisionId(joint.motor, 1), into: revisionId(kept, 1) },
    ];
    await merge('part', joint.motor.id, kept.id, map).expect(200);

    for (const id of [published.editionId, draft.id]) {
      const { joints } = await contentOf(id);
      expect(joints[0]!.a).toMatchObject({
        partId: kept.id,
        revisions: [
          { revisionId: revisionId(kept, 0), holds: true },
          { revisionId: revisionId(kept, 1), holds: false },
        ],
      });
      expect(joints[0]!.b).toEqual(content.joints[0]!.b);
    }
    expect(await app.knex('search_outbox').pluck('write_up_id')).toEqual([published.writeUpId]);
    expect((await pageOf(kept.slug)).writeUps).toEqual([
      expect.objectContaining({ slug: published.slug, holdsFor: ['Rev A'], notFor: ['Rev B'] }),
    ]);
    await app.visitor().get(`/api/write-ups/${published.slug}`).expect(200);
  });

  it('tell a draft’s author who saves the old text that it has moved on', async () => {
    const joint = await insertJoint(app.knex);
    const kept = await insertPart(app.knex, { revisions: ['Other'] });
    const content = completeContent(joint);
    const draft = await saveNewDraft(member, content);
    await merge('part', joint.motor.id, kept.id).expect(200);
    const { status } = await member
      .put(`/api/drafts/${draft.id}`)
      .set('If-Match', `"${draft.version}"`)
      .send({ content, changeNote: '' });
    expect(status).toBe(412);
  });

  it('hold for a revision where either of the merged ones was marked so', async () => {
    const joint = await insertJoint(app.knex);
    const { slug, editionId } = await publishNew(member, moderator, completeContent(joint));
    await merge('revision', revisionId(joint.motor, 0), revisionId(joint.motor, 1)).expect(200);
    const { writeUps } = await pageOf(joint.motor.slug);
    expect(writeUps).toEqual([expect.objectContaining({ slug, holdsFor: ['Rev B'], notFor: [] })]);
    expect((await contentOf(editionId)).joints[0]!.a.revisions).toEqual([
      { revisionId: revisionId(joint.motor, 1), holds: true },
    ]);
  });
});

describe('merging a revision into another', () => {
  it('moves benches and readings, and the merged one is gone', async () => {
    const part = await insertPart(app.knex);
    const owner = await app.memberNamed('Owner of two');
    await bench(owner, part, revisionId(part, 0));
    await bench(owner, part, revisionId(part, 1));
    const recess = await insertFeature(app.knex, part, 'recess');
    await record(
      member,
      reading(recess, revisionId(part, 0), 'diameter', 19.5),
      reading(recess, revisionId(part, 1), 'diameter', 19.6),
    );
    await merge('revision', revisionId(part, 1), revisionId(part, 0)).expect(200, { slug: part.slug });
    expect(await benchOf(owner)).toEqual([[part.slug, 'Rev A']]);
    expect((await pageOf(part.slug)).revisions).toHaveLength(1);
    const rows = await app.knex('consensus').where('feature_id', recess.id).select('revision_id', 'count');
    expect(rows).toEqual([{ revision_id: revisionId(part, 0), count: 2 }]);
  });

  it('keeps the newer of two reports of one person that come to be on the same pair', async () => {
    const [a, b] = [await insertPart(app.knex), await insertPart(app.knex, { revisions: ['v1'] })];
    const joint = await insertJointOf(
      app.knex,
      'boss-recess',
      await insertFeature(app.knex, a, 'boss'),
      await insertFeature(app.knex, b, 'recess'),
    );
    const other = await app.memberNamed('Other reporter');
    await report(member, joint, revisionId(a, 1), revisionId(b, 0), false);
    await report(other, joint, revisionId(a, 1), revisionId(b, 0), false);
    await app.knex('fit_reports').where('account_id', member.account.id).update({ created_at: '2026-01-01' });
    await report(member, joint, revisionId(a, 0), revisionId(b, 0), true);
    await merge('revision', revisionId(a, 0), revisionId(a, 1)).expect(200);
    const { body } = await app.visitor().get(`/api/joints/${joint}`).expect(200);
    expect(body.cells).toMatchObject([{ revisionA: revisionId(a, 1), sat: 1, didNotSit: 1 }]);
  });

  it('of another part is refused', async () => {
    const [a, b] = [await insertPart(app.knex), await insertPart(app.knex)];
    const { body } = await merge('revision', revisionId(a, 0), revisionId(b, 0)).expect(422);
    expect(body.fields[0].path).toBe('into');
  });
});

describe('merging a feature into another', () => {
  const boss = (part: TestPart): Promise<TestFeature> => insertFeature(app.knex, part, 'boss');

  it('moves its readings and joints, and puts two joints of the same features together with their reports', async () => {
    const [a, b] = [await insertPart(app.knex), await insertPart(app.knex)];
    const [kept, gone] = [await boss(a), await boss(a)];
    const [recess, other] = [
      await insertFeature(app.knex, b, 'recess'),
      await insertFeature(app.knex, b, 'recess'),
    ];
    const older = await insertJointOf(app.knex, 'boss-recess', kept, recess);
    const newer = await insertJointOf(app.knex, 'boss-recess', gone, recess);
    const alone = await insertJointOf(app.knex, 'boss-recess', gone, other);
    await report(member, newer, revisionId(a, 0), revisionId(b, 0), true);
    await record(member, reading(gone, revisionId(a, 0), 'diameter', 22.5));
    await merge('feature', gone.id, kept.id).expect(200, { slug: a.slug });
    const { body } = await app.visitor().get(`/api/joints?part=${a.slug}`).expect(200);
    expect(body.items.map((item: { slug: string }) => item.slug).sort()).toEqual([alone, older].sort());
    const { body: page } = await app.visitor().get(`/api/joints/${older}`).expect(200);
    expect(page.cells).toContainEqual(expect.objectContaining({ revisionA: revisionId(a, 0), sat: 1 }));
    expect(page.sideA.revisions[0].dimensions.diameter).toMatchObject({ count: 1, mean: 22.5 });
  });

  it('is refused where the two are joined with each other, or are of another kind', async () => {
    const part = await insertPart(app.knex);
    const [one, two, recess] = [
      await boss(part),
      await boss(part),
      await insertFeature(app.knex, part, 'recess'),
    ];
    await insertJointOf(app.knex, 'boss-recess', one, two);
    expect((await merge('feature', one.id, two.id).expect(422)).body.fields[0].path).toBe('from');
    expect((await merge('feature', one.id, recess.id).expect(422)).body.fields[0].path).toBe('into');
    expect(await app.knex('features').where('part_id', part.id)).toHaveLength(3);
  });
});

describe('every merge', () => {
  it('is noted with who did it and what is gone', async () => {
    const [a, b] = [await insertPart(app.knex, { revisions: ['x'] }), await insertPart(app.knex)];
    await merge('part', a.id, b.id).expect(200);
    const [entry] = await app.knex('audit_log').where({ subject_kind: 'part', subject_id: a.id });
    expect(entry).toMatchObject({
      action: 'merged',
      subject_name: a.name,
      actor_id: moderator.account.id,
    });
    expect(fromJson(entry.details)).toEqual({ into: b.id, part: b.slug });
  });
});
