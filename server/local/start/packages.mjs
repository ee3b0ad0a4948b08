import { spawnSync } from 'node:child_process';
import { findProgram } from '../mariadb.mjs';
import { runToEnd } from './run-to-end.mjs';

/**
 * Sees to it that programs of Debian packages are there, installing what is missing. Throws one sentence where that
 * cannot be done by this user or on this system.
 *
 * @param {{ packages: Record<string, readonly string[]>; logFile: string; say(text: string): void; signal?: AbortSignal }} options
 *   `packages`: name of the package to programs that it brings
 */
export async function ensurePackages({ packages, logFile, say, signal }) {
  const missing = Object.keys(packages).filter(
    (name) => !packages[name].every((program) => findProgram(program)),
  );
  if (missing.length === 0) return;
  const list = missing.join(' ');
  if (!findProgram('apt-get'))
    throw new Error(`These packages are missing and this system has no apt-get to install them by: ${list}.`);
  const asRoot = process.getuid() === 0 ? [] : ['sudo', '-n'];
  if (asRoot.length > 0 && spawnSync('sudo', ['-n', 'true']).status !== 0) {
    throw new Error(`These packages are missing: run "sudo apt-get install ${list}" once, then start again.`);
  }
  say(`Installing ${list} …`);
  const apt = async (...args) => {
    const [command, ...rest] = [...asRoot, 'env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', ...args];
    await runToEnd({ name: `apt-get ${args[0]}`, command, args: rest, logFile, signal });
  };
  await apt('update');
  await apt('install', '-y', '--no-install-recommends', ...missing);
}
