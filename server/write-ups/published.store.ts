import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import { fromJson } from '../rows.js';

export interface WriteUpRow {
  readonly id: number;
  readonly slug: string;
  readonly publishedEditionId: number;
  readonly firstPublishedAt: Date;
}

export interface PublishedEditionRow {
  readonly id: number;
  readonly number: number;
  readonly authorId: number;
  readonly authorName: string;
  readonly changeNote: string;
  readonly title: string;
  readonly publishedAt: Date;
}

export type PublishedStore = ReturnType<typeof createPublishedStore>;

/** Write-ups that have been published, and their published editions. */
export function createPublishedStore(knex: Knex) {
  return {
    async bySlug(slug: string): Promise<WriteUpRow | undefined> {
      return knex('write_ups').where('slug', slug).whereNotNull('published_edition_id').first('id', 'slug', {
        publishedEditionId: 'published_edition_id',
        firstPublishedAt: 'first_published_at',
      });
    },

    /** The write-up with the text that is published now. */
    async withContent(slug: string): Promise<(WriteUpRow & { content: EditionContent }) | undefined> {
      const row = await knex('write_ups as w')
        .join('editions as e', 'e.id', 'w.published_edition_id')
        .where('w.slug', slug)
        .first('w.id', 'w.slug', 'e.content', {
          publishedEditionId: 'w.published_edition_id',
          firstPublishedAt: 'w.first_published_at',
        });
      return row && { ...row, content: fromJson<EditionContent>(row.content) };
    },

    /** Every published edition without its text, the newest first. */
    async editionsOf(writeUpId: number): Promise<PublishedEditionRow[]> {
      return knex('editions as e')
        .join('accounts as a', 'a.id', 'e.author_id')
        .where({ 'e.write_up_id': writeUpId, 'e.state': 'published' })
        .orderBy('e.number', 'desc')
        .select('e.id', 'e.number', 'e.title', {
          authorId: 'e.author_id',
          authorName: 'a.display_name',
          changeNote: 'e.change_note',
          publishedAt: 'e.published_at',
        });
    },

    async contents(editionIds: readonly number[]): Promise<Map<number, EditionContent>> {
      const rows: { id: number; content: unknown }[] = await knex('editions')
        .whereIn('id', editionIds)
        .select('id', 'content');
      return new Map(rows.map((row) => [row.id, fromJson<EditionContent>(row.content)]));
    },

    /** The text that is published now; undefined while none is. Inside a transaction that holds the write-up it cannot change. */
    async publishedContent(db: Knex, writeUpId: number): Promise<EditionContent | undefined> {
      const row = await db('write_ups as w')
        .join('editions as e', 'e.id', 'w.published_edition_id')
        .where('w.id', writeUpId)
        .first('e.content');
      return row && fromJson<EditionContent>(row.content);
    },

    /** Address and title of a write-up; undefined while none of its editions is published. */
    async publishedRef(db: Knex, writeUpId: number): Promise<{ slug: string; title: string } | undefined> {
      return db('write_ups as w')
        .join('editions as e', 'e.id', 'w.published_edition_id')
        .where('w.id', writeUpId)
        .first('w.slug', 'e.title');
    },

    /** Accounts that wrote one of the published editions. */
    async authorIds(db: Knex, writeUpId: number): Promise<number[]> {
      return db('editions')
        .where({ write_up_id: writeUpId, state: 'published' })
        .distinct()
        .pluck('author_id');
    },

    /** Those it belongs to: the authors, and whoever looks after it since its author has left. */
    async keeperIds(db: Knex, writeUpId: number): Promise<number[]> {
      const [authors, keepers] = await Promise.all([
        this.authorIds(db, writeUpId),
        db('write_ups').where('id', writeUpId).pluck('created_by'),
      ]);
      return [...new Set([...authors, ...keepers])];
    },
  };
}
