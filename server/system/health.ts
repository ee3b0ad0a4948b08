import type { Knex } from 'knex';
import type { Health } from '../../shared/contract/system.js';

export interface PartHealth {
  readonly ok: boolean;
  readonly detail: string;
}

/** Each part's own answer to whether it works; a rejection counts as no. */
export type HealthChecks = Record<Exclude<keyof Health, 'ok'>, () => Promise<PartHealth>>;

const longestWaitMs = 2000;

/** Asks all parts at once; one that takes longer than two seconds counts as not answering. */
export async function checkHealth(checks: HealthChecks): Promise<Health> {
  const [database, search, mail, photos] = await Promise.all([
    answerOf(checks.database),
    answerOf(checks.search),
    answerOf(checks.mail),
    answerOf(checks.photos),
  ]);
  return { ok: database.ok && search.ok && mail.ok && photos.ok, database, search, mail, photos };
}

async function answerOf(check: () => Promise<PartHealth>): Promise<PartHealth> {
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<PartHealth>((resolve) => {
    timer = setTimeout(() => resolve({ ok: false, detail: 'No answer within two seconds.' }), longestWaitMs);
  });
  try {
    const { ok, detail } = await Promise.race([check(), tooLate]);
    // Addresses of the parts behind the site are nobody's business.
    return { ok, detail: detail.replace(/\bhttps?:\/\/\S+/g, 'its address') };
  } catch {
    return { ok: false, detail: 'It does not answer.' };
  } finally {
    clearTimeout(timer);
  }
}

export async function databaseHealth(knex: Knex): Promise<PartHealth> {
  await knex.raw('SELECT 1');
  return { ok: true, detail: 'The database answers.' };
}
