import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { SearchResults } from '../../shared/contract/search.js';
import type { WriteUpPage } from '../../shared/contract/write-ups.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { auditActions, speakerFor } from './support/makers.js';
import { completeContent, insertJoint, plainFix, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;

beforeAll(async () => {
  app = await startTestApp({ search: true });
});
afterAll(() => app.close());

interface Scene {
  readonly joint: TestJoint;
  readonly slug: string;
  readonly keys: readonly [string, string];
  readonly speaker: MemberAgent;
  readonly moderator: MemberAgent;
}

/** A write-up with two fixes, and somebody who speaks for the motor's maker. */
async function scene(): Promise<Scene> {
  const joint = await insertJoint(app.knex);
  const moderator = await app.as('moderator');
  const fixes = [plainFix(), plainFix({ title: 'Turn the plate round', kind: 'reposition' })] as const;
  const content = completeContent(joint, { fixes: [...fixes] });
  const { slug } = await publishNew(await app.as('member'), moderator, content);
  const keys = [fixes[0].key, fixes[1].key] as const;
  return { joint, slug, keys, moderator, speaker: await speakerFor(app, joint.motor) };
}

async function standings({ slug }: Scene): Promise<[string, string | null][]> {
  const page: WriteUpPage = (await app.visitor().get(`/api/write-ups/${slug}`).expect(200)).body;
  return page.view.fixes.map((fix) => [fix.standing, fix.madeRightFrom?.label ?? null]);
}

const mark = ({ slug, joint }: Scene, agent: MemberAgent, over = {}) =>
  agent
    .post(`/api/write-ups/${slug}/made-right`)
    .send({ revisionId: joint.motor.revisions[2]!.id, fixKeys: null, ...over });
const unmark = ({ slug }: Scene, agent: MemberAgent, fixKeys: readonly string[]) =>
  agent.post(`/api/write-ups/${slug}/made-right/undo`).send({ fixKeys });

describe('a problem made right', () => {
  it('shows on every fix from which revision on', async () => {
    const at = await scene();
    const { body } = await mark(at, at.speaker).expect(200);
    expect(body.fixKeys).toEqual(at.keys);
    expect(await standings(at)).toEqual([
      ['made-right', 'Rev C'],
      ['made-right', 'Rev C'],
    ]);
    expect(await auditActions(app.knex)).toContain('made-right');
    const happening = await app
      .knex('happenings')
      .where({ kind: 'made-right' })
      .orderBy('id', 'desc')
      .first();
    expect(happening.title).toContain('Motor M Rev C');
  });

  it('is marked on chosen fixes only', async () => {
    const at = await scene();
    await mark(at, at.speaker, { fixKeys: [at.keys[1]] }).expect(200);
    expect(await standings(at)).toEqual([
      ['told', null],
      ['made-right', 'Rev C'],
    ]);
  });

  it('is found by its standing in search, and no more once it is taken back', async () => {
    const at = await scene();
    const found = async (): Promise<string[]> => {
      const { body }: { body: SearchResults } = await app
        .visitor()
        .get(`/api/search?q=&standing=made-right&part=${at.joint.motor.slug}`)
        .expect(200);
      return JSON.stringify(body).includes(`"${at.slug}"`) ? [at.slug] : [];
    };
    await mark(at, at.speaker).expect(200);
    await expect.poll(found, { timeout: 10_000 }).toEqual([at.slug]);
    await unmark(at, at.speaker, at.keys).expect(200);
    await expect.poll(found, { timeout: 10_000 }).toEqual([]);
  });

  it('falls back to what its trials bear out when it is taken back', async () => {
    const at = await scene();
    await (
      await app.as('member')
    )
      .post(`/api/write-ups/${at.slug}/trials`)
      .send({ fixKey: at.keys[0], outcome: 'held', revisionIds: [], note: '', figure: null })
      .expect(201);
    await mark(at, at.speaker).expect(200);
    await unmark(at, at.moderator, at.keys).expect(200);
    expect(await standings(at)).toEqual([
      ['tried', null],
      ['told', null],
    ]);
  });

  it('stays made right when another trial comes in', async () => {
    const at = await scene();
    await mark(at, at.speaker).expect(200);
    await (
      await app.as('member')
    )
      .post(`/api/write-ups/${at.slug}/trials`)
      .send({ fixKey: at.keys[0], outcome: 'did-not-help', revisionIds: [], note: '', figure: null })
      .expect(201);
    expect((await standings(at))[0]).toEqual(['made-right', 'Rev C']);
  });

  it("names a revision of one of the write-up's parts", async () => {
    const at = await scene();
    const elsewhere = await insertJoint(app.knex);
    const refused = await mark(at, at.speaker, { revisionId: elsewhere.motor.revisions[0]!.id }).expect(422);
    expect(refused.body.fields[0].path).toBe('revisionId');
  });

  it('names fixes of the published edition', async () => {
    const at = await scene();
    const refused = await mark(at, at.speaker, { fixKeys: [at.keys[0], 'no-such-fix'] }).expect(422);
    expect(refused.body.fields[0].path).toBe('fixKeys.1');
    expect(await standings(at)).toEqual([
      ['told', null],
      ['told', null],
    ]);
  });

  it("is said by the revision's own maker only", async () => {
    const at = await scene();
    await mark(at, at.speaker, { revisionId: at.joint.bracket.revisions[1]!.id }).expect(403);
    await mark(at, at.moderator).expect(403);
    await mark(at, await app.as('maker')).expect(403);
    await mark(at, await app.as('member')).expect(403);
  });

  it("is not taken back by the other part's maker", async () => {
    const at = await scene();
    await mark(at, at.speaker).expect(200);
    await unmark(at, await speakerFor(app, at.joint.bracket), at.keys).expect(403);
    expect((await standings(at))[0]).toEqual(['made-right', 'Rev C']);
  });
});
