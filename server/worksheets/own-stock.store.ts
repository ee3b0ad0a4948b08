import type { Knex } from 'knex';
import type { OwnStock } from '../../shared/contract/own-stock.js';
import { isDuplicate } from '../rows.js';

export type OwnStockStore = ReturnType<typeof createOwnStockStore>;

export function createOwnStockStore(knex: Knex) {
  return {
    async of(accountId: number): Promise<OwnStock[]> {
      return knex('own_stock')
        .where('account_id', accountId)
        .select('id', 'name', 'thickness', 'uncertainty', 'available')
        .orderBy(['thickness', 'id']);
    },

    async add(accountId: number, stock: Omit<OwnStock, 'id'>): Promise<number | 'already-there'> {
      try {
        const [id] = await knex('own_stock').insert({ ...stock, account_id: accountId });
        return id!;
      } catch (error) {
        if (isDuplicate(error)) return 'already-there';
        throw error;
      }
    },

    /** Whether there was one to remove. */
    async remove(accountId: number, id: number): Promise<boolean> {
      return (await knex('own_stock').where({ account_id: accountId, id }).delete()) > 0;
    },
  };
}
