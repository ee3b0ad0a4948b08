import { expect, test } from 'vitest';
import { createGate } from './gate.js';

function deferred(): { promise: Promise<void>; resolve: () => void; reject: (error: Error) => void } {
  let resolve = (): void => undefined;
  let reject = (_error: Error): void => undefined;
  const promise = new Promise<void>((done, fail) => {
    resolve = done;
    reject = fail;
  });
  return { promise, resolve, reject };
}

const turn = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));

test('when more work comes than there are places, then the rest starts in order as places come free', async () => {
  const inTurn = createGate(2);
  const started: number[] = [];
  const work = [deferred(), deferred(), deferred(), deferred()];
  const results = work.map((item, index) =>
    inTurn(async () => {
      started.push(index);
      await item.promise;
      return index;
    }),
  );
  await turn();
  expect(started).toEqual([0, 1]);
  work[1]?.resolve();
  await turn();
  expect(started).toEqual([0, 1, 2]);
  for (const item of work) item.resolve();
  expect(await Promise.all(results)).toEqual([0, 1, 2, 3]);
});

test('when a piece of work fails, then its place is free again', async () => {
  const inTurn = createGate(1);
  await expect(inTurn(() => Promise.reject(new Error('broken')))).rejects.toThrow('broken');
  expect(await inTurn(() => Promise.resolve('next'))).toBe('next');
});
