import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureBuilt } from '../../server/local/start/build.mjs';
import { projectDir } from '../../server/local/start/services.mjs';

const eslint = 'node_modules/eslint/bin/eslint.js';
const tsc = 'node_modules/typescript/bin/tsc';
const ng = 'node_modules/@angular/cli/bin/ng.js';
const vitest = 'node_modules/vitest/vitest.mjs';

/**
 * The stages in the order they are run in. Each is given a folder to work in and resolves with its counts; lint,
 * typecheck and build count as one each.
 *
 * @type {Record<string, (workDir: string) => Promise<{ passed: number; failed: number }>>}
 */
export const stages = {
  lint: async (workDir) =>
    allGood([[eslint, '.', '--max-warnings=0', '--cache', '--cache-location', join(workDir, '../eslint/')]]),
  typecheck: async () =>
    allGood([
      [tsc, '-p', 'tsconfig.server.json', '--noEmit'],
      [tsc, '-p', 'tsconfig.test.json', '--noEmit'],
    ]),
  unit: (workDir) => vitestProject('unit', workDir),
  component: (workDir) => {
    const report = join(workDir, 'component.json');
    // The file goes to the first reporter named.
    return counted(report, [
      ng,
      'test',
      '--watch=false',
      '--reporters=json',
      '--reporters=default',
      `--output-file=${report}`,
    ]);
  },
  api: (workDir) => vitestProject('api', workDir),
  faults: (workDir) => vitestProject('faults', workDir),
  build: async (workDir) => {
    await ensureBuilt({ projectDir, logDir: workDir, say: console.log });
    return { passed: 1, failed: 0 };
  },
  browser: (workDir) => vitestProject('browser', workDir),
};

function vitestProject(project, workDir) {
  const report = join(workDir, `${project}.json`);
  return counted(report, [
    vitest,
    'run',
    '--project',
    project,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ]);
}

/** One pass when every command ends well. */
async function allGood(commands) {
  let good = true;
  for (const command of commands) good = (await run(command)) === 0 && good;
  return good ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

/**
 * Counts by the report of the run. A file that breaks before its tests are known counts as one failure, and so does a
 * run that ends badly with nothing else to show for it.
 */
async function counted(report, command) {
  const code = await run(command);
  const {
    numPassedTests = 0,
    numFailedTests = 0,
    testResults = [],
  } = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : {};
  const broken = testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
  ).length;
  const failed = numFailedTests + broken;
  return { passed: numPassedTests, failed: failed === 0 && code !== 0 ? 1 : failed };
}

/** Runs a script of Node.js with what it prints passed on; resolves with the exit code. */
function run([script, ...args]) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [join(projectDir, script), ...args], {
      cwd: projectDir,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
    });
    child.once('error', () => resolve(1));
    child.once('close', (code) => resolve(code ?? 1));
  });
}
