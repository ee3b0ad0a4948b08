import type { Knex } from 'knex';
import type { MakerRequestState } from '../../shared/contract/makers.js';

export interface MakerRequestRow {
  readonly id: number;
  readonly accountId: number;
  readonly displayName: string;
  readonly makerId: number;
  readonly state: MakerRequestState;
  readonly how: 'mail' | 'desk';
  readonly note: string;
  readonly reason: string | null;
  readonly createdAt: Date;
  readonly decidedAt: Date | null;
}

const waiting: readonly MakerRequestState[] = ['waiting-for-mail', 'waiting'];

export function isOpen(request: { state: MakerRequestState }): boolean {
  return waiting.includes(request.state);
}

const requests = (db: Knex): Knex.QueryBuilder =>
  db('maker_requests as q')
    .join('accounts as a', 'a.id', 'q.account_id')
    .select('q.id', 'q.state', 'q.how', 'q.note', 'q.reason', {
      accountId: 'q.account_id',
      displayName: 'a.display_name',
      makerId: 'q.maker_id',
      createdAt: 'q.created_at',
      decidedAt: 'q.decided_at',
    });

/** Requests to speak for a maker, and the mailed tokens that prove them. */
export const makerRequestStore = {
  async byId(db: Knex, id: number): Promise<MakerRequestRow | undefined> {
    return requests(db).where('q.id', id).first();
  },

  async latest(db: Knex, accountId: number, makerId: number): Promise<MakerRequestRow | undefined> {
    return requests(db)
      .where({ 'q.account_id': accountId, 'q.maker_id': makerId })
      .orderBy('q.id', 'desc')
      .first();
  },

  async add(
    trx: Knex,
    request: {
      accountId: number;
      makerId: number;
      how: 'mail' | 'desk';
      state: MakerRequestState;
      note: string;
      at: Date;
    },
  ): Promise<number> {
    const [id] = await trx('maker_requests').insert({
      account_id: request.accountId,
      maker_id: request.makerId,
      how: request.how,
      state: request.state,
      note: request.note,
      created_at: request.at,
    });
    return id!;
  },

  async decide(
    trx: Knex,
    id: number,
    decision: { state: MakerRequestState; by: number | null; reason: string | null; at: Date },
  ): Promise<void> {
    await trx('maker_requests').where({ id }).update({
      state: decision.state,
      decided_by: decision.by,
      reason: decision.reason,
      decided_at: decision.at,
    });
  },

  async addProof(
    trx: Knex,
    proof: { requestId: number; address: string; hash: Buffer; expiresAt: Date; at: Date },
  ): Promise<number> {
    const [id] = await trx('maker_proofs').insert({
      request_id: proof.requestId,
      address: proof.address,
      token_hash: proof.hash,
      expires_at: proof.expiresAt,
      created_at: proof.at,
    });
    return id!;
  },

  /** Uses a token up; undefined where it is unknown, used or expired. */
  async useProof(
    trx: Knex,
    hash: Buffer,
    now: Date,
  ): Promise<{ requestId: number; address: string } | undefined> {
    const used = await trx('maker_proofs')
      .where({ token_hash: hash, used_at: null })
      .where('expires_at', '>', now)
      .update({ used_at: now });
    if (used !== 1) return undefined;
    return trx('maker_proofs').where({ token_hash: hash }).first('address', { requestId: 'request_id' });
  },
};
