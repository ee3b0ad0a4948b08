import { join } from 'node:path';
import { makeBackup } from './backup/make-backup.js';
import { databaseUrl, photoDirectory } from './places.js';

/** `npm run backup [-- <folder>]`: the backup goes into a dated folder in `<folder>`, data/backups by default. */
const targetDir = process.argv[2] ?? join(process.env['SHIMLORE_DATA'] || 'data', 'backups');
try {
  const places = { databaseUrl: databaseUrl(process.env), photoDir: photoDirectory(process.env) };
  console.log(`Backed up to ${await makeBackup(places, targetDir, () => new Date())}`);
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}
