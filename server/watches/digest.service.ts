import type { Knex } from 'knex';
import type { WatchMail } from '../mail/watch-mail.js';
import { endedPeriods } from './digest-periods.js';
import { digestSections } from './digest-sections.js';
import { digestStore as store, type DigestPerson, type EndedPeriod } from './digest.store.js';
import { namesOf } from './subject-names.store.js';

/**
 * Makes the digest of one person for a period that has ended: the mail, the marks on its notices and the note that this
 * period is done are one transaction. False when nobody is due; who has nothing to be told gets none.
 */
export async function makeNextDigest(around: {
  knex: Knex;
  clock: () => Date;
  mail: WatchMail;
}): Promise<boolean> {
  const { knex, clock, mail } = around;
  const now = clock();
  const periods = endedPeriods(now);
  const due = await store.due(knex, periods);
  if (due.length === 0) {
    await store.dropUnwanted(knex);
    return false;
  }
  return knex.transaction(async (trx) => {
    // Nothing is read before the person is held: what is read after it is what the last holder left.
    const person = await store.holdOne(trx, due);
    if (!person) return false;
    const period = periods[person.rhythm];
    const digestId = await store.add(trx, person.accountId, period.name, now);
    if (digestId !== undefined) await fill(trx, mail, { ...person, digestId, period, now });
    return true;
  });
}

async function fill(
  trx: Knex,
  mail: WatchMail,
  digest: DigestPerson & { digestId: number; period: EndedPeriod; now: Date },
): Promise<void> {
  const { accountId, rhythm, digestId, period, now } = digest;
  const rows = await store.waiting(trx, accountId, period.end);
  if (rows.length === 0) return;
  const names = await namesOf(
    trx,
    rows.flatMap(({ subject, subjectId }) =>
      subject === null || subjectId === null ? [] : [{ subject, id: subjectId }],
    ),
  );
  await mail.queueDigest(trx, {
    dedupeKey: `digest:${accountId}:${period.name}`,
    accountId,
    rhythm,
    count: rows.length,
    ...digestSections(rows, names),
  });
  await store.markMailed(
    trx,
    rows.map(({ id }) => id),
    { id: digestId, at: now },
  );
}
