import { resolve } from 'node:path';
import { projectDir } from './services.mjs';

/**
 * Where everything listens and keeps its data, from the environment. What is set to run elsewhere (DATABASE_URL,
 * MEILI_HOST, SMTP_URL) is not started here. Where the app is not compiled, the dev server has the address of its own
 * that people use.
 */
export function readLaunchSettings(environment, { compiled = true } = {}) {
  const production = environment.NODE_ENV === 'production';
  const port = portOf(environment, 'PORT', 4310);
  const pages = portOf(environment, 'SHIMLORE_PAGES_PORT', 4200);
  return {
    production,
    dataDir: resolve(projectDir, environment.SHIMLORE_DATA || 'data'),
    ports: {
      app: port,
      database: portOf(environment, 'SHIMLORE_DB_PORT', 4311),
      search: portOf(environment, 'SHIMLORE_SEARCH_PORT', 4312),
      smtp: portOf(environment, 'SHIMLORE_SMTP_PORT', 4313),
      mailbox: portOf(environment, 'SHIMLORE_MAILBOX_PORT', 4314),
      pages,
    },
    publicAddress: environment.PUBLIC_ADDRESS || `http://localhost:${compiled ? port : pages}`,
    environment,
  };
}

function portOf(environment, variable, otherwise) {
  const text = environment[variable];
  if (text === undefined || text === '') return otherwise;
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65535) {
    throw new Error(`${variable} is "${text}": it takes a port number from 1 to 65535.`);
  }
  return port;
}
