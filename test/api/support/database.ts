import type { Knex } from 'knex';
import { openDatabase } from '../../../server/database.js';
import { migrateToLatest } from '../../../server/migration-source.js';
import { fromSetUp, workerNumber } from './environment.js';

/** Makes the empty schema `shimlore_<name>` where it is missing. Returns its address. */
export async function makeSchema(name: string): Promise<string> {
  const schema = `shimlore_${name}`;
  const knex = openDatabase(fromSetUp('TEST_DATABASE_URL'));
  try {
    await knex.raw('CREATE DATABASE IF NOT EXISTS ??', [schema]);
  } finally {
    await knex.destroy();
  }
  const address = new URL(fromSetUp('TEST_DATABASE_URL'));
  address.pathname = `/${schema}`;
  return address.href;
}

/** The worker's own schema, migrated and with nothing in its tables. */
export async function openEmptyDatabase(): Promise<{ knex: Knex; url: string }> {
  const url = await makeSchema(`worker_${workerNumber}`);
  const knex = openDatabase(url);
  await migrateToLatest(knex);
  await emptyTables(knex);
  return { knex, url };
}

async function emptyTables(knex: Knex): Promise<void> {
  const [rows] = (await knex.raw(
    "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE' AND table_name NOT LIKE 'knex\\_%'",
  )) as [{ name: string }[]];
  // The log refuses to have rows taken out; emptying it whole is another matter to the database.
  await knex('audit_log').truncate();
  // One transaction has one connection, which the setting holds for.
  await knex.transaction(async (trx) => {
    await trx.raw('SET SESSION foreign_key_checks = 0');
    for (const { name } of rows.filter((row) => row.name !== 'audit_log')) await trx(name).delete();
    await trx.raw('SET SESSION foreign_key_checks = 1');
  });
}
