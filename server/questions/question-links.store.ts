import type { Knex } from 'knex';
import type { WriteUpRef } from '../../shared/contract/questions.js';

const mostWriteUps = 6;
const mostAlike = 5;
/** Words of a question that is being written that are compared; more would only blur what matters. */
const comparedCharacters = 400;

export type QuestionLinksStore = ReturnType<typeof createQuestionLinksStore>;

/** What belongs together: questions with questions, and questions with write-ups. */
export function createQuestionLinksStore(knex: Knex) {
  return {
    /**
     * Published write-ups on a question's parts: what settled it, what was made from one of its replies, then those whose
     * published edition has a joint of two of its parts (a side with its part, where it names one only) and a symptom of it
     * (where it names any); of these the ones that share more symptoms first, then the newest.
     */
    async writeUpsOn(questionId: number): Promise<WriteUpRef[]> {
      const parts: number[] = await knex('question_parts')
        .where('question_id', questionId)
        .distinct()
        .pluck('part_id');
      const symptoms: number[] = await knex('question_symptoms')
        .where('question_id', questionId)
        .pluck('symptom_id');
      const [named, covering] = await Promise.all([
        namedBy(knex, questionId),
        covered(knex, parts, symptoms),
      ]);
      const each = new Map([...named, ...covering].map((row) => [row.slug, row]));
      return [...each.values()].slice(0, mostWriteUps).map(({ slug, title }) => ({ slug, title }));
    },

    /** Identities of the questions that a write-up settled or was made from, the newest first. */
    async coveredBy(writeUpId: number): Promise<number[]> {
      const ids: { id: number }[] = await knex('questions as q')
        .where('q.settled_write_up_id', writeUpId)
        .orWhereIn('q.id', knex('question_replies').where('write_up_id', writeUpId).select('question_id'))
        .orderBy('q.id', 'desc')
        .limit(50)
        .select('q.id');
      return ids.map(({ id }) => id);
    },

    /**
     * Identities of questions like one that is being written: those that share more of its parts first, then those whose
     * title and text match its words better, then the newest. One that shares neither part nor word is not like it.
     */
    async alike(partIds: readonly number[], words: string): Promise<number[]> {
      const typed = words.slice(0, comparedCharacters);
      const rows: { id: number }[] = await knex('questions as q')
        .leftJoin(
          knex('question_parts')
            .whereIn('part_id', [...partIds, 0])
            .groupBy('question_id')
            .select('question_id')
            .countDistinct({ parts: 'part_id' })
            .as('s'),
          's.question_id',
          'q.id',
        )
        .whereNull('q.taken_down_at')
        .where((either) =>
          either.whereNotNull('s.parts').orWhereRaw('MATCH (q.title, q.text) AGAINST (?) > 0', [typed]),
        )
        .orderByRaw('COALESCE(s.parts, 0) DESC, MATCH (q.title, q.text) AGAINST (?) DESC, q.id DESC', [typed])
        .limit(mostAlike)
        .select('q.id');
      return rows.map(({ id }) => id);
    },
  };
}

/** What settled it, then what was made from its replies that stand. */
async function namedBy(knex: Knex, questionId: number): Promise<WriteUpRef[]> {
  return knex('write_ups as w')
    .join('editions as e', 'e.id', 'w.published_edition_id')
    .leftJoin('questions as q', (on) => on.on('q.settled_write_up_id', 'w.id').andOnVal('q.id', questionId))
    .where((either) =>
      either
        .whereNotNull('q.id')
        .orWhereIn(
          'w.id',
          knex('question_replies')
            .where('question_id', questionId)
            .whereNull('taken_down_at')
            .whereNotNull('write_up_id')
            .select('write_up_id'),
        ),
    )
    .orderByRaw('q.id IS NULL, w.id')
    .select('w.slug', 'e.title');
}

async function covered(
  knex: Knex,
  parts: readonly number[],
  symptoms: readonly number[],
): Promise<WriteUpRef[]> {
  if (parts.length === 0) return [];
  const joints = knex('edition_sides')
    .whereIn('part_id', parts)
    .groupBy('edition_id', 'joint')
    .havingRaw('COUNT(DISTINCT part_id) >= ?', [Math.min(2, parts.length)])
    .select('edition_id');
  const shared = knex('edition_symptoms')
    .whereIn('symptom_id', [...symptoms, 0])
    .groupBy('edition_id')
    .select('edition_id')
    .count({ symptoms: '*' })
    .as('s');
  const query = knex('write_ups as w')
    .join('editions as e', 'e.id', 'w.published_edition_id')
    .leftJoin(shared, 's.edition_id', 'e.id')
    .whereIn('e.id', joints)
    .orderByRaw('COALESCE(s.symptoms, 0) DESC, e.published_at DESC, w.id DESC')
    .limit(mostWriteUps)
    .select('w.slug', 'e.title');
  if (symptoms.length > 0) void query.whereNotNull('s.symptoms');
  return query;
}
