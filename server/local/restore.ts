import { createInterface } from 'node:readline/promises';
import { parseArgs } from 'node:util';
import { restoreBackup } from './backup/restore-backup.js';
import { databaseUrl, photoDirectory } from './places.js';

/** `npm run restore -- <folder of the backup> [--replace] [--yes]` */
const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: { yes: { type: 'boolean', default: false }, replace: { type: 'boolean', default: false } },
});
try {
  const [folder] = positionals;
  if (folder === undefined || positionals.length > 1)
    throw new Error('Say which backup: npm run restore -- data/backups/<instant>');
  const places = { databaseUrl: databaseUrl(process.env), photoDir: photoDirectory(process.env) };
  const target = `database ${new URL(places.databaseUrl).pathname.slice(1)} and photos in ${places.photoDir}`;
  if (values.yes || (await agreed(`Restore ${folder} into ${target}?`))) {
    await restoreBackup(folder, places, values.replace);
    console.log(
      `Restored ${folder}. Search still has the old documents: with the app stopped or running, run npm run rebuild-search.`,
    );
  } else {
    console.log('Nothing was changed.');
  }
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}

async function agreed(question: string): Promise<boolean> {
  if (!process.stdin.isTTY) throw new Error('Nobody can be asked here: give --yes if the restore is meant.');
  const terminal = createInterface({ input: process.stdin, output: process.stdout });
  const answer = await terminal.question(`${question} (yes/no) `);
  terminal.close();
  return answer.trim().toLowerCase() === 'yes';
}
