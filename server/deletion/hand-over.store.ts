import type { Knex } from 'knex';
import type { HandOverState } from '../../shared/contract/deletion.js';
import { groupBy } from '../rows.js';

export interface HandOverRow {
  readonly id: number;
  readonly fromId: number;
  readonly toId: number | null;
  readonly addressedTo: string;
  readonly state: HandOverState;
  readonly offeredAt: Date;
  readonly endsAt: Date;
}

export interface OfferRow extends HandOverRow {
  readonly from: string;
  readonly writeUps: { readonly slug: string; readonly title: string }[];
}

const columns = {
  id: 'h.id',
  fromId: 'h.from_id',
  toId: 'h.to_id',
  addressedTo: 'h.addressed_to',
  state: 'h.state',
  offeredAt: 'h.offered_at',
  endsAt: 'h.ends_at',
};
/** Offers that still bind somebody. */
const open: readonly HandOverState[] = ['waiting', 'taken'];

export const handOverStore = {
  async add(
    trx: Knex,
    offer: { fromId: number; toId: number | null; addressedTo: string; offeredAt: Date; endsAt: Date },
  ): Promise<number> {
    const [id] = await trx('hand_overs').insert({
      from_id: offer.fromId,
      to_id: offer.toId,
      addressed_to: offer.addressedTo,
      offered_at: offer.offeredAt,
      ends_at: offer.endsAt,
    });
    return id!;
  },

  /** The newest offer that somebody made. */
  async newestOf(db: Knex, fromId: number): Promise<HandOverRow | undefined> {
    return db('hand_overs as h').where('h.from_id', fromId).orderBy('h.id', 'desc').first(columns);
  },

  /** An offer that can still be decided, held until the transaction ends. */
  async holdWaiting(trx: Knex, id: number, toId: number, now: Date): Promise<HandOverRow | undefined> {
    return trx('hand_overs as h')
      .where({ 'h.id': id, 'h.to_id': toId, 'h.state': 'waiting' })
      .where('h.ends_at', '>', now)
      .forUpdate()
      .first(columns);
  },

  async decide(trx: Knex, id: number, state: HandOverState, at: Date): Promise<void> {
    await trx('hand_overs').where({ id }).update({ state, decided_at: at });
  },

  /** Whatever somebody offered is off. */
  async callOff(trx: Knex, fromId: number, at: Date): Promise<void> {
    await trx('hand_overs')
      .where('from_id', fromId)
      .whereIn('state', open)
      .update({ state: 'called-off', decided_at: at });
  },

  /** Offers that nobody answered in time. */
  async endOverdue(trx: Knex, now: Date): Promise<void> {
    await trx('hand_overs')
      .where('state', 'waiting')
      .where('ends_at', '<=', now)
      .update({ state: 'run-out', decided_at: now });
  },

  /** Offers made to somebody that bind them or wait for them, with what is offered; two queries. */
  async offersTo(db: Knex, toId: number): Promise<OfferRow[]> {
    const offers: Omit<OfferRow, 'writeUps'>[] = await db('hand_overs as h')
      .join('accounts as a', 'a.id', 'h.from_id')
      .where('h.to_id', toId)
      .whereIn('h.state', open)
      .orderBy('h.id', 'desc')
      .select({ ...columns, from: 'a.display_name' });
    const writeUps: { slug: string; title: string; keeperId: number }[] = await db('write_ups as w')
      .join('editions as e', 'e.id', 'w.published_edition_id')
      .whereIn(
        'w.created_by',
        offers.map((offer) => offer.fromId),
      )
      .orderBy('w.id')
      .select('w.slug', 'e.title', { keeperId: 'w.created_by' });
    const byKeeper = groupBy(writeUps, (writeUp) => writeUp.keeperId);
    return offers.map((offer) => ({
      ...offer,
      writeUps: (byKeeper.get(offer.fromId) ?? []).map(({ slug, title }) => ({ slug, title })),
    }));
  },

  /** The write-ups of somebody who leaves are looked after by another from now on. */
  async moveWriteUps(trx: Knex, fromId: number, toId: number): Promise<void> {
    await trx('write_ups').where('created_by', fromId).update({ created_by: toId });
  },

  /** Forgets what was written of and by somebody who has left, and declines what was offered to them. */
  async forget(trx: Knex, accountId: number, at: Date): Promise<void> {
    await trx('hand_overs')
      .where('to_id', accountId)
      .whereIn('state', open)
      .update({ state: 'declined', decided_at: at });
    await trx('hand_overs')
      .where((either) => either.where('from_id', accountId).orWhere('to_id', accountId))
      .update({ addressed_to: '' });
  },
};
