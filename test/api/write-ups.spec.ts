import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DifferencePiece, EditionLine, FieldDifference } from '../../shared/contract/write-ups.js';
import { worksheetOfLink } from '../../shared/fit/worksheet-link.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  cautionFor,
  completeContent,
  insertJoint,
  knifeFix,
  plainFix,
  publishNew,
  submitDraft,
  submitNext,
  type TestJoint,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [author, moderator] = await Promise.all([app.memberNamed('Author'), app.as('moderator')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const page = (slug: string) => app.visitor().get(`/api/write-ups/${slug}`);

async function publishNext(
  slug: string,
  content: Parameters<typeof submitNext>[2],
  who = author,
): Promise<number> {
  const draft = await submitNext(who, slug, content);
  return (await moderator.post(`/api/desk/editions/${draft.id}/publish`).send({ note: '' }).expect(200)).body
    .number;
}

describe('the published page', () => {
  it('shows joint, symptoms, fixes and rendered texts to everybody', async () => {
    const [revA, revB, revC] = joint.motor.revisions;
    const fix = plainFix({ why: 'It *fills* the gap.', revisionIds: [revA!.id] });
    const { slug, writeUpId } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }));
    const { body } = await page(slug).expect(200);
    expect(body).toMatchObject({
      id: writeUpId,
      slug,
      editionCount: 1,
      mayEdit: false,
      myDraftId: null,
      trials: [],
      authors: [{ id: author.account.id, displayName: 'Author' }],
      edition: { number: 1, title: 'Bracket rocks on the raised lip', changeNote: '' },
    });
    const [{ a, b }] = body.view.joints;
    expect(a).toEqual({
      part: expect.objectContaining({ id: joint.motor.id, name: 'Motor M' }),
      feature: 'raised lip',
      revisions: [
        { id: revA!.id, partId: joint.motor.id, label: 'Rev A', holds: true },
        { id: revB!.id, partId: joint.motor.id, label: 'Rev B', holds: false },
      ],
      notKnown: [{ id: revC!.id, partId: joint.motor.id, label: 'Rev C' }],
    });
    expect(b.notKnown.map((revision: { label: string }) => revision.label)).toEqual(['v2']);
    expect(body.view.symptoms).toMatchObject([{ slug: joint.symptom, label: 'The bracket rocks' }]);
    expect(body.view.noticed.html).toContain('<em>rocks</em>');
    expect(body.view.fixes).toMatchObject([
      {
        key: fix.key,
        standing: 'told',
        madeRightFrom: null,
        cautions: [],
        afterwards: ['flats'],
        why: { source: 'It *fills* the gap.' },
        revisions: [{ label: 'Rev A', partName: 'Motor M' }],
        trialCounts: { held: 0, heldForAWhile: 0, didNotHelp: 0 },
      },
    ]);
  });

  it('equals the preview of the draft it came from', async () => {
    const { slug, editionId } = await publishNew(author, moderator, completeContent(joint));
    const preview = await author.get(`/api/drafts/${editionId}/preview`).expect(200);
    expect(preview.body.view).toEqual((await page(slug)).body.view);
  });

  it('tells its authors and moderators that they may edit, and which draft they have open', async () => {
    const { slug } = await publishNew(author, moderator, completeContent(joint));
    const draft = (await author.post(`/api/write-ups/${slug}/editions`)).body;
    const seenBy = async (agent: MemberAgent): Promise<unknown[]> => {
      const { body } = await agent.get(`/api/write-ups/${slug}`).expect(200);
      return [body.mayEdit, body.myDraftId];
    };
    expect(await seenBy(author)).toEqual([true, draft.id]);
    expect(await seenBy(moderator)).toEqual([true, null]);
    expect(await seenBy(await app.memberNamed('Stranger'))).toEqual([false, null]);
  });

  it('is not there before its first edition is published', async () => {
    await app
      .knex('write_ups')
      .insert({ slug: 'not-published-yet', created_by: author.account.id, created_at: new Date() });
    for (const path of ['', '/editions', '/editions/1', '/comparison?from=1&to=1']) {
      expect((await app.visitor().get(`/api/write-ups/not-published-yet${path}`)).status).toBe(404);
    }
  });

  it('carries the cautions of its fixes and of the whole write-up, the gravest first', async () => {
    const fix = knifeFix();
    const { slug } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }), [
      { ...cautionFor(fix.key, 'blade'), signalWord: 'caution' as 'warning' },
      { ...cautionFor(fix.key, 'blade'), signalWord: 'danger' as 'warning' },
      cautionFor(null, 'sun'),
    ]);
    const { view } = (await page(slug)).body;
    expect(view.fixes[0].cautions.map((caution: { signalWord: string }) => caution.signalWord)).toEqual([
      'danger',
      'caution',
    ]);
    expect(view.cautions).toMatchObject([{ fixKey: null, hazards: ['sun'], signalWord: 'warning' }]);
  });
});

