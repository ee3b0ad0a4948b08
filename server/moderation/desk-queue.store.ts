import type { Knex } from 'knex';
import { deskItemKinds, type DeskItemKind } from '../../shared/contract/desk-queue.js';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import { fromJson } from '../rows.js';

/** Place in the queue: how long it waits, then the rank of its kind, then its identity. */
export interface QueuePlace {
  readonly at: Date;
  readonly rank: number;
  readonly id: number;
}

export interface QueueWish {
  readonly kind: DeskItemKind | undefined;
  readonly claim: 'free' | 'mine' | undefined;
  readonly words: string | undefined;
  readonly moderatorId: number;
  readonly now: Date;
  readonly after: QueuePlace | undefined;
  readonly rows: number;
}

export interface QueueRow extends QueuePlace {
  readonly title: string;
  readonly personId: number;
  readonly displayName: string;
  readonly holderId: number | null;
  readonly holderName: string | null;
  readonly until: Date | null;
}

/** Where one kind of item waits; the columns are named with the alias of its table. */
interface Source {
  readonly waiting: (db: Knex) => Knex.QueryBuilder;
  readonly id: string;
  readonly since: string;
  readonly person: string;
  /** SQL of a text in the collation of the database. */
  readonly title: string;
}

/** Texts inside JSON have a collation of their own, which neither a union nor a search by words takes. */
const inJson = (column: string, member: string): string =>
  `CONVERT(JSON_VALUE(${column}, '$.${member}') USING utf8mb4) COLLATE utf8mb4_unicode_ci`;

const sources: Record<DeskItemKind, Source> = {
  edition: {
    waiting: (db) => db('editions as s').where('s.state', 'submitted'),
    id: 's.id',
    since: 's.submitted_at',
    person: 's.author_id',
    title: 's.title',
  },
  proposal: {
    waiting: (db) => db('hardware_proposals as s').where('s.state', 'waiting'),
    id: 's.id',
    since: 's.created_at',
    person: 's.account_id',
    title: `COALESCE(${inJson('s.payload', 'label')}, ${inJson('s.payload', 'name')})`,
  },
  'maker-request': {
    waiting: (db) =>
      db('maker_requests as s').join('makers as m', 'm.id', 's.maker_id').where('s.state', 'waiting'),
    id: 's.id',
    since: 's.created_at',
    person: 's.account_id',
    title: 'm.name',
  },
  flag: {
    waiting: (db) => db('flagged as s').where('s.state', 'waiting'),
    id: 's.id',
    since: 's.created_at',
    person: 's.writer_id',
    title: 's.title',
  },
  'first-post': {
    waiting: (db) => db('first_posts as s').where('s.state', 'waiting'),
    id: 's.id',
    since: 's.created_at',
    person: 's.account_id',
    title: 's.title',
  },
  photo: {
    waiting: (db) =>
      db('photo_looks as s').join('photos as f', 'f.id', 's.photo_id').where('s.state', 'waiting'),
    id: 's.photo_id',
    since: 's.created_at',
    person: 'f.owner_id',
    title: 'f.alt',
  },
};

export type DeskQueueStore = ReturnType<typeof createDeskQueueStore>;

/** Read model of the whole desk: one statement over everything that waits, whatever kind it is. */
export function createDeskQueueStore(knex: Knex) {
  return {
    /** The longest wait first. Each kind gives at most as many rows as are asked for, by an index of its own. */
    async waiting(wish: QueueWish): Promise<QueueRow[]> {
      const kinds = wish.kind === undefined ? deskItemKinds : [wish.kind];
      return knex
        .unionAll(
          kinds.map((kind) => ofKind(knex, kind, wish)),
          true,
        )
        .orderBy(['at', 'rank', 'id'])
        .limit(wish.rows);
    },

    async counts(): Promise<Record<DeskItemKind, number>> {
      const query = knex.queryBuilder();
      for (const kind of deskItemKinds) void query.select({ [kind]: sources[kind].waiting(knex).count('*') });
      const row = (await query.first()) as Record<DeskItemKind, number>;
      return Object.fromEntries(deskItemKinds.map((kind) => [kind, Number(row[kind])])) as Record<
        DeskItemKind,
        number
      >;
    },

    /** Texts of editions, for the hazards they name. */
    async contentsOf(
      editionIds: readonly number[],
    ): Promise<Map<number, { writeUpId: number; content: EditionContent }>> {
      if (editionIds.length === 0) return new Map();
      const rows: { id: number; writeUpId: number; content: unknown }[] = await knex('editions')
        .whereIn('id', editionIds)
        .select('id', 'content', { writeUpId: 'write_up_id' });
      return new Map(
        rows.map(({ id, writeUpId, content }) => [
          id,
          { writeUpId, content: fromJson<EditionContent>(content) },
        ]),
      );
    },
  };
}

function ofKind(knex: Knex, kind: DeskItemKind, wish: QueueWish): Knex.QueryBuilder {
  const source = sources[kind];
  const rank = deskItemKinds.indexOf(kind);
  const query = source
    .waiting(knex)
    .join('accounts as a', 'a.id', source.person)
    .leftJoin('desk_claims as c', (on) =>
      on.on('c.item_id', source.id).andOnVal('c.kind', kind).andOnVal('c.until', '>', wish.now),
    )
    .leftJoin('accounts as h', 'h.id', 'c.moderator_id')
    .select(knex.raw('? AS `rank`', [rank]), knex.raw(`${source.title} AS title`), {
      id: source.id,
      at: source.since,
      personId: 'a.id',
      displayName: 'a.display_name',
      holderId: 'h.id',
      holderName: 'h.display_name',
      until: 'c.until',
    })
    .orderBy([source.since, source.id])
    .limit(wish.rows);
  if (wish.after) keepAfter(query, source, rank, wish.after);
  if (wish.claim === 'free') void query.whereNull('c.moderator_id');
  if (wish.claim === 'mine') void query.where('c.moderator_id', wish.moderatorId);
  const { words } = wish;
  if (words)
    void query.where((either) =>
      either
        .whereRaw(`INSTR(${source.title}, ?) > 0`, [words])
        .orWhereRaw('INSTR(a.display_name, ?) > 0', [words]),
    );
  return query;
}

/** The first bound alone lets the index do its work. */
function keepAfter(query: Knex.QueryBuilder, source: Source, rank: number, after: QueuePlace): void {
  if (rank < after.rank) {
    void query.where(source.since, '>', after.at);
    return;
  }
  void query.where(source.since, '>=', after.at);
  if (rank === after.rank)
    void query.where((either) => either.where(source.since, '>', after.at).orWhere(source.id, '>', after.id));
}
