import type { Knex } from 'knex';
import { emptyContent, type EditionContent, type Fix } from '../../../shared/contract/edition-content.js';
import type { HazardKind } from '../../../shared/contract/vocabulary.js';
import type { Draft } from '../../../shared/contract/write-ups.js';
import type { MemberAgent } from './app.js';
import { insertPart, insertSymptom, type TestPart } from './catalogue.js';

export interface TestJoint {
  readonly motor: TestPart;
  readonly bracket: TestPart;
  readonly symptom: string;
}

/** Two parts that are meant to mate, and a symptom. */
export async function insertJoint(knex: Knex): Promise<TestJoint> {
  return {
    motor: await insertPart(knex, {
      name: 'Motor M',
      kind: 'focus-motor',
      revisions: ['Rev A', 'Rev B', 'Rev C'],
    }),
    bracket: await insertPart(knex, { name: 'Bracket K', revisions: ['v1', 'v2'] }),
    symptom: await insertSymptom(knex),
  };
}

let keys = 0;

/** A key that no other item of any test has. */
export function newKey(): string {
  keys += 1;
  return `item-${String(keys).padStart(6, '0')}`;
}

/** A remedy that names no hazard. */
export function plainFix(over: Partial<Fix> = {}): Fix {
  return {
    key: newKey(),
    title: 'Disc behind the plate',
    kind: 'shim',
    permanence: 'reversible',
    why: 'It fills the gap.',
    tools: ['caliper'],
    materials: ['one disc'],
    steps: [{ key: newKey(), text: 'Lay the disc on the plate.', photoId: null }],
    revisionIds: [],
    afterwards: ['flats'],
    afterwardsNote: '',
    worksheet: null,
    acceptance: { quantity: 'tilt', comparison: 'at-most', value: 0.1, unit: 'deg' },
    ...over,
  };
}

/** A remedy that names a knife, and so the hazard `blade`. */
export function knifeFix(over: Partial<Fix> = {}): Fix {
  return plainFix({
    title: 'Trim the lip',
    kind: 'trim',
    permanence: 'permanent',
    tools: ['knife'],
    ...over,
  });
}

/** An edition that lacks nothing: holds for the motor's Rev A and not for its Rev B, and for the bracket's v1. */
export function completeContent(
  { motor, bracket, symptom }: TestJoint,
  over: Partial<EditionContent> = {},
): EditionContent {
  return {
    ...emptyContent,
    title: 'Bracket rocks on the raised lip',
    summary: 'A disc of 1.5 mm behind the plate lets it sit flat.',
    joints: [
      {
        a: {
          partId: motor.id,
          feature: 'raised lip',
          revisions: [
            { revisionId: motor.revisions[0]!.id, holds: true },
            { revisionId: motor.revisions[1]!.id, holds: false },
          ],
        },
        b: {
          partId: bracket.id,
          feature: 'recess',
          revisions: [{ revisionId: bracket.revisions[0]!.id, holds: true }],
        },
      },
    ],
    symptoms: [symptom],
    noticed: 'It *rocks*.',
    cause: 'The lip is wider than the recess and carries the plate.',
    fixes: [plainFix()],
    ...over,
  };
}

/** A draft of the author with this text, saved once. */
export async function saveNewDraft(
  author: MemberAgent,
  content: EditionContent,
  changeNote = '',
): Promise<Draft> {
  const draft: Draft = (await author.post('/api/write-ups').send({}).expect(201)).body;
  return saveDraft(author, draft, content, changeNote);
}

export async function saveDraft(
  author: MemberAgent,
  draft: Draft,
  content: EditionContent,
  changeNote = '',
): Promise<Draft> {
  const saved = await author
    .put(`/api/drafts/${draft.id}`)
    .set('If-Match', `"${draft.version}"`)
    .send({ content, changeNote })
    .expect(200);
  return saved.body;
}

export async function submitDraft(author: MemberAgent, draft: Draft): Promise<Draft> {
  return (
    await author.post(`/api/drafts/${draft.id}/submit`).set('If-Match', `"${draft.version}"`).expect(200)
  ).body;
}

export interface PublishedWriteUp {
  readonly slug: string;
  readonly editionId: number;
  readonly writeUpId: number;
}

/** From the empty form to the published page. */
export async function publishNew(
  author: MemberAgent,
  moderator: MemberAgent,
  content: EditionContent,
  cautions: readonly ReturnType<typeof cautionFor>[] = [],
): Promise<PublishedWriteUp> {
  const draft = await submitDraft(author, await saveNewDraft(author, content));
  for (const caution of cautions) {
    await moderator
      .post('/api/desk/cautions')
      .send({ ...caution, editionId: draft.id })
      .expect(201);
  }
  const { body } = await moderator
    .post(`/api/desk/editions/${draft.id}/publish`)
    .send({ note: '' })
    .expect(200);
  return { slug: body.slug, editionId: draft.id, writeUpId: draft.writeUpId };
}

/** The next edition of a published write-up with this text, on the desk. */
export async function submitNext(author: MemberAgent, slug: string, content: EditionContent): Promise<Draft> {
  const draft: Draft = (await author.post(`/api/write-ups/${slug}/editions`).expect(201)).body;
  return submitDraft(author, await saveDraft(author, draft, content, 'Says it better.'));
}

/** A caution as a moderator sends it, but for the edition. */
export function cautionFor(fixKey: string | null, ...hazards: HazardKind[]) {
  return {
    fixKey,
    libraryId: null,
    signalWord: 'warning' as const,
    hazards,
    hazard: 'Sharp edge.',
    consequence: 'It cuts.',
    avoidance: 'Cut away from your hand.',
  };
}
