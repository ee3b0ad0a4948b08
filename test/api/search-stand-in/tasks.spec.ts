import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Meilisearch } from 'meilisearch';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { idsOf, masterKey, refusalOf, SearchUnderTest } from './search-under-test.js';

let search: SearchUnderTest;
beforeAll(async () => {
  search = await SearchUnderTest.started();
});
afterAll(() => search.stop());

describe('tasks', () => {
  it('when a change is sent, then a summary answers at once and the task tells how it ended', async () => {
    const index = search.client().index('told');
    const summary = await index.addDocuments([{ id: 1 }]);
    expect(summary).toMatchObject({ indexUid: 'told', status: 'enqueued', type: 'documentAdditionOrUpdate' });
    const task = await search.client().tasks.waitForTask(summary);
    expect(task).toMatchObject({
      uid: summary.taskUid,
      status: 'succeeded',
      error: null,
      canceledBy: null,
      indexUid: 'told',
    });
    expect(task.duration).toMatch(/^PT[\d.]+S$/);
    expect(Date.parse(task.finishedAt ?? '')).toBeGreaterThanOrEqual(Date.parse(task.enqueuedAt));
    const batch = await search.client().batches.getBatch(task.batchUid ?? -1);
    expect(batch).toMatchObject({
      uid: task.batchUid,
      progress: null,
      stats: { totalNbTasks: 1, status: { succeeded: 1 } },
    });
  });

  it('when tasks are listed, then filters and pages hold', async () => {
    const index = search.client().index('filtered');
    for (const id of [1, 2, 3]) await index.addDocuments([{ id }]).waitTask();
    await index.addDocuments([{ id: 'not good' }]).waitTask();
    const { tasks } = search.client();
    const all = await tasks.getTasks({ indexUids: ['filtered'], limit: 2 });
    expect(all.total).toBe(4);
    expect(all.results).toHaveLength(2);
    expect(all.from).toBe(all.results[0]?.uid);
    const rest = await tasks.getTasks({ indexUids: ['filtered'], limit: 2, from: all.next });
    expect(rest.next).toBeNull();
    const [newest = 0, oldest = 0] = [all.results[0]?.uid, rest.results[1]?.uid];
    expect(newest - oldest).toBeGreaterThanOrEqual(3);
    expect((await tasks.getTasks({ indexUids: ['filtered'], statuses: ['failed'] })).total).toBe(1);
    expect((await tasks.getTasks({ indexUids: ['filtered'], types: ['settingsUpdate'] })).total).toBe(0);
    expect((await tasks.getTasks({ indexUids: ['filtered'], afterEnqueuedAt: '2100-01-01' })).total).toBe(0);
    const reversed = await tasks.getTasks({ indexUids: ['filtered'], reverse: true, limit: 1 });
    expect(reversed.results[0]?.uid).toBe(oldest);
  });

  it('when tasks wait, then they can be cancelled; when they are done, then they can be deleted', async () => {
    const index = search.client().index('cancelled');
    const many = Array.from({ length: 3000 }, (_, id) => ({
      id,
      text: 'belt bracket motor rocks on the lip',
    }));
    const [first, second] = await Promise.all([
      index.addDocuments(many),
      index.addDocuments([{ id: 'waits' }]),
    ]);
    const later = Math.max(first.taskUid, second.taskUid);
    const cancelation = await search
      .client()
      .tasks.cancelTasks({ uids: [later] })
      .waitTask({ timeout: 60_000 });
    expect(cancelation.details).toMatchObject({
      matchedTasks: 1,
      canceledTasks: 1,
      originalFilter: `?uids=${later}`,
    });
    expect(await search.client().tasks.getTask(later)).toMatchObject({
      status: 'canceled',
      canceledBy: cancelation.uid,
    });
    const deletion = await search
      .client()
      .tasks.deleteTasks({ uids: [later] })
      .waitTask({ timeout: 60_000 });
    expect(deletion.details).toMatchObject({ deletedTasks: 1 });
    expect(await refusalOf(search.client().tasks.getTask(later))).toEqual({
      status: 404,
      code: 'task_not_found',
    });
  });

  it('when cancelling names no tasks, or a filter is off, then it is refused', async () => {
    expect((await refusalOf(search.client().tasks.cancelTasks({}))).code).toBe('missing_task_filters');
    expect((await search.send('GET', '/tasks?statuses=lost')).body['code']).toBe('invalid_task_statuses');
    expect((await search.send('GET', '/tasks?limit=-1')).body['code']).toBe('invalid_task_limit');
    expect((await search.send('GET', '/tasks?beforeEnqueuedAt=soon')).body['code']).toBe(
      'invalid_task_before_enqueued_at',
    );
  });

  it('when the server is stopped and started, then documents, settings and finished tasks are still there', async () => {
    const index = await search.index('kept', [{ id: 1, title: 'bracket' }], { stopWords: ['the'] });
    const before = await search.client().tasks.getTasks({ indexUids: ['kept'] });
    await search.restart();
    const again = search.client().index(index.uid);
    expect(idsOf(await again.search('brackte '))).toEqual([1]);
    expect(await again.getStopWords()).toEqual(['the']);
    expect(await search.client().tasks.getTasks({ indexUids: ['kept'] })).toEqual(before);
  });
});

