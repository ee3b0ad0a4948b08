import { cp, mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { Knex } from 'knex';
import { openDatabase } from '../../database.js';
import { loadDatabase } from './client-programs.js';
import type { BackupPlaces } from './make-backup.js';
import { filesUnder, readCheckedManifest } from './manifest.js';

/** The place to restore into holds something that would be lost. */
export class NotEmpty extends Error {}

/**
 * Brings database and photos to the state of the backup. The backup is checked against its note before anything is
 * touched; the photos come first, so that no row ever points at files that are not there. The app must not run.
 *
 * @param replace whether what the database and the photo folder hold may be lost; NotEmpty is thrown otherwise
 */
export async function restoreBackup(folder: string, places: BackupPlaces, replace: boolean): Promise<void> {
  const manifest = await readCheckedManifest(folder);
  const knex = openDatabase(places.databaseUrl);
  try {
    const tables = await tablesOf(knex);
    if (!replace) await demandEmpty(knex, tables, places.photoDir);
    const photos = Object.keys(manifest.files)
      .filter((path) => path.startsWith('photos/'))
      .map((path) => path.slice('photos/'.length));
    await mkdir(places.photoDir, { recursive: true });
    for (const path of photos) await cp(join(folder, 'photos', path), join(places.photoDir, path));
    await dropTables(knex, tables);
    await loadDatabase(places.databaseUrl, join(folder, 'database.sql'));
    await removeAllBut(new Set(photos), places.photoDir);
  } finally {
    await knex.destroy();
  }
}

async function demandEmpty(knex: Knex, tables: readonly string[], photoDir: string): Promise<void> {
  for (const table of tables.filter((name) => !name.startsWith('knex_'))) {
    if (await knex(table).select(knex.raw('1')).first()) {
      throw new NotEmpty(
        `The database is not empty (${table} has rows): give --replace if all in it may be lost.`,
      );
    }
  }
  if ((await filesUnder(photoDir)).length > 0) {
    throw new NotEmpty(`${photoDir} is not empty: give --replace if the photos in it may be lost.`);
  }
}

async function tablesOf(knex: Knex): Promise<string[]> {
  const [rows] = (await knex.raw(
    "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE'",
  )) as [{ name: string }[]];
  return rows.map((row) => row.name);
}

/** A table of a later schema would stay beside the restored ones. */
async function dropTables(knex: Knex, tables: readonly string[]): Promise<void> {
  if (tables.length === 0) return;
  // One transaction has one connection, which the setting holds for.
  await knex.transaction(async (trx) => {
    await trx.raw('SET SESSION foreign_key_checks = 0');
    await trx.raw(`DROP TABLE ${tables.map(() => '??').join(', ')}`, [...tables]);
    await trx.raw('SET SESSION foreign_key_checks = 1');
  });
}

async function removeAllBut(kept: ReadonlySet<string>, photoDir: string): Promise<void> {
  for (const path of await filesUnder(photoDir)) {
    if (!kept.has(path)) await rm(join(photoDir, path));
  }
}
