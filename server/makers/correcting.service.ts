import type { Knex } from 'knex';
import type { AnnounceRevision, WantedReadings } from '../../shared/contract/makers.js';
import type { Revision } from '../../shared/contract/hardware.js';
import type { AuditLog } from '../audit/audit.js';
import type { AnnouncingService } from '../hardware/announcing.service.js';
import type { HardwareService } from '../hardware/hardware.js';
import { isModerator, type MemberCaller } from '../http/caller.js';
import { FieldNotValid, NotAllowed } from '../http/problems.js';
import type { Happenings } from '../watches/happenings.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import type { Concerned, ConcernedWriteUp } from './concerned.js';
import { makerStore as makers } from './maker.store.js';
import { wantedReadingsOf, wantedSentence } from './wanted-readings.js';
import type { WantedReadingsStore } from './wanted-readings.store.js';

export interface CorrectingParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly concerned: Concerned;
  readonly hardware: HardwareService;
  readonly announcing: AnnouncingService;
  readonly writeUps: WriteUpService;
  readonly wanted: WantedReadingsStore;
  readonly audit: AuditLog;
  readonly happenings: Happenings;
}

export type CorrectingService = ReturnType<typeof createCorrectingService>;

/** How a maker corrects its part: announces a revision, asks owners to measure it, says what is made right by it. */
export function createCorrectingService(around: CorrectingParts) {
  const { knex, clock, concerned, hardware, announcing, writeUps, wanted, audit, happenings } = around;

  const bySpeaker =
    (accountId: number): Parameters<AnnouncingService['announce']>[3] =>
    (db, part) =>
      concerned.demandSpeaker(db, accountId, part.maker);

  const bySpeakerOrModerator =
    (caller: MemberCaller): Parameters<AnnouncingService['announce']>[3] =>
    async (db, part) => {
      if (!isModerator(caller)) await concerned.demandSpeaker(db, caller.accountId, part.maker);
    };

  return {
    /** Puts the revision into the catalogue as announced and tells who watches the part what to measure on it. */
    announce(caller: MemberCaller, slug: string, entry: AnnounceRevision): Promise<Revision> {
      return announcing.announce(
        caller.accountId,
        slug,
        entry,
        bySpeaker(caller.accountId),
        async (trx, part, revisionId) => {
          const features = await wanted.jointFeatures(trx, part.id);
          await happenings.add(trx, {
            kind: 'revision-announced',
            key: `revision-announced:${revisionId}`,
            title: `${part.maker.name} announced ${part.name} ${entry.label}`,
            text: [entry.whatChanges, wantedSentence(features)].filter(Boolean).join('\n\n'),
            path: `/parts/${part.slug}`,
            actorId: caller.accountId,
            about: { parts: [part.id], joints: [...new Set(features.map(({ jointId }) => jointId))] },
          });
        },
      );
    },

    changeAnnounced(caller: MemberCaller, id: number, entry: AnnounceRevision): Promise<Revision> {
      return announcing.change(caller.accountId, id, entry, bySpeakerOrModerator(caller));
    },

    /** From a day that has come: what is sold next year is still announced. */
    async sell(caller: MemberCaller, id: number, soldFrom: string): Promise<Revision> {
      if (soldFrom > clock().toISOString().slice(0, 10))
        throw new FieldNotValid('soldFrom', 'is still to come', 'Say so when it is sold.');
      return announcing.sell(caller.accountId, id, soldFrom, bySpeakerOrModerator(caller));
    },

    withdraw(caller: MemberCaller, id: number): Promise<void> {
      return announcing.withdraw(caller.accountId, id, bySpeakerOrModerator(caller));
    },

    /** Of each revision that was announced here: dimensions of the part's joints with few readings or none. */
    async wantedReadings(slug: string): Promise<WantedReadings[]> {
      const part = await hardware.partBySlug(slug);
      const asked = (await hardware.revisionsOfPart(part.id)).filter(
        (revision) => revision.announcedAt !== null,
      );
      if (asked.length === 0) return [];
      const [features, counts] = await Promise.all([
        wanted.jointFeatures(knex, part.id),
        wanted.readingCounts(
          knex,
          asked.map(({ id }) => id),
        ),
      ]);
      return asked.flatMap((revision) => wantedReadingsOf(revision, features, counts));
    },

    /** The maker says that its part is right from this revision on; the standing of the fixes follows at once. */
    async markMadeRight(
      caller: MemberCaller,
      slug: string,
      { revisionId, fixKeys }: { revisionId: number; fixKeys: readonly string[] | null },
    ): Promise<{ fixKeys: string[] }> {
      const writeUp = await concerned.writeUpAt(slug);
      const revision = (await hardware.revisionsByIds([revisionId])).get(revisionId);
      const part = revision && writeUp.parts.get(revision.partId);
      if (!part)
        throw new FieldNotValid(
          'revisionId',
          'is not a revision of one of the parts',
          'Choose a revision of your part of the joint.',
        );
      await concerned.demandSpeaker(knex, caller.accountId, part.maker);
      return knex.transaction(async (trx) => {
        const keys = await writeUps.setMadeRight(trx, writeUp.id, fixKeys, revision.id);
        const what = `${part.name} ${revision.label}`;
        await note(trx, caller.accountId, 'made-right', writeUp, { from: what, fixKeys: keys });
        await happenings.add(trx, {
          kind: 'made-right',
          key: `made-right:${writeUp.id}:${revision.id}:${clock().getTime()}`,
          title: `Made right from ${what} on: “${writeUp.content.title}”`,
          text: titlesOf(writeUp, keys).join('\n'),
          path: `/write-ups/${writeUp.slug}`,
          actorId: caller.accountId,
          about: { writeUps: [writeUp.id], parts: [part.id], revisions: [revision.id] },
        });
        return { fixKeys: keys };
      });
    },

    /** Whoever speaks for the maker whose revision it is, or a moderator. A fix that is not made right stays as it is. */
    async unmarkMadeRight(
      caller: MemberCaller,
      slug: string,
      fixKeys: readonly string[],
    ): Promise<{ fixKeys: string[] }> {
      const writeUp = await concerned.writeUpAt(slug);
      if (!isModerator(caller)) await demandOwnMarks(caller.accountId, writeUp, fixKeys);
      return knex.transaction(async (trx) => {
        const keys = await writeUps.setMadeRight(trx, writeUp.id, fixKeys, null);
        await note(trx, caller.accountId, 'made-right-taken-back', writeUp, { fixKeys: keys });
        return { fixKeys: keys };
      });
    },
  };

  async function demandOwnMarks(
    accountId: number,
    writeUp: ConcernedWriteUp,
    fixKeys: readonly string[],
  ): Promise<void> {
    const [known, spokenFor] = await Promise.all([
      writeUps.fixesOf(writeUp.id),
      makers.spokenFor(knex, accountId),
    ]);
    const partIds = fixKeys.flatMap((key) => known.get(key)?.madeRightFrom?.partId ?? []);
    const parts = await hardware.partsByIds(partIds);
    if ([...parts.values()].some(({ maker }) => !spokenFor.includes(maker.id)))
      throw new NotAllowed(
        'Another maker has said so of its part.',
        'Leave that fix out, or ask a moderator.',
      );
    if (
      partIds.length === 0 &&
      ![...writeUp.parts.values()].some(({ maker }) => spokenFor.includes(maker.id))
    )
      throw new NotAllowed('You speak for none of the makers of these parts.', 'Ask a moderator.');
  }

  async function note(
    trx: Knex,
    actorId: number,
    action: string,
    writeUp: ConcernedWriteUp,
    details: Record<string, unknown>,
  ): Promise<void> {
    const subject = { kind: 'write-up', id: writeUp.id, name: writeUp.content.title } as const;
    await audit.note(trx, { actorId, action, subject, details });
  }
}

function titlesOf(writeUp: ConcernedWriteUp, keys: readonly string[]): string[] {
  return writeUp.content.fixes.filter((fix) => keys.includes(fix.key)).map((fix) => fix.title);
}
