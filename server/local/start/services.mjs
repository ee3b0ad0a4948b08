import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { readyOrStopped, startChild } from './child.mjs';
import { demandFreePort } from './ports.mjs';

/** The folder of the project. */
export const projectDir = resolve(fileURLToPath(import.meta.url), '../../../..');

/**
 * How a program of the project is run: compiled after a build, otherwise from its TypeScript.
 * @param {string} file path in the project without its ending, as `server/main`
 * @param {boolean} compiled
 */
export function programArguments(file, compiled) {
  return compiled
    ? [join(projectDir, 'dist/api', `${file}.js`)]
    : ['--import', 'tsx', join(projectDir, `${file}.ts`)];
}

/** Starts the local search server and waits until it answers. */
export async function startSearch({ dataDir, port, key, compiled, logDir = join(dataDir, 'logs'), onStart }) {
  await demandFreePort(port, 'search', 'SHIMLORE_SEARCH_PORT');
  const url = `http://127.0.0.1:${port}`;
  const child = startChild({
    name: 'search',
    command: process.execPath,
    args: programArguments('server/local/search/main', compiled),
    cwd: projectDir,
    env: {
      ...process.env,
      SEARCH_PORT: String(port),
      SEARCH_MASTER_KEY: key,
      SEARCH_DATA: resolve(dataDir, 'search'),
    },
    logFile: join(logDir, 'search.log'),
    onStart,
  });
  await readyOrStopped(child, () => answers(`${url}/health`));
  return { ...child, url, key };
}

/** Starts the mailbox, which takes mail at `url` and shows it at `pageUrl`. */
export async function startMailbox({
  dataDir,
  smtpPort,
  pagePort,
  compiled,
  logDir = join(dataDir, 'logs'),
  onStart,
}) {
  await demandFreePort(smtpPort, 'mail', 'SHIMLORE_SMTP_PORT');
  await demandFreePort(pagePort, 'the mailbox page', 'SHIMLORE_MAILBOX_PORT');
  const pageUrl = `http://127.0.0.1:${pagePort}`;
  const child = startChild({
    name: 'mailbox',
    command: process.execPath,
    args: programArguments('server/local/mailbox/main', compiled),
    cwd: projectDir,
    env: { ...process.env, MAILBOX_SMTP_PORT: String(smtpPort), MAILBOX_PORT: String(pagePort) },
    logFile: join(logDir, 'mailbox.log'),
    onStart,
  });
  await readyOrStopped(child, () => answers(`${pageUrl}/messages.json`));
  return { ...child, url: `smtp://127.0.0.1:${smtpPort}`, pageUrl };
}

/** Whether `url` answers with a good status. */
export async function answers(url) {
  try {
    const response = await fetch(url, { signal: AbortSignal.timeout(5000) });
    await response.arrayBuffer();
    return response.ok;
  } catch {
    return false;
  }
}
