import { spawn } from 'node:child_process';
import { createReadStream, createWriteStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { findProgram } from '../mariadb.mjs';

/** Writes the whole database at `url` to `file` as SQL, as it stood at one instant, while others go on working. */
export async function dumpDatabase(url: string, file: string): Promise<void> {
  const { connection, database, environment } = clientOf(url);
  const options = [
    '--single-transaction',
    '--quick',
    '--hex-blob',
    '--routines',
    '--triggers',
    '--default-character-set=utf8mb4',
  ];
  const child = spawn(demandProgram('mariadb-dump'), ['--no-defaults', ...connection, ...options, database], {
    env: environment,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const ended = endOf(child, 'mariadb-dump');
  await Promise.all([pipeline(child.stdout, createWriteStream(file, { mode: 0o600 })), ended]);
}

/** Runs the SQL of `file` in the database at `url`; stops at the first statement that fails. */
export async function loadDatabase(url: string, file: string): Promise<void> {
  const { connection, database, environment } = clientOf(url);
  const child = spawn(
    demandProgram('mariadb'),
    ['--no-defaults', ...connection, '--default-character-set=utf8mb4', database],
    {
      env: environment,
      stdio: ['pipe', 'ignore', 'pipe'],
    },
  );
  const ended = endOf(child, 'mariadb');
  // Where the client ends early the pipe breaks as well; what the client says is the cause and is told first.
  const fed = pipeline(createReadStream(file), child.stdin).then(
    () => undefined,
    (error: Error) => error,
  );
  await ended;
  const failure = await fed;
  if (failure) throw failure;
}

function clientOf(url: string): { connection: string[]; database: string; environment: NodeJS.ProcessEnv } {
  const address = new URL(url);
  return {
    connection: [
      '--protocol=TCP',
      `--host=${address.hostname}`,
      `--port=${address.port || '3306'}`,
      `--user=${decodeURIComponent(address.username)}`,
    ],
    database: decodeURIComponent(address.pathname.slice(1)),
    // On the command line everybody on the machine could read it.
    environment: { ...process.env, MYSQL_PWD: decodeURIComponent(address.password) },
  };
}

function endOf(child: ReturnType<typeof spawn>, name: string): Promise<void> {
  let said = '';
  child.stderr?.on('data', (bytes: Buffer) => (said += bytes.toString()));
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('close', (code) =>
      code === 0 ? resolve() : reject(new Error(`${name} failed (exit code ${code}): ${said.trim()}`)),
    );
  });
}

function demandProgram(name: string): string {
  const file = findProgram(name);
  if (!file) throw new Error(`${name} is not installed: install the package mariadb-client.`);
  return file;
}
