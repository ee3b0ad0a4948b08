import type { Knex } from 'knex';
import type { PartRef, Revision } from '../../shared/contract/hardware.js';
import type { AnnounceRevision } from '../../shared/contract/makers.js';
import type { AuditLog } from '../audit/audit.js';
import { AlreadyThere, NotFound } from '../http/problems.js';
import { announcedRevisionStore as announced, type AnnouncedRow } from './announced-revision.store.js';
import type { HardwareService } from './hardware.service.js';

/** What a part's maker has to allow before its revisions are touched; throws where it does not. */
export type Permission = (trx: Knex, part: PartRef) => Promise<void>;

export type AnnouncingService = ReturnType<typeof createAnnouncingService>;

/** Revisions in the catalogue that are announced and not sold yet. */
export function createAnnouncingService(around: {
  knex: Knex;
  clock: () => Date;
  hardware: HardwareService;
  audit: AuditLog;
}) {
  const { knex, clock, hardware, audit } = around;

  return {
    /** Puts the revision into the catalogue; `told` runs in the same transaction with the part and the new identity. */
    async announce(
      by: number,
      slug: string,
      entry: AnnounceRevision,
      demand: Permission,
      told: (trx: Knex, part: PartRef, revisionId: number) => Promise<void>,
    ): Promise<Revision> {
      const part = await hardware.partBySlug(slug);
      await demand(knex, part);
      const id = await knex.transaction(async (trx) => {
        const added = await announced.add(trx, part.id, entry, clock());
        if (added === 'already-there') throw labelTaken(entry.label, part);
        await note(trx, by, 'revision-announced', added, entry.label, part);
        await told(trx, part, added);
        return added;
      });
      return revisionOf(part.id, id);
    },

    async change(by: number, id: number, entry: AnnounceRevision, demand: Permission): Promise<Revision> {
      const part = await withAnnounced(id, demand, async (trx, { label }, of) => {
        if ((await announced.change(trx, id, entry)) === 'already-there') throw labelTaken(entry.label, of);
        await note(trx, by, 'announcement-changed', id, entry.label, of, { from: label });
      });
      return revisionOf(part.id, id);
    },

    /** From now on it is a revision like any other. */
    async sell(by: number, id: number, soldFrom: string, demand: Permission): Promise<Revision> {
      const part = await withAnnounced(id, demand, async (trx, { label }, of) => {
        await announced.markSold(trx, id, soldFrom);
        await note(trx, by, 'announced-revision-sold', id, label, of, { soldFrom });
      });
      return revisionOf(part.id, id);
    },

    /** AlreadyThere once a reading, a bench or a write-up names it. */
    async withdraw(by: number, id: number, demand: Permission): Promise<void> {
      await withAnnounced(id, demand, async (trx, { label }, part) => {
        if ((await announced.remove(trx, id)) === 'in-use')
          throw new AlreadyThere(
            'Readings, benches or write-ups name this revision by now.',
            'Change what is said of it instead.',
          );
        await note(trx, by, 'announcement-withdrawn', id, label, part);
      });
    },
  };

  /** NotFound for a revision that is not announced, or is sold by now. */
  async function withAnnounced(
    id: number,
    demand: Permission,
    work: (trx: Knex, revision: AnnouncedRow, part: PartRef) => Promise<void>,
  ): Promise<PartRef> {
    return knex.transaction(async (trx) => {
      const revision = await announced.hold(trx, id);
      if (!revision || revision.state !== 'announced')
        throw new NotFound('There is no announced revision like that.', 'It may be sold by now.');
      const part = (await hardware.partsByIds([revision.partId])).get(revision.partId)!;
      await demand(trx, part);
      await work(trx, revision, part);
      return part;
    });
  }

  async function revisionOf(partId: number, id: number): Promise<Revision> {
    return (await hardware.revisionsOfPart(partId)).find((revision) => revision.id === id)!;
  }

  async function note(
    trx: Knex,
    by: number,
    action: string,
    id: number,
    label: string,
    part: PartRef,
    details?: Record<string, unknown>,
  ): Promise<void> {
    await audit.note(trx, {
      actorId: by,
      action,
      subject: { kind: 'revision', id, name: `${part.name} ${label}` },
      ...(details ? { details } : {}),
    });
  }
}

function labelTaken(label: string, part: PartRef): AlreadyThere {
  return new AlreadyThere(`${part.name} has a revision ${label} already.`, 'Give it another label.');
}
