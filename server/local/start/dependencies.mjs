import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { runToEnd } from './run-to-end.mjs';

/** Installs the npm packages where node_modules is not what package-lock.json asks for. */
export async function ensureDependencies({ projectDir, logFile, say, signal }) {
  if (isInstalled(projectDir)) return;
  say('Installing npm packages (about half a minute) …');
  const npm = process.env.npm_execpath;
  await runToEnd({
    name: 'npm ci',
    command: npm ? process.execPath : 'npm',
    // The build needs the development packages, also where NODE_ENV=production would leave them out.
    args: [...(npm ? [npm] : []), 'ci', '--include=dev', '--no-audit', '--no-fund'],
    cwd: projectDir,
    logFile,
    signal,
  });
}

/**
 * npm writes the record of what it installed last of all, so an installation that was cut short has none. Packages for
 * other systems are optional and stand in the lock file only.
 */
function isInstalled(projectDir) {
  const wanted = packagesOf(join(projectDir, 'package-lock.json'));
  const installed = packagesOf(join(projectDir, 'node_modules/.package-lock.json'));
  return Object.entries(wanted).every(
    ([path, { version, optional }]) =>
      path === '' || (installed[path]?.version ?? (optional ? version : undefined)) === version,
  );
}

function packagesOf(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages ?? {};
  } catch {
    return {};
  }
}
