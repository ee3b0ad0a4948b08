import { mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { endProcess, startOf, stillRuns } from './processes.mjs';

/**
 * Claims the data folder for this launcher, so that no two work on the same files, and keeps note of the children. Where
 * an earlier launcher was killed and left children behind, those are ended first. Throws one sentence when another
 * launcher is at work.
 */
export async function claimDataFolder(dataDir, address, say) {
  mkdirSync(dataDir, { recursive: true });
  const file = join(dataDir, 'running.json');
  const before = readNote(file);
  if (before && stillRuns(before.launcher)) {
    throw new Error(
      `Shimlore is already running at ${before.address} (process ${before.launcher.pid}): stop it there by Ctrl-C, or set SHIMLORE_DATA and other ports to run a second one.`,
    );
  }
  const left = (before?.children ?? []).filter(stillRuns);
  if (left.length > 0)
    say(`Ending what an earlier start left running: ${left.map((child) => child.name).join(', ')}.`);
  for (const child of left.reverse()) await endProcess(child);

  const note = { launcher: { pid: process.pid, start: startOf(process.pid) }, address, children: [] };
  const write = () => {
    writeFileSync(`${file}.new`, `${JSON.stringify(note, null, 2)}\n`);
    renameSync(`${file}.new`, file);
  };
  write();
  return {
    noteChild({ name, pid }) {
      note.children.push({ name, pid, start: startOf(pid) });
      write();
    },
    release: () => rmSync(file, { force: true }),
  };
}

function readNote(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}