describe('a worksheet on a fix', () => {
  it('stands on the page as it was attached, and is told in the comparison when it goes', async () => {
    const read = worksheetOfLink('/worksheets/shim?v=1&gap=1.7&tolerance=0.05');
    if (!('record' in read)) throw new Error(read.refusal);
    const fix = plainFix({ worksheet: read.record });
    const content = completeContent(joint, { fixes: [fix] });
    const { slug } = await publishNew(author, moderator, content);
    const { body } = await app.visitor().get(`/api/write-ups/${slug}`).expect(200);
    expect(body.view.fixes[0].worksheet).toEqual(read.record);

    const next = await submitNext(author, slug, { ...content, fixes: [{ ...fix, worksheet: null }] });
    await moderator.post(`/api/desk/editions/${next.id}/publish`).send({ note: '' }).expect(200);
    const comparison = await app.visitor().get(`/api/write-ups/${slug}/comparison?from=1&to=2`).expect(200);
    expect(comparison.body.changed.map((change: { field: string }) => change.field)).toEqual([
      `fixes.${fix.key}.worksheet`,
    ]);
  });

  it('of another shape is refused with the field named, and a text from before worksheets has none', async () => {
    const { worksheet: _, ...before } = plainFix();
    const content = completeContent(joint);
    const draft = (await author.post('/api/write-ups').send({}).expect(201)).body;
    const save = (fix: object) =>
      author
        .put(`/api/drafts/${draft.id}`)
        .set('If-Match', `"${draft.version}"`)
        .send({ content: { ...content, fixes: [fix] }, changeNote: '' });
    const refused = await save({
      ...before,
      worksheet: { kind: 'shim', version: 1, inputs: {}, result: {} },
    });
    expect(refused.status).toBe(422);
    expect(refused.body.fields[0].path).toMatch(/^content\.fixes\.0\.worksheet/);
    expect((await save(before).expect(200)).body.content.fixes[0].worksheet).toBeNull();
  });
});

describe('the address', () => {
  it('comes from the title of the first edition, with a number where it is taken, and stays when the title changes', async () => {
    const content = completeContent(joint, { title: 'Größe of the Lip!' });
    const first = await publishNew(author, moderator, content);
    const second = await publishNew(author, moderator, content);
    expect([first.slug, second.slug]).toEqual(['grosse-of-the-lip', 'grosse-of-the-lip-2']);
    await publishNext(first.slug, { ...content, title: 'Another title altogether' });
    expect((await page(first.slug)).body.edition.title).toBe('Another title altogether');
  });
});

