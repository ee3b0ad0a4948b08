import { existsSync } from 'node:fs';
import path from 'node:path';

/** Folder of the project, from its sources as well as from what is built of them: the nearest one with a package.json. */
export function projectFolder(): string {
  let folder = import.meta.dirname;
  while (!existsSync(path.join(folder, 'package.json'))) {
    const above = path.dirname(folder);
    if (above === folder) throw new Error(`No package.json above ${import.meta.dirname}.`);
    folder = above;
  }
  return folder;
}
