import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import { ensureBuilt } from '../../../server/local/start/build.mjs';
import { freePort } from '../../../server/local/start/ports.mjs';
import { projectDir } from '../../../server/local/start/services.mjs';
import { readLaunchSettings } from '../../../server/local/start/settings.mjs';
import { startStack } from '../../../server/local/start/stack.mjs';
import { makeDataFolder } from '../../api/support/services.js';

/** Starts the built app with the demo and all it leans on, on free ports, as `npm start` does. */
export default async function setUp(): Promise<() => Promise<void>> {
  const say = (text: string) => console.log(text);
  const dataDir = await makeDataFolder();
  await ensureBuilt({ projectDir, logDir: join(dataDir, 'logs'), say });
  const settings = readLaunchSettings({
    PATH: process.env['PATH'],
    HOME: process.env['HOME'],
    NODE_ENV: 'development',
    SHIMLORE_DATA: dataDir,
    PORT: String(await freePort()),
    SHIMLORE_DB_PORT: String(await freePort()),
    SHIMLORE_SEARCH_PORT: String(await freePort()),
    SHIMLORE_SMTP_PORT: String(await freePort()),
    SHIMLORE_MAILBOX_PORT: String(await freePort()),
  });
  const stack = await startStack({ settings, say });
  process.env['TEST_APP_ADDRESS'] = stack.address;
  process.env['TEST_MAILBOX_URL'] = stack.mailboxUrl;
  return async () => {
    await stack.stop();
    await rm(dataDir, { recursive: true, force: true });
  };
}