describe('the history', () => {
  it('lists every published edition with who, when and why, the newest first', async () => {
    const content = completeContent(joint);
    const { slug } = await publishNew(author, moderator, content);
    await publishNext(slug, { ...content, sources: 'Measured again.' }, moderator);
    const { items }: { items: EditionLine[] } = (
      await app.visitor().get(`/api/write-ups/${slug}/editions`).expect(200)
    ).body;
    expect(items.map((line) => [line.number, line.author.displayName, line.changeNote])).toEqual([
      [2, 'Test moderator', 'Says it better.'],
      [1, 'Author', ''],
    ]);
    const { body } = await page(slug);
    expect(body).toMatchObject({ editionCount: 2, edition: { number: 2 } });
    expect(body.authors.map((person: { displayName: string }) => person.displayName)).toEqual([
      'Author',
      'Test moderator',
    ]);
  });

  it('shows an earlier edition as it was, and says which is the latest', async () => {
    const content = completeContent(joint);
    const { slug } = await publishNew(author, moderator, content);
    await publishNext(slug, { ...content, summary: 'Now it is said in quite another way.' });
    const { body } = await app.visitor().get(`/api/write-ups/${slug}/editions/1`).expect(200);
    expect(body).toMatchObject({
      slug,
      latestNumber: 2,
      edition: { number: 1 },
      view: { summary: content.summary },
    });
    expect((await app.visitor().get(`/api/write-ups/${slug}/editions/3`)).status).toBe(404);
    expect((await app.visitor().get(`/api/write-ups/${slug}/editions/x`)).status).toBe(404);
  });

  it('does not show editions that are drafts or on the desk', async () => {
    const content = completeContent(joint);
    const { slug } = await publishNew(author, moderator, content);
    await submitNext(author, slug, { ...content, sources: 'Not yet.' });
    expect((await app.visitor().get(`/api/write-ups/${slug}/editions`)).body.items).toHaveLength(1);
    expect((await app.visitor().get(`/api/write-ups/${slug}/editions/2`)).status).toBe(404);
    expect((await app.visitor().get(`/api/write-ups/${slug}/comparison?from=1&to=2`)).status).toBe(404);
  });

  it('compares two editions word by word, in either direction', async () => {
    const content = completeContent(joint);
    const { slug } = await publishNew(author, moderator, content);
    await publishNext(slug, { ...content, cause: content.cause.replace('wider', 'higher') });
    const compare = async (from: number, to: number) =>
      (await app.visitor().get(`/api/write-ups/${slug}/comparison`).query({ from, to }).expect(200)).body;
    const forth = await compare(1, 2);
    expect(forth.changed.map((change: FieldDifference) => change.label)).toEqual(['Cause']);
    const words = (kind: string): string[] =>
      forth.changed[0].pieces
        .filter((piece: DifferencePiece) => piece.kind === kind)
        .map((piece: DifferencePiece) => piece.text);
    expect([words('removed'), words('added')]).toEqual([['wider'], ['higher']]);
    expect([forth.from.number, forth.to.number]).toEqual([1, 2]);
    const back = await compare(2, 1);
    expect(back.changed[0].pieces).toContainEqual({ kind: 'added', text: 'wider' });
    expect((await compare(2, 2)).changed).toEqual([]);
    const refused = await app.visitor().get(`/api/write-ups/${slug}/comparison?from=1`);
    expect([refused.status, refused.body.fields[0].path]).toEqual([422, 'to']);
  });

  it('numbers published editions without gaps, in the order in which they are published', async () => {
    const content = completeContent(joint);
    const { slug } = await publishNew(author, moderator, content);
    const overtaken = await submitNext(author, slug, { ...content, sources: 'The author’s.' });
    const quicker = await submitNext(moderator, slug, { ...content, sources: 'The moderator’s.' });
    expect([overtaken.number, quicker.number]).toEqual([2, 3]);
    const publish = (id: number) =>
      moderator.post(`/api/desk/editions/${id}/publish`).send({ note: '' }).expect(200);
    expect((await publish(quicker.id)).body.number).toBe(2);
    const recalled = await author.post(`/api/drafts/${overtaken.id}/recall`).expect(200);
    const merged = await author
      .put(`/api/drafts/${overtaken.id}`)
      .set('If-Match', `"${recalled.body.version}"`)
      .send({ content: overtaken.content, changeNote: 'Mine.', baseEditionId: quicker.id })
      .expect(200);
    await submitDraft(author, merged.body);
    expect((await publish(overtaken.id)).body.number).toBe(3);
    expect((await page(slug)).body.view.sources.source).toBe('The author’s.');
  });
});
