import type { Knex } from 'knex';
import type { LibraryChange, LibraryEntry, LibraryVersion } from '../../shared/contract/caution-library.js';
import type { LibraryCaution } from '../../shared/contract/moderation.js';
import { fromJson } from '../rows.js';

/** What an entry says. */
export type EntryWords = Omit<LibraryCaution, 'id'>;

export interface VersionRow extends LibraryVersion {
  readonly words: EntryWords;
}

interface WordsRecord {
  name: string;
  signalWord: LibraryCaution['signalWord'];
  hazards: unknown;
  hazard: string;
  consequence: string;
  avoidance: string;
}

const columnsOf = (table: string) => ({
  name: `${table}.name`,
  signalWord: `${table}.signal_word`,
  hazards: `${table}.hazards`,
  hazard: `${table}.hazard`,
  consequence: `${table}.consequence`,
  avoidance: `${table}.avoidance`,
});

/** The library of cautions and its history. */
export const libraryStore = {
  /** In their order, the retired ones too, with how many cautions stand that were taken from each. */
  async entries(db: Knex, only: { id?: number } = {}): Promise<LibraryEntry[]> {
    const uses = db('cautions as c').whereRaw('c.library_id = l.id').whereNull('c.removed_at').count('*');
    const query = db('caution_library as l')
      .orderBy(['l.position', 'l.id'])
      .select({ id: 'l.id', version: 'l.version', retiredAt: 'l.retired_at', ...columnsOf('l') })
      .select(db.raw('(?) AS uses', [uses]));
    if (only.id !== undefined) void query.where('l.id', only.id);
    const rows: (WordsRecord & { id: number; version: number; retiredAt: Date | null; uses: number })[] =
      await query;
    return rows.map(({ id, version, retiredAt, uses: count, ...words }) => ({
      id,
      ...wordsOf(words),
      version,
      retired: retiredAt !== null,
      uses: Number(count),
    }));
  },

  /** Holds an entry until the transaction ends. */
  async hold(trx: Knex, id: number): Promise<void> {
    await trx('caution_library').where({ id }).forUpdate().first('id');
  },

  /** Adds an entry behind all others; its first version is written beside. */
  async add(trx: Knex, slug: string, words: EntryWords): Promise<number> {
    const row: { last?: number | null } | undefined = await trx('caution_library')
      .max({ last: 'position' })
      .first();
    const [id] = await trx('caution_library').insert({
      slug,
      ...recordOf(words),
      position: (row?.last ?? 0) + 1,
    });
    return id!;
  },

  async change(
    trx: Knex,
    id: number,
    change: { version: number; words: EntryWords; retiredAt?: Date | null },
  ): Promise<void> {
    const { version, words, retiredAt } = change;
    await trx('caution_library')
      .where({ id })
      .update({ ...recordOf(words), version, ...(retiredAt === undefined ? {} : { retired_at: retiredAt }) });
  },

  async addVersion(
    trx: Knex,
    id: number,
    entry: { version: number; change: LibraryChange; words: EntryWords; by: number; at: Date; why: string },
  ): Promise<void> {
    await trx('caution_library_versions').insert({
      library_id: id,
      version: entry.version,
      change: entry.change,
      ...recordOf(entry.words),
      changed_by: entry.by,
      changed_at: entry.at,
      why: entry.why,
    });
  },

  /** The newest first. */
  async versions(db: Knex, id: number): Promise<VersionRow[]> {
    const rows: (WordsRecord & {
      version: number;
      change: LibraryChange;
      byId: number | null;
      byName: string | null;
      at: Date;
      why: string;
    })[] = await db('caution_library_versions as v')
      .leftJoin('accounts as a', 'a.id', 'v.changed_by')
      .where('v.library_id', id)
      .orderBy('v.version', 'desc')
      .select('v.version', 'v.change', 'v.why', {
        byId: 'a.id',
        byName: 'a.display_name',
        at: 'v.changed_at',
        ...columnsOf('v'),
      });
    return rows.map(({ version, change, byId, byName, at, why, ...record }) => {
      const words = wordsOf(record);
      return {
        version,
        change,
        name: words.name,
        by: byId === null ? null : { id: byId, displayName: byName ?? '' },
        at: at.toISOString(),
        why,
        words,
      };
    });
  },

  /** Identities in their order, held until the transaction ends. */
  async holdOrder(trx: Knex): Promise<number[]> {
    return trx('caution_library').orderBy(['position', 'id']).forUpdate().pluck('id');
  },

  async setOrder(trx: Knex, ids: readonly number[]): Promise<void> {
    const cases = ids.flatMap((id, position) => [id, position + 1]);
    await trx('caution_library').update({
      position: trx.raw(`CASE id ${'WHEN ? THEN ? '.repeat(ids.length)}ELSE position END`, cases),
    });
  },
};

function wordsOf({ hazards, ...words }: WordsRecord): EntryWords {
  return { ...words, hazards: fromJson(hazards) };
}

function recordOf({ name, signalWord, hazards, hazard, consequence, avoidance }: EntryWords): object {
  return { name, signal_word: signalWord, hazards: JSON.stringify(hazards), hazard, consequence, avoidance };
}
