import type { Knex } from 'knex';
import { gatheredKinds } from '../../shared/contract/watches.js';
import type { WatchMail } from '../mail/watch-mail.js';
import type { HappeningKind } from './happenings.js';
import { namesOf, subjectKey, type SubjectName } from './subject-names.store.js';
import {
  tellingStore as store,
  type MailChoice,
  type NewNotice,
  type Reached,
  type UntoldHappening,
} from './telling.store.js';

/**
 * Tells the oldest happening that is not told yet to each person it concerns, once: their notices, the mail of those who
 * want it at once and the mark that it is told are one transaction. False when there was none.
 */
export async function tellNext(around: { knex: Knex; clock: () => Date; mail: WatchMail }): Promise<boolean> {
  const { knex, clock, mail } = around;
  return knex.transaction(async (trx) => {
    const happening = await store.holdNext(trx);
    if (!happening) return false;
    const now = clock();
    const notices = await noticesOf(trx, happening, now);
    await store.addNotices(trx, happening, notices);
    await queueMails(trx, mail, happening, notices);
    await store.markTold(trx, happening.id, now);
    return true;
  });
}

async function noticesOf(trx: Knex, happening: UntoldHappening, now: Date): Promise<NewNotice[]> {
  // Who is told for several reasons is told for the first of these.
  const reached = [
    ...(await store.people(trx, happening.id)),
    ...(await store.watchers(trx, happening.id)),
    ...(await store.owners(trx, happening.id)),
  ].filter(({ accountId }) => accountId !== happening.actorId);
  const each = new Map<number, Reached>();
  for (const one of reached) if (!each.has(one.accountId)) each.set(one.accountId, one);
  const choices = await store.choices(trx, [...each.keys()]);
  return [...each.values()].flatMap((one) => {
    const choice = choices.get(one.accountId);
    if (!choice) return [];
    const mail = mailOf(happening.kind, one, choice);
    return [{ ...one, mail, mailedAt: mail === 'at-once' ? now : null }];
  });
}

/** How a notice goes by mail. What concerns somebody's safety asks for no rhythm, only whether they refused just that. */
function mailOf(kind: HappeningKind, { atOnce }: Reached, choice: MailChoice): NewNotice['mail'] {
  if (choice.refused) return 'none';
  if (atOnce && choice.safetyMail) return 'at-once';
  if (choice.rhythm === 'none') return 'none';
  return choice.rhythm === 'at-once' && !gatheredKinds.has(kind) ? 'at-once' : 'digest';
}

async function queueMails(
  trx: Knex,
  mail: WatchMail,
  happening: UntoldHappening,
  notices: readonly NewNotice[],
): Promise<void> {
  const mailed = notices.filter((notice) => notice.mail === 'at-once');
  if (mailed.length === 0) return;
  const names = await namesOf(
    trx,
    mailed.flatMap(({ about }) => about ?? []),
  );
  await mail.queueNotices(
    trx,
    mailed.map((notice) => ({
      dedupeKey: `notice:${happening.id}:${notice.accountId}`,
      accountId: notice.accountId,
      safety: notice.atOnce,
      happening,
      because: notice.because,
      about: aboutOf(notice, names),
    })),
  );
}

function aboutOf({ about }: Reached, names: ReadonlyMap<string, SubjectName>) {
  const name = about && names.get(subjectKey(about))?.name;
  return about && name !== undefined && name !== null ? { key: subjectKey(about), name } : null;
}
