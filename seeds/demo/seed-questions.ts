import type { Knex } from 'knex';
import { idsFrom, insertRows } from './ids.js';
import { planQuestions } from './plan-questions.js';
import { seededNumbers } from './random.js';
import { type Catalogue, known } from './seed-catalogue.js';
import { slugOf } from './slug.js';
import { demoWriteUps } from './write-ups.js';

const day = 86_400_000;
const hour = 3_600_000;

/** Inserts the questions with their parts, symptoms and replies; those that a fix settled name it. */
export async function seedQuestions(
  trx: Knex,
  parts: { accounts: ReadonlyMap<string, number>; catalogue: Catalogue; now: Date },
): Promise<void> {
  const { accounts, catalogue, now } = parts;
  const [questionId, replyId] = (await Promise.all(
    ['questions', 'question_replies'].map((table) => idsFrom(trx, table)),
  )) as [() => number, () => number];
  const published: { id: number; slug: string }[] = await trx('write_ups')
    .whereNotNull('slug')
    .select('id', 'slug');
  const writeUpIds = new Map(published.map(({ slug, id }) => [slug, id]));
  const fixTitles = new Map(
    demoWriteUps.flatMap(({ slug, content }) =>
      content.fixes.map(({ key, title }) => [`${slug}/${key}`, title]),
    ),
  );
  const people = [...accounts.keys()].filter((key) => !['moderator', 'administrator', 'maker'].includes(key));
  const rows = {
    questions: [] as object[],
    parts: [] as object[],
    symptoms: [] as object[],
    replies: [] as { at: number; row: object }[],
  };
  for (const question of planQuestions(demoWriteUps, people, seededNumbers(150))) {
    const id = questionId();
    const asked = now.getTime() - question.daysAgo * day;
    const by = question.settledBy;
    rows.questions.push({
      id,
      slug: `${slugOf(question.title)}-${id}`,
      title: question.title,
      text: question.text,
      readings: JSON.stringify(question.readings),
      worksheet: null,
      account_id: known(accounts, question.by),
      settled_write_up_id: by && known(writeUpIds, by.writeUp),
      settled_fix_key: by?.fixKey ?? null,
      settled_fix_title: by && fixTitles.get(`${by.writeUp}/${by.fixKey}`),
      created_at: new Date(asked),
    });
    rows.parts.push(
      ...question.parts.map((named, position) => ({
        question_id: id,
        position,
        part_id: known(catalogue.parts, named.split(':')[0]!),
        revision_id: named.includes(':') ? known(catalogue.revisions, named) : null,
      })),
    );
    rows.symptoms.push(
      ...question.symptoms.map((slug) => ({ question_id: id, symptom_id: known(catalogue.symptoms, slug) })),
    );
    rows.replies.push(
      ...question.replies.map((reply) => {
        const at = Math.min(asked + reply.after * hour, now.getTime() - hour);
        const row = {
          question_id: id,
          text: reply.text,
          worksheet: reply.worksheet && JSON.stringify(reply.worksheet),
          account_id: known(accounts, reply.by),
          created_at: new Date(at),
        };
        return { at, row };
      }),
    );
  }
  await insertRows(trx, 'questions', rows.questions);
  await insertRows(trx, 'question_parts', rows.parts);
  await insertRows(trx, 'question_symptoms', rows.symptoms);
  // Replies are shown in the order of their identities.
  rows.replies.sort((one, other) => one.at - other.at);
  await insertRows(
    trx,
    'question_replies',
    rows.replies.map(({ row }) => ({ id: replyId(), ...row })),
  );
}
