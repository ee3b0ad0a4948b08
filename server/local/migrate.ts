import { migrateToLatest } from '../migration-source.js';
import { openDatabase } from '../database.js';
import { databaseUrl } from './places.js';

const knex = openDatabase(databaseUrl(process.env));
try {
  const names = await migrateToLatest(knex);
  console.log(names.length === 0 ? 'The schema is up to date.' : `Migrated: ${names.join(', ')}.`);
} finally {
  await knex.destroy();
}
