import type { TestApp } from './app.js';

/** Waits until every write-up noted in the outbox has been brought into the index; throws after ten seconds. */
export async function indexIsInStep(app: Pick<TestApp, 'knex'>): Promise<void> {
  for (let tries = 0; tries < 500; tries += 1) {
    const waiting = await app.knex('search_outbox').count({ count: '*' }).first();
    if (Number(waiting?.count) === 0) return;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
  const stuck = await app.knex('search_outbox').select('write_up_id', 'attempts', 'last_error');
  throw new Error(`The index is not in step: ${JSON.stringify(stuck)}`);
}