/** The server as a process of its own, so that it can be killed. */
async function startedProcess(folder: string): Promise<{ child: ChildProcess; client: Meilisearch }> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/local/search/main.ts'], {
    env: { ...process.env, SEARCH_PORT: '0', SEARCH_DATA: folder, SEARCH_MASTER_KEY: masterKey },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const host = await new Promise<string>((resolve, reject) => {
    child.once('exit', () => reject(new Error('Search ended before it listened')));
    child.stdout.on('data', (data: Buffer) => {
      const [, address] = /listens on (\S+)/.exec(data.toString()) ?? [];
      if (address !== undefined) resolve(address);
    });
  });
  return { child, client: new Meilisearch({ host, apiKey: masterKey }) };
}

function ended(child: ChildProcess, signal: NodeJS.Signals): Promise<void> {
  const end = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  child.kill(signal);
  return end;
}

describe('a crash', () => {
  it('when the process is killed with tasks open, then the next start finishes every acknowledged task once', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'search-crash-'));
    const first = await startedProcess(folder);
    let second: Awaited<ReturnType<typeof startedProcess>> | undefined;
    try {
      const words = 'belt bracket motor rocks on the raised lip of the boss';
      const some = (from: number, count: number) =>
        Array.from({ length: count }, (_, at) => ({ id: from + at, text: words }));
      const index = first.client.index('write-ups');
      await index.addDocuments(some(0, 10), { primaryKey: 'id' }).waitTask({ timeout: 60_000 });
      await first.client
        .index('spare')
        .addDocuments([{ id: 'spare' }])
        .waitTask({ timeout: 60_000 });
      const open = [await index.addDocuments(some(10, 2000))];
      open.push(await first.client.swapIndexes([{ indexes: ['write-ups', 'spare'], rename: false }]));
      open.push(await first.client.index('spare').addDocuments(some(5000, 5)));
      await ended(first.child, 'SIGKILL');

      second = await startedProcess(folder);
      for (const { taskUid } of open) {
        const task = await second.client.tasks.waitForTask(taskUid, { timeout: 60_000 });
        expect([task.status, task.error]).toEqual(['succeeded', null]);
      }
      expect((await second.client.index('spare').getDocuments({ limit: 0 })).total).toBe(2015);
      expect(idsOf(await second.client.index('write-ups').search(''))).toEqual(['spare']);
      expect((await second.client.index('spare').search('brackte rasied ')).estimatedTotalHits).toBe(1000);
      await ended(second.child, 'SIGTERM');
    } finally {
      first.child.kill('SIGKILL');
      second?.child.kill('SIGKILL');
      rmSync(folder, { recursive: true, force: true });
    }
  });
});
