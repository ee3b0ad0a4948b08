import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { SignalWord } from '../../shared/contract/vocabulary.js';
import { fromJson } from '../rows.js';

/** Entries in a feed. */
const most = 30;

export interface WriteUpEntry {
  readonly id: number;
  readonly slug: string;
  readonly content: EditionContent;
  readonly author: string;
  readonly firstPublishedAt: Date;
  readonly publishedAt: Date;
}
export interface CautionEntry {
  readonly id: number;
  readonly slug: string;
  readonly title: string;
  readonly signalWord: SignalWord;
  readonly hazard: string;
  readonly consequence: string;
  readonly avoidance: string;
  readonly at: Date;
}
export interface QuestionEntry {
  readonly id: number;
  readonly slug: string;
  readonly title: string;
  readonly text: string;
  readonly person: string;
  readonly at: Date;
}

export type FeedStore = ReturnType<typeof createFeedStore>;

/** What is new; what is withdrawn or taken down is not. `partId` null: about any part. */
export function createFeedStore(knex: Knex) {
  /** Editions that say something of a part. */
  const about = (partId: number) => knex('edition_sides').where('part_id', partId).select('edition_id');

  return {
    async partNamed(slug: string): Promise<{ id: number; name: string; maker: string } | undefined> {
      return knex('parts as p')
        .join('makers as m', 'm.id', 'p.maker_id')
        .where('p.slug', slug)
        .first('p.id', 'p.name', { maker: 'm.name' });
    },

    async writeUps(partId: number | null): Promise<WriteUpEntry[]> {
      const query = knex('write_ups as w')
        .join('editions as e', 'e.id', 'w.published_edition_id')
        .join('accounts as a', 'a.id', 'e.author_id')
        .orderBy([
          { column: 'e.published_at', order: 'desc' },
          { column: 'e.id', order: 'desc' },
        ])
        .limit(most)
        .select('w.id', 'w.slug', 'e.content', {
          author: 'a.display_name',
          firstPublishedAt: 'w.first_published_at',
          publishedAt: 'e.published_at',
        });
      if (partId !== null) void query.whereIn('e.id', about(partId));
      return (await query).map((row: WriteUpEntry) => ({
        ...row,
        content: fromJson<EditionContent>(row.content),
      }));
    },

    async cautions(partId: number | null): Promise<CautionEntry[]> {
      const query = knex('cautions as c')
        .join('write_ups as w', 'w.id', 'c.write_up_id')
        .join('editions as e', 'e.id', 'w.published_edition_id')
        .whereNull('c.removed_at')
        .orderBy([
          { column: 'c.placed_at', order: 'desc' },
          { column: 'c.id', order: 'desc' },
        ])
        .limit(most)
        .select('c.id', 'w.slug', 'e.title', 'c.hazard', 'c.consequence', 'c.avoidance', {
          signalWord: 'c.signal_word',
          at: 'c.placed_at',
        });
      if (partId !== null) void query.whereIn('e.id', about(partId));
      return query;
    },

    async questions(partId: number): Promise<QuestionEntry[]> {
      return knex('questions as q')
        .join('accounts as a', 'a.id', 'q.account_id')
        .whereIn('q.id', knex('question_parts').where('part_id', partId).select('question_id'))
        .whereNotNull('q.slug')
        .whereNull('q.taken_down_at')
        .orderBy('q.id', 'desc')
        .limit(most)
        .select('q.id', 'q.slug', 'q.title', 'q.text', { person: 'a.display_name', at: 'q.created_at' });
    },
  };
}
