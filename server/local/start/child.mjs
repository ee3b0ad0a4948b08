import { spawn } from 'node:child_process';
import { createWriteStream, mkdirSync, readFileSync } from 'node:fs';
import { dirname } from 'node:path';

/**
 * A program that runs beside this one, its output in a log file. It has a process group of its own, so that Ctrl-C in
 * the terminal reaches only the launcher, which then ends its children in order.
 *
 * @param {{ name: string; command: string; args: readonly string[]; logFile: string; env?: NodeJS.ProcessEnv; cwd?: string; onStart?: (child: object) => void }} what
 *   `onStart` is told of the child at once, long before it is ready
 */
export function startChild({ name, command, args, logFile, env = process.env, cwd, onStart }) {
  mkdirSync(dirname(logFile), { recursive: true });
  const log = createWriteStream(logFile, { flags: 'a' });
  log.write(`--- ${new Date().toISOString()} start of ${name}\n`);
  const child = spawn(command, args, { env, cwd, detached: true, stdio: ['ignore', 'pipe', 'pipe'] });
  child.stdout.pipe(log, { end: false });
  child.stderr.pipe(log, { end: false });
  let over = false;
  // Its own process group keeps it from Ctrl-C, so it would outlive a launcher that exits in a hurry.
  const send = (signal) => {
    try {
      // The whole group: a watcher has a child of its own.
      if (child.pid !== undefined) process.kill(-child.pid, signal);
    } catch (error) {
      if (error.code !== 'ESRCH') throw error;
    }
  };
  const endAlong = () => send('SIGTERM');
  process.once('exit', endAlong);
  const exited = new Promise((resolve) => {
    const end = (how) => {
      over = true;
      process.removeListener('exit', endAlong);
      log.end();
      resolve(how);
    };
    child.once('error', (error) => end(error.message));
    child.once('close', (code, signal) => end(signal ? `signal ${signal}` : `exit code ${code}`));
  });
  const running = {
    name,
    pid: child.pid,
    logFile,
    /** Resolves, never rejects, with how it ended. */
    exited,
    isOver: () => over,
    /** Asks it to end; after `patience` milliseconds it is ended without asking. */
    async stop(patience = 15_000) {
      if (over) return;
      send('SIGTERM');
      const hurry = setTimeout(() => send('SIGKILL'), patience);
      await exited;
      clearTimeout(hurry);
    },
  };
  onStart?.(running);
  return running;
}

/**
 * Waits until `isReady` answers true. Throws one sentence with the last lines of the log when the child ends before
 * that or `seconds` have passed.
 */
export async function untilReady(child, isReady, seconds = 120) {
  const end = Date.now() + seconds * 1000;
  for (;;) {
    if (child.isOver()) {
      throw new Error(
        `${child.name} ended while starting (${await child.exited}).\n${lastLines(child.logFile)}`,
      );
    }
    if (await isReady()) return;
    if (Date.now() > end)
      throw new Error(`${child.name} was not ready within ${seconds} s.\n${lastLines(child.logFile)}`);
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

/** As untilReady, but leaves nothing running when it fails. */
export async function readyOrStopped(child, isReady, seconds) {
  try {
    await untilReady(child, isReady, seconds);
  } catch (error) {
    await child.stop();
    throw error;
  }
}

/** The end of a log, for a message. */
export function lastLines(file, count = 12) {
  try {
    const lines = readFileSync(file, 'utf8').trimEnd().split('\n').slice(-count);
    return [`Last lines of ${file}:`, ...lines.map((line) => `  ${line}`)].join('\n');
  } catch {
    return `Nothing in ${file}.`;
  }
}
