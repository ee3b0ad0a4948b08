import type { Knex } from 'knex';
import type { PartRef } from '../../shared/contract/hardware.js';
import type { Proposed, ProposalState } from '../../shared/contract/proposals.js';
import { fromJson, isDuplicate } from '../rows.js';

export interface ProposalRow {
  readonly id: number;
  readonly state: ProposalState;
  readonly partId: number | null;
  readonly part: PartRef | null;
  readonly entry: Proposed;
  readonly accountId: number;
  readonly displayName: string;
  readonly createdAt: Date;
  readonly reason: string | null;
  readonly decidedAt: Date | null;
}

export type ProposalStore = ReturnType<typeof createProposalStore>;

export function createProposalStore(knex: Knex) {
  return {
    /** `already-there` where something of the same name waits. */
    async add(proposal: {
      partId: number | null;
      entry: Proposed;
      waitingName: string;
      accountId: number;
      at: Date;
    }): Promise<number | 'already-there'> {
      try {
        const [id] = await knex('hardware_proposals').insert({
          kind: proposal.entry.kind,
          part_id: proposal.partId,
          payload: JSON.stringify(proposal.entry),
          waiting_name: proposal.waitingName,
          account_id: proposal.accountId,
          created_at: proposal.at,
        });
        return id!;
      } catch (error) {
        if (isDuplicate(error)) return 'already-there';
        throw error;
      }
    },

    async byId(id: number): Promise<ProposalRow | undefined> {
      const row: ProposalRecord | undefined = await proposals(knex).where('q.id', id).first();
      return row && toProposal(row);
    },

    /** The proposal, held until the transaction ends: of two decisions at once the second finds the first. */
    async hold(id: number, trx: Knex): Promise<ProposalRow | undefined> {
      const held: { id: number } | undefined = await trx('hardware_proposals')
        .where({ id })
        .forUpdate()
        .first('id');
      if (!held) return undefined;
      const row: ProposalRecord = await proposals(trx).where('q.id', id).first();
      return toProposal(row);
    },

    /** Of one account, the newest first. */
    async ofAccount(
      accountId: number,
      page: { before: number | undefined; rows: number },
    ): Promise<ProposalRow[]> {
      const query = proposals(knex).where('q.account_id', accountId).orderBy('q.id', 'desc').limit(page.rows);
      if (page.before !== undefined) void query.where('q.id', '<', page.before);
      const rows: ProposalRecord[] = await query;
      return rows.map(toProposal);
    },

    /** What waits, the longest wait first. */
    async waiting(page: {
      after: { at: Date; id: number } | undefined;
      rows: number;
    }): Promise<ProposalRow[]> {
      const query = proposals(knex)
        .where('q.state', 'waiting')
        .orderBy(['q.created_at', 'q.id'])
        .limit(page.rows);
      const { after } = page;
      if (after) {
        void query
          .where('q.created_at', '>=', after.at)
          .where((either) => either.where('q.created_at', '>', after.at).orWhere('q.id', '>', after.id));
      }
      const rows: ProposalRecord[] = await query;
      return rows.map(toProposal);
    },

    async decide(
      id: number,
      decision: {
        state: 'taken' | 'declined';
        entry: Proposed;
        partId: number | null;
        reason: string | null;
        by: number;
        at: Date;
      },
      trx: Knex,
    ): Promise<void> {
      await trx('hardware_proposals')
        .where({ id })
        .update({
          state: decision.state,
          payload: JSON.stringify(decision.entry),
          part_id: decision.partId,
          waiting_name: null,
          reason: decision.reason,
          decided_by: decision.by,
          decided_at: decision.at,
        });
    },
  };
}

interface ProposalRecord extends Omit<ProposalRow, 'part' | 'entry'> {
  payload: unknown;
  partSlug: string | null;
  partName: string;
  partKind: PartRef['kind'];
  makerId: number;
  makerSlug: string;
  makerName: string;
}

function proposals(knex: Knex): Knex.QueryBuilder {
  return knex('hardware_proposals as q')
    .join('accounts as a', 'a.id', 'q.account_id')
    .leftJoin('parts as p', 'p.id', 'q.part_id')
    .leftJoin('makers as m', 'm.id', 'p.maker_id')
    .select('q.id', 'q.state', 'q.payload', 'q.reason', {
      partId: 'q.part_id',
      accountId: 'a.id',
      displayName: 'a.display_name',
      createdAt: 'q.created_at',
      decidedAt: 'q.decided_at',
      partSlug: 'p.slug',
      partName: 'p.name',
      partKind: 'p.kind',
      makerId: 'm.id',
      makerSlug: 'm.slug',
      makerName: 'm.name',
    });
}

function toProposal(row: ProposalRecord): ProposalRow {
  const { payload, partSlug, partName, partKind, makerId, makerSlug, makerName, ...rest } = row;
  return {
    ...rest,
    entry: entryIn(payload),
    part:
      rest.partId === null || partSlug === null
        ? null
        : {
            id: rest.partId,
            slug: partSlug,
            name: partName,
            kind: partKind,
            maker: { id: makerId, slug: makerSlug, name: makerName },
          },
  };
}

/** Revisions that were proposed before photos could be name none. */
function entryIn(payload: unknown): Proposed {
  const entry = fromJson<Proposed>(payload);
  return entry.kind === 'revision' ? { ...entry, photos: entry.photos ?? [] } : entry;
}
