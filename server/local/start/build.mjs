import { existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fingerprint } from './fingerprint.mjs';
import { runToEnd } from './run-to-end.mjs';

const stampName = '.built-from';

const halves = [
  {
    name: 'server',
    output: 'dist/api',
    result: 'server/main.js',
    sources: [
      'server',
      'shared',
      'migrations',
      'seeds',
      'tsconfig.json',
      'tsconfig.server.json',
      'package-lock.json',
    ],
    program: (output) => [
      'node_modules/typescript/bin/tsc',
      '-p',
      'tsconfig.server.json',
      '--outDir',
      output,
    ],
  },
  {
    name: 'pages',
    output: 'dist/web',
    result: 'server/server.mjs',
    sources: ['src', 'shared', 'angular.json', 'tsconfig.json', 'tsconfig.app.json', 'package-lock.json'],
    program: (output) => ['node_modules/@angular/cli/bin/ng.js', 'build', '--output-path', output],
  },
];

/** Builds what has changed since it was last built. The outcome is stamped with the hash of what it was made from. */
export async function ensureBuilt({ projectDir, logDir, say, signal }) {
  const stale = halves
    .map((half) => ({
      ...half,
      hash: fingerprint(projectDir, half.sources),
      stamp: join(projectDir, half.output, stampName),
    }))
    .filter((half) => !isCurrent(projectDir, half));
  if (stale.length === 0) return;
  say(`Building ${stale.map((half) => half.name).join(' and ')} (up to a minute) …`);
  const giveUp = new AbortController();
  const either = AbortSignal.any([giveUp.signal, ...(signal ? [signal] : [])]);
  const builds = stale.map((half) => build(half));
  try {
    await Promise.all(builds);
  } catch (error) {
    giveUp.abort(error);
    await Promise.allSettled(builds);
    throw error;
  }

  async function build({ name, output, program, hash }) {
    // Built beside and put in place as a whole: what was built before stays until then, also when this fails.
    const fresh = `${output}.new`;
    rmSync(join(projectDir, fresh), { recursive: true, force: true });
    const [script, ...args] = program(fresh);
    await runToEnd({
      name: `Building the ${name}`,
      command: process.execPath,
      args: [join(projectDir, script), ...args],
      cwd: projectDir,
      env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
      logFile: join(logDir, `build-${name}.log`),
      signal: either,
    });
    writeFileSync(join(projectDir, fresh, stampName), hash);
    rmSync(join(projectDir, output), { recursive: true, force: true });
    renameSync(join(projectDir, fresh), join(projectDir, output));
    say(`Built the ${name}.`);
  }
}

function isCurrent(projectDir, { stamp, hash, output, result }) {
  return (
    existsSync(join(projectDir, output, result)) && existsSync(stamp) && readFileSync(stamp, 'utf8') === hash
  );
}
