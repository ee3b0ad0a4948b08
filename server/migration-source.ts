import { readdir } from 'node:fs/promises';
import { dirname, extname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { Knex } from 'knex';

const ownFile = fileURLToPath(import.meta.url);

/**
 * The migrations beside this program, as TypeScript or compiled, whichever it runs as itself. They go by their name
 * without ending, so that a database made by the one is known to the other.
 */
export const migrationSource: Knex.MigrationSource<string> = {
  async getMigrations() {
    const files = await readdir(folder);
    return files
      .filter((file) => extname(file) === ending && !file.endsWith(`.d${ending}`))
      .map((file) => file.slice(0, -ending.length))
      .sort();
  },
  getMigrationName: (migration) => migration,
  getMigration: (migration) =>
    import(pathToFileURL(join(folder, migration + ending)).href) as Promise<Knex.Migration>,
};

const folder = join(dirname(ownFile), '..', 'migrations');
const ending = extname(ownFile);

/** Brings the schema to the newest state. Returns the names of the migrations that were run. */
export async function migrateToLatest(knex: Knex): Promise<string[]> {
  // Tables take their character set and collation from the database, and a hosted one may have been made with others.
  await knex.raw('ALTER DATABASE CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci');
  const [, names] = (await knex.migrate.latest({ migrationSource })) as [number, string[]];
  return names;
}

/** Takes every migration back; all data goes. */
export async function takeAllMigrationsBack(knex: Knex): Promise<void> {
  await knex.migrate.rollback({ migrationSource }, true);
}
