import type { Knex } from 'knex';
import type { ConcernedMaker, MakerAnswer, MakerSide } from '../../shared/contract/makers.js';
import type { RichText } from '../../shared/contract/write-ups.js';
import { toPlainText } from '../text/render-text.js';
import type { AuditLog } from '../audit/audit.js';
import type { HardwareService } from '../hardware/hardware.js';
import { isModerator, type Caller, type MemberCaller } from '../http/caller.js';
import { FieldNotValid, NotAllowed, NotFound } from '../http/problems.js';
import { groupBy } from '../rows.js';
import type { Happenings } from '../watches/happenings.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { partsBy, type Concerned, type ConcernedWriteUp } from './concerned.js';
import { makerAnswerStore as answers, type AnswerRow, type EarlierTextRow } from './maker-answer.store.js';
import { makerLetterStore as letters } from './maker-letter.store.js';
import { makerStore as makers, type MakerRow } from './maker.store.js';

export interface AnswerParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly concerned: Concerned;
  readonly hardware: HardwareService;
  readonly writeUps: WriteUpService;
  readonly renderText: (source: string) => RichText;
  readonly audit: AuditLog;
  readonly happenings: Happenings;
}

export type AnswerService = ReturnType<typeof createAnswerService>;

/** What makers say on write-ups about their parts. */
export function createAnswerService(around: AnswerParts) {
  const { knex, clock, concerned, hardware, writeUps, renderText, audit, happenings } = around;

  return {
    /** Everything a write-up's page shows of the makers of its parts. */
    async readSide(caller: Caller, slug: string): Promise<MakerSide> {
      const writeUp = await concerned.writeUpAt(slug);
      const makerIds = [...new Set([...writeUp.parts.values()].map(({ maker }) => maker.id))];
      const [rows, found, shown, revisions, sent, spokenFor, authors] = await Promise.all([
        makers.byIds(knex, makerIds),
        answers.shown(knex, writeUp.id),
        earlierBy(writeUp.id),
        hardware.revisionsByPartIds([...writeUp.parts.keys()]),
        letters.of(knex, writeUp.id),
        caller.accountId === null ? ([] as number[]) : makers.spokenFor(knex, caller.accountId),
        writeUps.authorIdsOf(knex, writeUp.id),
      ]);
      const byId = new Map(rows.map((row) => [row.id, row]));
      return {
        answers: found.flatMap((row) => {
          const maker = byId.get(row.makerId);
          return maker ? [toAnswer(row, maker, shown.get(row.id) ?? [])] : [];
        }),
        makers: rows.map((row): ConcernedMaker => ({
          maker: refOf(row),
          iSpeak: spokenFor.includes(row.id),
          parts: partsBy(writeUp, row.id).map((part) => ({
            ...part,
            revisions: revisions.get(part.id) ?? [],
          })),
          canBeTold: row.contactAddress !== null,
          letters: sent
            .filter(({ makerId }) => makerId === row.id)
            .map(({ accountId, displayName, sentAt }) => ({
              person: { id: accountId, displayName },
              sentAt: sentAt.toISOString(),
            })),
        })),
        mayTell: isModerator(caller) || (caller.accountId !== null && authors.includes(caller.accountId)),
      };
    },

    /** Says it, or says it otherwise; the text before is kept. Saying the same again changes nothing. */
    async put(caller: MemberCaller, slug: string, makerSlug: string, text: string): Promise<MakerAnswer> {
      const { writeUp, maker } = await concerned.makerIn(slug, makerSlug);
      await concerned.demandSpeaker(knex, caller.accountId, maker);
      if (text.trim() === '') throw new FieldNotValid('text', 'says nothing', 'Write the answer first.');
      return knex.transaction(async (trx) => {
        await writeUps.holdWriteUp(trx, writeUp.id);
        const before = await answers.of(trx, maker.id, writeUp.id);
        if (before?.source === text) await answers.showAgain(trx, before.id);
        else await say(trx, caller.accountId, writeUp, maker, before, text);
        const now = (await answers.of(trx, maker.id, writeUp.id))!;
        return toAnswer(now, maker, await answers.earlierTexts(trx, [now.id]));
      });
    },

    /** Not shown from now on; nothing is deleted. A moderator who does not speak for the maker gives a reason. */
    async takeBack(caller: MemberCaller, slug: string, makerSlug: string, reason: string): Promise<void> {
      const { writeUp, maker } = await concerned.makerIn(slug, makerSlug);
      const own = await makers.speaks(knex, caller.accountId, maker.id);
      if (!own && !isModerator(caller))
        throw new NotAllowed(`You do not speak for ${maker.name}.`, 'Ask a moderator.');
      if (!own && reason.length < 10)
        throw new FieldNotValid('reason', 'takes at least 10 characters', 'Say why it is taken back.');
      await knex.transaction(async (trx) => {
        await writeUps.holdWriteUp(trx, writeUp.id);
        const answer = await answers.of(trx, maker.id, writeUp.id);
        if (!answer || answer.takenBackAt)
          throw new NotFound('The maker has said nothing here.', 'Read the page again.');
        await answers.takeBack(trx, answer.id, clock());
        await note(trx, caller.accountId, 'maker-answer-taken-back', writeUp, maker, reason);
      });
    },
  };

  async function say(
    trx: Knex,
    accountId: number,
    writeUp: ConcernedWriteUp,
    maker: MakerRow,
    before: AnswerRow | undefined,
    source: string,
  ): Promise<void> {
    const at = clock();
    if (before) await answers.change(trx, before, { source, accountId, at });
    else await answers.add(trx, { makerId: maker.id, writeUpId: writeUp.id, source, accountId, at });
    await note(trx, accountId, before ? 'maker-answer-changed' : 'maker-answered', writeUp, maker);
    await happenings.add(trx, {
      kind: 'maker-answered',
      key: `maker-answered:${maker.id}:${writeUp.id}:${at.getTime()}`,
      title: `${maker.name} ${before ? 'changed its answer' : 'answered'} on “${writeUp.content.title}”`,
      text: toPlainText(renderText(source).html),
      path: `/write-ups/${writeUp.slug}`,
      actorId: accountId,
      about: { writeUps: [writeUp.id], parts: partsBy(writeUp, maker.id).map((part) => part.id) },
    });
  }

  async function note(
    trx: Knex,
    actorId: number,
    action: string,
    writeUp: ConcernedWriteUp,
    maker: MakerRow,
    reason = '',
  ): Promise<void> {
    await audit.note(trx, {
      actorId,
      action,
      subject: { kind: 'write-up', id: writeUp.id, name: writeUp.content.title },
      reason,
      details: { maker: maker.slug },
    });
  }

  async function earlierBy(writeUpId: number): Promise<Map<number, EarlierTextRow[]>> {
    const shown = await answers.shown(knex, writeUpId);
    const ids = shown.map((row) => row.id);
    return groupBy(await answers.earlierTexts(knex, ids), (row) => row.answerId);
  }

  function toAnswer(row: AnswerRow, maker: MakerRow, earlier: readonly EarlierTextRow[]): MakerAnswer {
    return {
      maker: refOf(maker),
      text: renderText(row.source),
      person: { id: row.accountId, displayName: row.displayName },
      createdAt: row.createdAt.toISOString(),
      changedAt: row.changedAt.toISOString(),
      earlier: earlier.map(({ source, from, to }) => ({
        text: renderText(source),
        from: from.toISOString(),
        to: to.toISOString(),
      })),
    };
  }
}

function refOf({ id, slug, name }: MakerRow): MakerAnswer['maker'] {
  return { id, slug, name };
}
