import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';

/** Hash of names and contents of all files under `paths` (files or folders of `root`) but specs. */
export function fingerprint(root, paths) {
  const hash = createHash('sha256');
  for (const path of paths.flatMap((start) => filesUnder(root, start)).sort()) {
    hash
      .update(`${path}\0`)
      .update(readFileSync(join(root, path)))
      .update('\0');
  }
  return hash.digest('hex');
}

function filesUnder(root, path) {
  const full = join(root, path);
  if (!existsSync(full)) return [];
  if (!statSync(full).isDirectory()) return [path];
  return readdirSync(full, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && !entry.name.endsWith('.spec.ts'))
    .map((entry) => join(entry.parentPath, entry.name).slice(root.length + 1));
}
