import type { Knex } from 'knex';

export interface ProposedRow {
  readonly editionId: number;
  readonly slug: string;
  readonly title: string;
  readonly authorId: number;
  readonly authorName: string;
  readonly changeNote: string;
  readonly submittedAt: Date;
  /** What the reader told the desk of it; null together where nothing. */
  readonly agrees: number | null;
  readonly line: string | null;
  readonly at: Date | null;
  readonly readerName: string | null;
}

export interface OpinionRow {
  readonly personId: number;
  readonly displayName: string;
  readonly agrees: boolean;
  readonly line: string;
  readonly at: Date;
}

export type ProposedEditionStore = ReturnType<typeof createProposedEditionStore>;

/** Editions on the desk as the authors of their write-ups see them, and what those tell the desk. */
export function createProposedEditionStore(knex: Knex) {
  /** Editions that wait on the desk, by others, on write-ups of which the reader wrote a published edition or looks after. */
  const proposedTo = (readerId: number) =>
    knex('editions as e')
      .join('write_ups as w', 'w.id', 'e.write_up_id')
      .join('accounts as a', 'a.id', 'e.author_id')
      .leftJoin('edition_opinions as o', (join) =>
        join.on('o.edition_id', 'e.id').andOn('o.account_id', knex.raw('?', [readerId])),
      )
      .leftJoin('accounts as r', 'r.id', 'o.account_id')
      .where('e.state', 'submitted')
      .whereNotNull('w.published_edition_id')
      .whereNot('e.author_id', readerId)
      .where((belongs) =>
        belongs.where('w.created_by', readerId).orWhereExists(
          knex('editions as own')
            .where('own.write_up_id', knex.ref('e.write_up_id'))
            .where({ 'own.author_id': readerId, 'own.state': 'published' })
            .select(knex.raw('1')),
        ),
      )
      .select('w.slug', 'e.title', 'o.agrees', 'o.line', 'o.at', {
        editionId: 'e.id',
        authorId: 'a.id',
        authorName: 'a.display_name',
        changeNote: 'e.change_note',
        submittedAt: 'e.submitted_at',
        readerName: 'r.display_name',
      });

  return {
    /** The last handed in first. */
    async list(
      readerId: number,
      options: { after?: { at: Date; id: number } | undefined; rows: number },
    ): Promise<ProposedRow[]> {
      const query = proposedTo(readerId)
        .orderBy([
          { column: 'e.submitted_at', order: 'desc' },
          { column: 'e.id', order: 'desc' },
        ])
        .limit(options.rows);
      const { after } = options;
      if (after) {
        void query
          .where('e.submitted_at', '<=', after.at)
          .where((either) => either.where('e.submitted_at', '<', after.at).orWhere('e.id', '<', after.id));
      }
      return query;
    },

    async find(readerId: number, editionId: number): Promise<ProposedRow | undefined> {
      return proposedTo(readerId).where('e.id', editionId).first();
    },

    /** One for each author and edition: a second one takes the place of the first. */
    async put(opinion: {
      editionId: number;
      accountId: number;
      agrees: boolean;
      line: string;
      at: Date;
    }): Promise<void> {
      const { agrees, line, at } = opinion;
      await knex('edition_opinions')
        .insert({ edition_id: opinion.editionId, account_id: opinion.accountId, agrees, line, at })
        .onConflict(['edition_id', 'account_id'])
        .merge(['agrees', 'line', 'at']);
    },

    async opinionsOn(editionId: number): Promise<OpinionRow[]> {
      const rows: (Omit<OpinionRow, 'agrees'> & { agrees: number })[] = await knex('edition_opinions as o')
        .join('accounts as a', 'a.id', 'o.account_id')
        .where('o.edition_id', editionId)
        .orderBy(['o.at', 'a.id'])
        .select('o.agrees', 'o.line', 'o.at', { personId: 'a.id', displayName: 'a.display_name' });
      return rows.map((row) => ({ ...row, agrees: Boolean(row.agrees) }));
    },
  };
}
