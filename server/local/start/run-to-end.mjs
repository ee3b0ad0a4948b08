import { lastLines, startChild } from './child.mjs';

/**
 * Runs a program to its end, its output in a log. Throws with the end of the log where it fails; ends it when `signal`
 * is given.
 */
export async function runToEnd({ name, command, args, logFile, env, cwd, signal }) {
  signal?.throwIfAborted();
  const child = startChild({ name, command, args, logFile, env, cwd });
  const end = () => child.stop();
  signal?.addEventListener('abort', end, { once: true });
  const how = await child.exited;
  signal?.removeEventListener('abort', end);
  signal?.throwIfAborted();
  if (how !== 'exit code 0') throw new Error(`${name} failed (${how}).\n${lastLines(logFile, 25)}`);
}
