import type { Knex } from 'knex';
import { baseOfNext } from './withdrawal.store.js';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { EditionState } from '../../shared/contract/vocabulary.js';
import type { MyWriteUp } from '../../shared/contract/write-ups.js';
import { fromJson } from '../rows.js';

/** An edition in any state, as its author works on it. */
export interface EditionRow {
  readonly id: number;
  readonly writeUpId: number;
  readonly slug: string | null;
  readonly number: number;
  readonly state: EditionState;
  readonly authorId: number;
  readonly authorName: string;
  /** The published edition it was started from or last merged with; null for a first edition. */
  readonly baseEditionId: number | null;
  /** The edition that is published now. */
  readonly publishedEditionId: number | null;
  readonly changeNote: string;
  readonly content: EditionContent;
  readonly version: number;
  readonly updatedAt: Date;
  readonly submittedAt: Date | null;
  readonly returnReason: string | null;
  readonly discardedAt: Date | null;
}

export interface SavedText {
  readonly content: EditionContent;
  readonly changeNote: string;
  /** The edition that the text was merged with since; undefined leaves its base as it is. */
  readonly baseEditionId?: number | undefined;
}

export type DraftStore = ReturnType<typeof createDraftStore>;

/** Editions that are not published yet. Every write names the state it starts from, so that of two at once one wins. */
export function createDraftStore(knex: Knex) {
  const editions = (db: Knex = knex) =>
    db('editions as e')
      .join('write_ups as w', 'w.id', 'e.write_up_id')
      .join('accounts as a', 'a.id', 'e.author_id')
      .select('e.id', 'e.number', 'e.state', 'e.content', 'e.version', 'w.slug', {
        writeUpId: 'e.write_up_id',
        authorId: 'e.author_id',
        authorName: 'a.display_name',
        baseEditionId: 'e.base_edition_id',
        publishedEditionId: baseOfNext(db, 'w'),
        changeNote: 'e.change_note',
        updatedAt: 'e.updated_at',
        submittedAt: 'e.submitted_at',
        returnReason: 'e.return_reason',
        discardedAt: 'e.discarded_at',
      });

  return {
    async edition(id: number): Promise<EditionRow | undefined> {
      return toEdition(await editions().where('e.id', id).first());
    },

    /** Holds the row until the transaction ends; what it gives is the newest state, whatever was read before. */
    async lockEdition(trx: Knex, id: number): Promise<EditionRow | undefined> {
      await trx('editions').where('id', id).forUpdate().first('id');
      return toEdition(await editions(trx).where('e.id', id).forShare().first());
    },

    async editionOfAuthor(id: number, authorId: number): Promise<EditionRow | undefined> {
      return toEdition(await editions().where({ 'e.id': id, 'e.author_id': authorId }).first());
    },

    /** The edition of a write-up that an author has under way, the newest first where there are several. */
    async openEditionOf(db: Knex, writeUpId: number, authorId: number): Promise<number | undefined> {
      const row = await db('editions')
        .where({ write_up_id: writeUpId, author_id: authorId })
        .whereNot('state', 'published')
        .whereNull('discarded_at')
        .orderBy('id', 'desc')
        .first('id');
      return row?.id;
    },

    async addWriteUp(trx: Knex, authorId: number, at: Date): Promise<number> {
      const [id] = await trx('write_ups').insert({ created_by: authorId, created_at: at });
      return id!;
    },

    async addDraft(
      trx: Knex,
      draft: {
        writeUpId: number;
        number: number;
        authorId: number;
        baseEditionId: number | null;
        content: EditionContent;
        changeNote: string;
        at: Date;
      },
    ): Promise<number> {
      const [id] = await trx('editions').insert({
        write_up_id: draft.writeUpId,
        number: draft.number,
        author_id: draft.authorId,
        base_edition_id: draft.baseEditionId,
        title: draft.content.title,
        content: JSON.stringify(draft.content),
        change_note: draft.changeNote,
        created_at: draft.at,
        updated_at: draft.at,
      });
      return id!;
    },

    async nextNumber(trx: Knex, writeUpId: number): Promise<number> {
      const row = await trx('editions').where('write_up_id', writeUpId).max({ last: 'number' }).first();
      return Number(row?.['last'] ?? 0) + 1;
    },

    /** Compare and set: false where the row is not in that version, not the author's, on the desk or thrown away. */
    async save(
      trx: Knex,
      id: number,
      authorId: number,
      version: number,
      text: SavedText,
      at: Date,
    ): Promise<boolean> {
      const changed = await workable(trx, id, authorId)
        .where('version', version)
        .update({
          title: text.content.title,
          content: JSON.stringify(text.content),
          change_note: text.changeNote,
          ...(text.baseEditionId === undefined ? {} : { base_edition_id: text.baseEditionId }),
          version: version + 1,
          updated_at: at,
        });
      return changed > 0;
    },

    async submit(trx: Knex, id: number, authorId: number, version: number, at: Date): Promise<boolean> {
      const changed = await workable(trx, id, authorId)
        .where('version', version)
        .update({ state: 'submitted', submitted_at: at, updated_at: at, version: version + 1 });
      return changed > 0;
    },

    async recall(id: number, authorId: number, at: Date): Promise<boolean> {
      const changed = await knex('editions')
        .where({ id, author_id: authorId, state: 'submitted' })
        .update({ state: 'draft', submitted_at: null, updated_at: at, version: knex.raw('version + 1') });
      return changed > 0;
    },

    async discard(id: number, authorId: number, at: Date): Promise<boolean> {
      return (await workable(knex, id, authorId).update({ discarded_at: at })) > 0;
    },

    async restore(trx: Knex, id: number, authorId: number, at: Date): Promise<boolean> {
      const changed = await trx('editions')
        .where({ id, author_id: authorId })
        .whereNotNull('discarded_at')
        .update({ discarded_at: null, updated_at: at });
      return changed > 0;
    },

    /** Editions of an author, the last touched first; those thrown away are left out. */
    async mine(
      authorId: number,
      options: {
        state?: EditionState | undefined;
        after?: { at: Date; id: number } | undefined;
        rows: number;
      },
    ): Promise<MyWriteUpRow[]> {
      const query = knex('editions as e')
        .join('write_ups as w', 'w.id', 'e.write_up_id')
        .where('e.author_id', authorId)
        .whereNull('e.discarded_at')
        .orderBy([
          { column: 'e.updated_at', order: 'desc' },
          { column: 'e.id', order: 'desc' },
        ])
        .limit(options.rows)
        .select('w.slug', 'e.number', 'e.state', 'e.title', {
          editionId: 'e.id',
          updatedAt: 'e.updated_at',
          returnReason: 'e.return_reason',
        });
      const { state, after } = options;
      if (state) void query.where('e.state', state);
      if (after) {
        void query
          .where('e.updated_at', '<=', after.at)
          .where((either) => either.where('e.updated_at', '<', after.at).orWhere('e.id', '<', after.id));
      }
      return query;
    },
  };
}

export type MyWriteUpRow = Omit<MyWriteUp, 'updatedAt'> & { updatedAt: Date };

function workable(db: Knex, id: number, authorId: number): Knex.QueryBuilder {
  return db('editions')
    .where({ id, author_id: authorId })
    .whereIn('state', ['draft', 'returned'])
    .whereNull('discarded_at');
}

function toEdition(
  row: (Omit<EditionRow, 'content'> & { content: unknown }) | undefined,
): EditionRow | undefined {
  return row && { ...row, content: fromJson<EditionContent>(row.content) };
}
