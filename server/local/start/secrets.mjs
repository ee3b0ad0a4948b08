import { randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * Passwords and keys of the local services, made on the first start and kept in `secrets.json` of the data folder,
 * readable by its owner only.
 * @param {string} dataDir
 */
export function readSecrets(dataDir) {
  const file = join(dataDir, 'secrets.json');
  const kept = readKept(file);
  const secrets = {
    database: kept.database ?? randomBytes(24).toString('hex'),
    databaseRoot: kept.databaseRoot ?? randomBytes(24).toString('hex'),
    search: kept.search ?? randomBytes(24).toString('hex'),
    bounce: kept.bounce ?? randomBytes(48).toString('hex'),
    session: kept.session ?? randomBytes(48).toString('hex'),
  };
  if (Object.entries(secrets).some(([name, value]) => kept[name] !== value)) {
    mkdirSync(dataDir, { recursive: true });
    // Written beside and renamed: a crash leaves either the old file or the new one.
    writeFileSync(`${file}.new`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
    renameSync(`${file}.new`, file);
  }
  return secrets;
}

function readKept(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch (error) {
    if (error.code === 'ENOENT') return {};
    throw new Error(
      `${file} cannot be read (${error.message}): mend it, or remove the data folder to start afresh.`,
      { cause: error },
    );
  }
}
