import { chmod, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startMariaDb } from '../../../server/local/mariadb.mjs';
import { freePort } from '../../../server/local/start/ports.mjs';
import { startMailbox, startSearch } from '../../../server/local/start/services.mjs';

/** A folder that the database's own user can reach; the caller removes it. */
export async function makeDataFolder(): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), 'shimlore-test-'));
  await chmod(folder, 0o755);
  return folder;
}

/** Starts database, search and mailbox on free ports and tells where they are through the environment. */
export async function startServices(): Promise<{ stop(): Promise<void> }> {
  const dataDir = await makeDataFolder();
  const started: { stop(): Promise<void> }[] = [];
  const stop = async () => {
    for (const service of started.reverse()) await service.stop();
    await rm(dataDir, { recursive: true, force: true });
  };
  try {
    const database = await startMariaDb({ dataDir, port: await freePort() });
    started.push(database);
    const search = await startSearch({
      dataDir,
      port: await freePort(),
      key: 'key-of-the-test-run',
      compiled: false,
    });
    started.push(search);
    const mailbox = await startMailbox({
      dataDir,
      smtpPort: await freePort(),
      pagePort: await freePort(),
      compiled: false,
    });
    started.push(mailbox);
    Object.assign(process.env, {
      TEST_DATABASE_URL: database.url,
      TEST_MEILI_HOST: search.url,
      TEST_MEILI_KEY: search.key,
      TEST_SMTP_URL: mailbox.url,
      TEST_MAILBOX_URL: mailbox.pageUrl,
    });
    return { stop };
  } catch (error) {
    await stop();
    throw error;
  }
}
