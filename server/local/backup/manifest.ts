import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { readdir, readFile, writeFile } from 'node:fs/promises';
import { join, relative } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { z } from 'zod';

const Manifest = z.object({
  madeAt: z.iso.datetime(),
  /** SHA-256 of each file of the backup by its path in the backup's folder. */
  files: z.record(z.string(), z.string()),
});
export type Manifest = z.infer<typeof Manifest>;

const fileName = 'manifest.json';

/** Notes every file of the finished folder. */
export async function writeManifest(folder: string, madeAt: Date): Promise<Manifest> {
  const manifest: Manifest = { madeAt: madeAt.toISOString(), files: await hashesUnder(folder) };
  await writeFile(join(folder, fileName), `${JSON.stringify(manifest, null, 2)}\n`);
  return manifest;
}

/** Reads the note and compares it with the files. Throws one sentence naming the first that is missing or differs. */
export async function readCheckedManifest(folder: string): Promise<Manifest> {
  const manifest = await readManifest(folder);
  const found = await hashesUnder(folder);
  for (const [path, hash] of Object.entries(manifest.files)) {
    if (found[path] === undefined) throw new Error(`The backup is damaged: ${path} is missing in ${folder}.`);
    if (found[path] !== hash)
      throw new Error(`The backup is damaged: ${path} in ${folder} is not what was backed up.`);
  }
  return manifest;
}

async function readManifest(folder: string): Promise<Manifest> {
  try {
    return Manifest.parse(JSON.parse(await readFile(join(folder, fileName), 'utf8')));
  } catch {
    throw new Error(`${folder} is no backup: it has no readable ${fileName}.`);
  }
}

/** SHA-256 of each file under `folder`, but the note itself, by its path in there. */
export async function hashesUnder(folder: string): Promise<Record<string, string>> {
  const hashes: Record<string, string> = {};
  for (const path of await filesUnder(folder)) {
    if (path === fileName) continue;
    const hash = createHash('sha256');
    await pipeline(createReadStream(join(folder, path)), hash);
    hashes[path] = hash.digest('hex');
  }
  return hashes;
}

/** Paths in `folder` of all files in it and below, sorted; none where it does not exist. */
export async function filesUnder(folder: string): Promise<string[]> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true }).catch(
    (error: NodeJS.ErrnoException) => {
      if (error.code === 'ENOENT') return [];
      throw error;
    },
  );
  return entries
    .filter((entry) => entry.isFile())
    .map((entry) => relative(folder, join(entry.parentPath, entry.name)))
    .sort();
}
