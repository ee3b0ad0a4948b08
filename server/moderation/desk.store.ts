import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { EditionLine } from '../../shared/contract/write-ups.js';
import { fromJson } from '../rows.js';

export type DeskStore = ReturnType<typeof createDeskStore>;

export function createDeskStore(knex: Knex) {
  return {
    /** The edition that is published now, with its text. */
    async publishedEdition(
      writeUpId: number,
    ): Promise<{ line: EditionLine; content: EditionContent } | undefined> {
      const row = await knex('write_ups as w')
        .join('editions as e', 'e.id', 'w.published_edition_id')
        .join('accounts as a', 'a.id', 'e.author_id')
        .where('w.id', writeUpId)
        .first('e.id', 'e.number', 'e.title', 'e.content', {
          authorId: 'a.id',
          authorName: 'a.display_name',
          changeNote: 'e.change_note',
          publishedAt: 'e.published_at',
        });
      return (
        row && {
          line: {
            id: row.id,
            number: row.number,
            author: { id: row.authorId, displayName: row.authorName },
            changeNote: row.changeNote,
            publishedAt: (row.publishedAt as Date).toISOString(),
            title: row.title,
          },
          content: fromJson<EditionContent>(row.content),
        }
      );
    },

    async markReturned(trx: Knex, editionId: number, reason: string, at: Date): Promise<void> {
      await trx('editions')
        .where('id', editionId)
        .update({
          state: 'returned',
          return_reason: reason,
          updated_at: at,
          version: trx.raw('version + 1'),
        });
    },
  };
}
