import { readFileSync } from 'node:fs';

/**
 * What tells a process from a later one that got the same number: its start in clock ticks since the machine came up.
 * Undefined where there is no such process.
 */
export function startOf(pid) {
  try {
    const fields = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The name in parentheses may itself hold spaces and parentheses; field 3 follows the last one.
    const [state, ...rest] = fields.slice(fields.lastIndexOf(')') + 2).split(' ');
    return state === 'Z' ? undefined : rest[18];
  } catch {
    return undefined;
  }
}

/** Whether the process noted as `{ pid, start }` still runs. */
export function stillRuns({ pid, start }) {
  return start !== undefined && startOf(pid) === start;
}

/** Ends a noted process that is nobody's child any more; without asking after 20 seconds. */
export async function endProcess(noted) {
  if (!stillRuns(noted)) return;
  process.kill(noted.pid, 'SIGTERM');
  const end = Date.now() + 20_000;
  while (stillRuns(noted)) {
    if (Date.now() > end) process.kill(noted.pid, 'SIGKILL');
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}
