// Runs all stages, or those named by `--only <stage>` (may be given several times), and counts.
import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { ensureDependencies } from '../server/local/start/dependencies.mjs';
import { ensurePackages } from '../server/local/start/packages.mjs';
import { projectDir } from '../server/local/start/services.mjs';
import { stages } from './run/stages.mjs';

const { values } = parseArgs({ options: { only: { type: 'string', multiple: true, default: [] } } });
const unknown = values.only.find((name) => !(name in stages));
if (unknown !== undefined) {
  console.error(`There is no stage "${unknown}": the stages are ${Object.keys(stages).join(', ')}.`);
  process.exit(1);
}

const workDir = join(projectDir, 'node_modules/.cache/shimlore-test');
rmSync(workDir, { recursive: true, force: true });
mkdirSync(workDir, { recursive: true });

const packages = {
  'mariadb-server': ['mariadbd', 'mariadb-install-db'],
  'mariadb-client': ['mariadb', 'mariadb-dump'],
  chromium: ['chromium'],
};
try {
  await ensurePackages({ packages, logFile: join(workDir, 'packages.log'), say: console.log });
  await ensureDependencies({ projectDir, logFile: join(workDir, 'npm.log'), say: console.log });
} catch (error) {
  console.error(error.message);
  console.log('0 passed, 1 failed');
  process.exit(1);
}

const results = [];
for (const name of values.only.length > 0
  ? Object.keys(stages).filter((stage) => values.only.includes(stage))
  : Object.keys(stages)) {
  console.log(`\n=== ${name}`);
  const start = Date.now();
  // A stage that breaks counts as failed and does not hide the ones after it.
  const counted = await stages[name](workDir).catch((error) => {
    console.error(error.message);
    return { passed: 0, failed: 1 };
  });
  results.push({ name, ...counted, seconds: (Date.now() - start) / 1000 });
}

console.log('');
for (const { name, passed, failed, seconds } of results) {
  const verdict = failed === 0 ? 'ok' : 'FAILED';
  console.log(
    `${name.padEnd(10)} ${verdict.padEnd(6)} ${String(passed).padStart(5)} passed ${String(failed).padStart(4)} failed ${seconds.toFixed(1).padStart(7)} s`,
  );
}
const sum = (field) => results.reduce((total, result) => total + result[field], 0);
console.log(`${sum('passed')} passed, ${sum('failed')} failed`);
process.exitCode = sum('failed') === 0 ? 0 : 1;
