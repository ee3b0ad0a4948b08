import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { pathToFileURL } from 'node:url';
import { existsSync } from 'node:fs';
import path from 'node:path';
import { Meilisearch } from 'meilisearch';
import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';
import { createApp, type PageHandlers } from './app.js';
import { readSettings, type Settings } from './config.js';
import { openDatabase } from './database.js';
import { answerClientErrors } from './http/client-errors.js';
import { renderedPages, type RenderPage } from './http/rendered-pages.js';
import { staticFiles } from './http/static-files.js';
import { createLogger } from './logger.js';
import { projectFolder } from './project-folder.js';
import { endOnBugs, endOnSignals } from './shutdown.js';

const settings = readSettingsOrEnd();
const logger = createLogger(settings.LOG_LEVEL);
endOnBugs(logger);

const knex = openDatabase(settings.DATABASE_URL);
const mailTransport = createTransport(settings.SMTP_URL);
const search = new Meilisearch({
  host: settings.MEILI_HOST,
  ...(settings.MEILI_KEY ? { apiKey: settings.MEILI_KEY } : {}),
});
const server = createServer();
answerClientErrors(server);
const pages = await builtPages(settings, logger);
const { app, workers } = createApp({
  settings,
  knex,
  logger,
  search,
  mailTransport,
  clock: () => new Date(),
  rateLimits: true,
  ...(pages ? { pages } : {}),
});
server.on('request', app);

const address = await listen(server, settings);
// The rendering calls the API on this machine, not through the public address.
process.env['SHIMLORE_INTERNAL_ADDRESS'] = address;
for (const worker of workers) worker.start();
logger.info({ address, publicAddress: settings.PUBLIC_ADDRESS, pages: pages !== undefined }, 'listening');
endOnSignals({ server, workers, logger, close: () => closeAll() });

async function closeAll(): Promise<void> {
  mailTransport.close();
  await knex.destroy();
}

function readSettingsOrEnd(): Settings {
  try {
    return readSettings(process.env);
  } catch (error) {
    process.stderr.write(`${(error as Error).message}\n`);
    process.exit(1);
  }
}

/** The built client; undefined, with a line in the log, where it has not been built. */
async function builtPages(
  { PUBLIC_ADDRESS, WEB_DIR }: Settings,
  log: Logger,
): Promise<PageHandlers | undefined> {
  const built = path.resolve(projectFolder(), WEB_DIR);
  const entry = path.join(built, 'server', 'server.mjs');
  if (!existsSync(entry)) {
    log.warn({ entry }, 'the client is not built; only the API is served');
    return undefined;
  }
  const { renderPage } = (await import(pathToFileURL(entry).href)) as { renderPage: RenderPage };
  return {
    files: staticFiles(path.join(built, 'browser')),
    rendered: renderedPages(renderPage, new URL(PUBLIC_ADDRESS).origin),
  };
}

function listen(on: Server, { HOST, PORT }: Settings): Promise<string> {
  return new Promise((resolve, reject) => {
    on.once('error', reject);
    on.listen(PORT, HOST, () => {
      const { address: host, family, port } = on.address() as AddressInfo;
      const reachable = host === '0.0.0.0' ? '127.0.0.1' : host === '::' ? '::1' : host;
      resolve(`http://${family === 'IPv6' ? `[${reachable}]` : reachable}:${port}`);
    });
  });
}
