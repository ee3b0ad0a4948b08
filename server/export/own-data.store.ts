import type { Knex } from 'knex';
import type { Photo } from '../../shared/contract/photos.js';
import { fromJson } from '../rows.js';
import type { Section } from './sections.js';

/** Rows read at once. */
const batch = 200;

export type OwnDataStore = ReturnType<typeof createOwnDataStore>;

export function createOwnDataStore(knex: Knex) {
  /** Batches of rows, each read when the one before is used up. */
  async function* inBatches<Row extends { cursor: unknown }>(
    rowsAfter: (cursor: unknown) => PromiseLike<Row[]>,
  ): AsyncGenerator<Row[]> {
    let cursor: unknown = null;
    for (;;) {
      const rows = await rowsAfter(cursor);
      if (rows.length > 0) yield rows;
      if (rows.length < batch) return;
      cursor = rows.at(-1)!.cursor;
    }
  }

  return {
    /** What a section holds of a person, in the order in which it came. */
    async *rowsOf(section: Section, accountId: number): AsyncGenerator<Record<string, unknown>> {
      const read = (cursor: unknown): PromiseLike<(Record<string, unknown> & { cursor: unknown })[]> => {
        const query = knex({ t: section.table })
          .whereRaw(section.whose, { account: accountId })
          .orderByRaw(section.key)
          .limit(batch)
          .select({ cursor: knex.raw(section.key) })
          .select(
            Object.entries(section.fields).map(([name, value]) =>
              /^\w+$/.test(value) ? { [name]: `t.${value}` } : knex.raw(`${value} AS ??`, [name]),
            ),
          );
        return cursor === null ? query : query.whereRaw(`${section.key} > ?`, [cursor as number]);
      };
      for await (const rows of inBatches(read)) {
        for (const { cursor: _, ...row } of rows) yield toPlain(row, section);
      }
    },

    /** Photos of a person with what their files are called by. */
    async *photosOf(accountId: number): AsyncGenerator<Pick<Photo, 'hash' | 'widths'>> {
      const read = (cursor: unknown) =>
        knex('photos')
          .where('owner_id', accountId)
          .where('id', '>', (cursor as number | null) ?? 0)
          .orderBy('id')
          .limit(batch)
          .select('hash', 'widths', { cursor: 'id' });
      for await (const rows of inBatches<{ hash: string; widths: unknown; cursor: unknown }>(read)) {
        for (const { hash, widths } of rows) yield { hash, widths: fromJson<number[]>(widths) };
      }
    },
  };
}

function toPlain(row: Record<string, unknown>, section: Section): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(row).map(([name, value]) => {
      if (section.json.includes(name)) return [name, value === null ? null : fromJson(value)];
      return [name, section.flags.includes(name) && value !== null ? Boolean(value) : value];
    }),
  );
}
