import type { Knex } from 'knex';
import type { DeskSubject } from '../../shared/contract/desk-subjects.js';
import type { DeskFlag, FlagOutcome, TellDesk } from '../../shared/contract/flags.js';
import { TakenDownKind } from '../../shared/contract/taken-down.js';
import type { AuditLog } from '../audit/audit.js';
import { AlreadyThere, FieldNotValid, NotFound } from '../http/problems.js';
import type { DeskWords } from '../mail/desk-mail.js';
import type { DeskClaims } from './claims.js';
import { flagStore as store, type FlaggedRow } from './flag.store.js';
import { fixIdOf, readSubject } from './subject.store.js';
import type { TakeDownService } from './take-down.service.js';
import { tellTellers } from './tellers.js';

export type FlagService = ReturnType<typeof createFlagService>;

/** Members tell the desk of a thing; the desk looks, decides, and tells them what came of it. */
export function createFlagService(parts: {
  knex: Knex;
  clock: () => Date;
  audit: AuditLog;
  mail: Pick<DeskWords, 'queueFlagSettled'>;
  claims: Pick<DeskClaims, 'demandFree'>;
  takeDown: Pick<TakeDownService, 'takeDown'>;
}) {
  const { knex, clock, audit, mail, claims, takeDown } = parts;

  return {
    /** FieldNotValid for a thing that is not on the pages; AlreadyThere where this member told of it and it still waits. */
    async tellDesk(accountId: number, { ground, line, ...where }: TellDesk): Promise<void> {
      const subject = await thingAt(where);
      await knex.transaction(async (trx) => {
        const at = clock();
        const { kind, id, title, person } = subject;
        const flaggedId = await store.waitingFor(trx, { kind, id, title, writerId: person.id, at });
        if (!(await store.add(trx, { flaggedId, accountId, ground, line, at })))
          throw new AlreadyThere(
            'You have told the desk of this already, and it still waits there.',
            'The desk tells you by mail what comes of it.',
          );
      });
    },

    async readFlag(id: number): Promise<DeskFlag> {
      const row = await store.byId(knex, id);
      if (!row) throw noSuchFlag();
      const [subject, flags] = await Promise.all([
        readSubject(knex, { kind: row.kind, id: row.subjectId }),
        store.flagsOf(knex, id),
      ]);
      return {
        id,
        state: row.state,
        since: row.createdAt.toISOString(),
        subject: subject ?? null,
        title: row.title,
        flags: flags.map((flag) => ({
          person: { id: flag.accountId, displayName: flag.displayName },
          ground: flag.ground,
          line: flag.line,
          at: flag.createdAt.toISOString(),
        })),
        reason: row.reason,
      };
    },

    /** ClaimedByAnother, AlreadyThere; FieldNotValid for an outcome that does not go with the thing. */
    async settle(
      moderatorId: number,
      id: number,
      { outcome, reason }: { outcome: FlagOutcome; reason: string },
    ): Promise<void> {
      await claims.demandFree({ kind: 'flag', id }, moderatorId);
      await knex.transaction(async (trx) => {
        const row = await store.hold(trx, id);
        if (!row) throw noSuchFlag();
        if (row.state !== 'waiting')
          throw new AlreadyThere('This is decided already.', 'Go back to the queue.');
        const subject = await readSubject(trx, { kind: row.kind, id: row.subjectId });
        demandFitting(row, subject, outcome);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'flag-settled',
          subject: { kind: 'flag', id, name: row.title },
          reason,
          details: { outcome, kind: row.kind, subjectId: row.subjectId },
        });
        if (outcome === 'taken-down') {
          // Settles what waits on the thing, this one with it, and tells those who told of it.
          const kind = TakenDownKind.parse(row.kind);
          await takeDown.takeDown(trx, { kind, id: row.subjectId, moderatorId, reason });
          return;
        }
        const at = clock();
        const tellers = await store.settle(trx, id, { outcome, reason, by: moderatorId, at });
        await tellTellers(trx, mail, tellers, { outcome, reason, path: subject?.path ?? '/', at });
      });
    },
  };

  async function thingAt({
    kind,
    id,
    fixKey,
  }: Pick<TellDesk, 'kind' | 'id' | 'fixKey'>): Promise<DeskSubject> {
    if ((kind === 'fix') !== (fixKey !== null))
      throw new FieldNotValid(
        'fixKey',
        kind === 'fix' ? 'is needed with a fix' : 'goes with a fix only',
        'Tell the desk from the page of the thing.',
      );
    const subjectId = fixKey === null ? id : await fixIdOf(knex, id, fixKey);
    const subject = subjectId === undefined ? undefined : await readSubject(knex, { kind, id: subjectId });
    if (!subject || subject.takenDown)
      throw new FieldNotValid('id', 'names nothing that stands on the pages', 'Read the page again.');
    return subject;
  }
}

function demandFitting(row: FlaggedRow, subject: DeskSubject | undefined, outcome: FlagOutcome): void {
  const canBeTakenDown = TakenDownKind.safeParse(row.kind).success;
  const isOnThePages = subject !== undefined && subject.takenDown === null;
  if (outcome === 'taken-down' && !(canBeTakenDown && isOnThePages))
    throw new FieldNotValid(
      'outcome',
      canBeTakenDown ? 'is no longer there to be chosen: it is off the pages' : 'does not go with a write-up',
      canBeTakenDown ? 'Say that it is dealt with.' : 'Deal with it through its edition and say so here.',
    );
  if (outcome === 'dealt-with' && canBeTakenDown && isOnThePages)
    throw new FieldNotValid(
      'outcome',
      'goes with write-ups, and with what is off the pages already',
      'Keep it or take it down.',
    );
}

function noSuchFlag(): NotFound {
  return new NotFound('There is nothing of this number that the desk was told of.', 'Read the queue again.');
}
