import type { Knex } from 'knex';
import { groupBy } from '../rows.js';

export type QuestionPhotosStore = ReturnType<typeof createQuestionPhotosStore>;

const ofQuestions = { table: 'question_photos', owner: 'question_id' } as const;
const ofReplies = { table: 'question_reply_photos', owner: 'reply_id' } as const;
type Place = typeof ofQuestions | typeof ofReplies;

/** Which photos stand with questions and with replies, in the order in which they were attached. */
export function createQuestionPhotosStore(knex: Knex) {
  const add =
    ({ table, owner }: Place) =>
    async (id: number, photoIds: readonly number[], trx: Knex): Promise<void> => {
      if (photoIds.length === 0) return;
      await trx(table).insert(photoIds.map((photo_id, position) => ({ [owner]: id, photo_id, position })));
    };
  const of =
    ({ table, owner }: Place) =>
    async (ids: readonly number[], db: Knex = knex): Promise<Map<number, number[]>> => {
      if (ids.length === 0) return new Map();
      const rows: { id: number; photoId: number }[] = await db(table)
        .whereIn(owner, ids)
        .orderBy([owner, 'position'])
        .select({ id: owner, photoId: 'photo_id' });
      return new Map(
        [...groupBy(rows, (row) => row.id)].map(([id, photos]) => [id, photos.map((row) => row.photoId)]),
      );
    };
  return {
    addToQuestion: add(ofQuestions),
    addToReply: add(ofReplies),
    ofQuestions: of(ofQuestions),
    ofReplies: of(ofReplies),
  };
}
