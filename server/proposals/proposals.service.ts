import type { Knex } from 'knex';
import { z } from 'zod';
import type { AuditLog } from '../audit/audit.js';
import type { RevisionPhoto } from '../../shared/contract/hardware.js';
import type { DeskProposal, Proposal, Propose, Proposed } from '../../shared/contract/proposals.js';
import { readCursor, toPage } from '../http/pages.js';
import { AlreadyThere, FieldNotValid, NotFound } from '../http/problems.js';
import type { DeskClaims } from '../moderation/claims.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import { catalogueEntryStore as catalogue } from './catalogue-entry.store.js';
import type { ProposalRow, ProposalStore } from './proposal.store.js';
import { waitingName, wordsOf } from './proposal-words.js';
import { createProposedPhotos, type NamedPhoto, type ProposalPhotos } from './proposed-photos.js';

const PlaceInQueue = z.object({ at: z.iso.datetime(), id: z.number().int() });
const PlaceInMine = z.object({ id: z.number().int() });

/** What proposals need of the mail: to tell the proposer within the transaction of the decision. */
export interface ProposalMail {
  queueProposalDecided(
    trx: Knex,
    proposal: {
      accountId: number;
      proposalId: number;
      what: string;
      slug: string | null;
      reason: string | null;
    },
  ): Promise<void>;
}

interface PageWish {
  readonly cursor?: string | undefined;
  readonly limit: number;
}

export type ProposalService = ReturnType<typeof createProposalService>;

export function createProposalService(around: {
  knex: Knex;
  clock: () => Date;
  store: ProposalStore;
  mail: ProposalMail;
  photos: ProposalPhotos;
  audit: AuditLog;
  happenings: Happenings;
  claims: Pick<DeskClaims, 'demandFree'>;
  deskInbox: DeskInbox;
}) {
  const { knex, clock, store, mail, audit, happenings, claims, deskInbox } = around;
  const proposedPhotos = createProposedPhotos(around.photos);

  return {
    /** FieldNotValid for a part that is not there, NotValid for photos of others; AlreadyThere where it stands in the catalogue or waits already. */
    async propose(accountId: number, { partId, entry }: Propose): Promise<Proposal> {
      await demandPart(partId, entry);
      await demandNew(knex, partId, entry);
      await proposedPhotos.demandOwn(accountId, entry);
      const id = await store.add({
        partId,
        entry,
        waitingName: waitingName(partId, entry),
        accountId,
        at: clock(),
      });
      if (id === 'already-there') {
        throw new AlreadyThere(
          `${wordsOf(entry)} is proposed already and waits at the desk.`,
          'Wait for the desk, or give it another name if it is another thing.',
        );
      }
      await deskInbox.photosUsed(knex, proposedPhotos.idsIn(entry));
      return (await proposalsOf([(await store.byId(id))!]))[0]!;
    },

    /** The newest first. */
    async listMine(accountId: number, query: PageWish): Promise<{ items: Proposal[]; next: string | null }> {
      const before = readCursor(PlaceInMine, query.cursor)?.id;
      const rows = await store.ofAccount(accountId, { before, rows: query.limit + 1 });
      const page = toPage(rows, query.limit, ({ id }) => ({ id }));
      return { items: await proposalsOf(page.items), next: page.next };
    },

    /** A proposal in whatever state, for the desk. */
    async readForDesk(id: number): Promise<DeskProposal> {
      const row = await store.byId(id);
      if (!row) throw new NotFound('There is no such proposal.', 'Read the queue again.');
      return { ...(await proposalsOf([row]))[0]!, person: personOf(row) };
    },

    /** What waits, the longest wait first. */
    async listWaiting(query: PageWish): Promise<{ items: DeskProposal[]; next: string | null }> {
      const place = readCursor(PlaceInQueue, query.cursor);
      const after = place && { at: new Date(place.at), id: place.id };
      const rows = await store.waiting({ after, rows: query.limit + 1 });
      const page = toPage(rows, query.limit, ({ id, createdAt }) => ({ at: createdAt.toISOString(), id }));
      const items = await proposalsOf(page.items);
      return {
        items: items.map((proposal, index) => ({ ...proposal, person: personOf(page.items[index]!) })),
        next: page.next,
      };
    },

    /**
     * Makes the rows of the catalogue from the proposal, or from what the moderator made of it, in one transaction with the
     * decision and the mail. The kind cannot be changed.
     */
    async take(id: number, moderatorId: number, amended: Proposed | null): Promise<{ slug: string }> {
      await claims.demandFree({ kind: 'proposal', id }, moderatorId);
      return knex.transaction(async (trx) => {
        const proposal = await holdWaiting(id, trx);
        const entry = amended ?? proposal.entry;
        if (entry.kind !== proposal.entry.kind) {
          throw new FieldNotValid(
            'entry.kind',
            'is not what was proposed',
            `Amend the ${proposal.entry.kind}, or decline it.`,
          );
        }
        proposedPhotos.demandOffered(entry, proposal.entry);
        const part = await enter(trx, proposal.partId, entry, await proposedPhotos.stillThere(entry));
        const decision = { state: 'taken', entry, partId: part.id, reason: null } as const;
        await store.decide(id, { ...decision, by: moderatorId, at: clock() }, trx);
        await mail.queueProposalDecided(trx, {
          accountId: proposal.accountId,
          proposalId: id,
          what: wordsOf(entry, proposal.part?.name),
          slug: part.slug,
          reason: null,
        });
        const name = wordsOf(entry, proposal.part?.name);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'proposal-taken',
          subject: { kind: 'proposal', id, name },
          details: { part: part.slug, amended: amended !== null },
        });
        if (entry.kind === 'revision') {
          await happenings.add(trx, {
            kind: 'revision-added',
            key: `revision-added:${id}`,
            title: `In the catalogue: ${name}`,
            text: entry.whatChanged,
            path: `/parts/${part.slug}`,
            actorId: proposal.accountId,
            about: { parts: [part.id] },
          });
        }
        return { slug: part.slug };
      });
    },

    async decline(id: number, moderatorId: number, reason: string): Promise<void> {
      await claims.demandFree({ kind: 'proposal', id }, moderatorId);
      await knex.transaction(async (trx) => {
        const { entry, partId, accountId, part } = await holdWaiting(id, trx);
        const decision = { state: 'declined', entry, partId, reason } as const;
        await store.decide(id, { ...decision, by: moderatorId, at: clock() }, trx);
        const what = wordsOf(entry, part?.name);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'proposal-declined',
          subject: { kind: 'proposal', id, name: what },
          reason,
        });
        await mail.queueProposalDecided(trx, { accountId, proposalId: id, what, slug: null, reason });
      });
    },
  };

  async function proposalsOf(rows: readonly ProposalRow[]): Promise<Proposal[]> {
    const shown = await proposedPhotos.shown(rows.map((row) => row.entry));
    return rows.map((row, index) => toProposal(row, shown[index]!));
  }

  async function holdWaiting(id: number, trx: Knex): Promise<ProposalRow> {
    const proposal = await store.hold(id, trx);
    if (!proposal) throw new NotFound('There is no such proposal.', 'Read the list again.');
    if (proposal.state !== 'waiting')
      throw new AlreadyThere('This proposal is decided already.', 'Read the list again.');
    return proposal;
  }

  async function demandPart(partId: number | null, entry: Proposed): Promise<void> {
    if (entry.kind === 'part') {
      if (partId === null) return;
      throw new FieldNotValid('partId', 'does not go with a new part', 'Leave it out.');
    }
    if (partId === null || !(await catalogue.partIsThere(knex, partId)))
      throw new FieldNotValid('partId', 'is not a part of the catalogue', 'Choose the part from the list.');
  }
}

/** Writes the entry; the part it is on now. */
async function enter(
  trx: Knex,
  partId: number | null,
  entry: Proposed,
  photos: readonly NamedPhoto[],
): Promise<{ id: number; slug: string }> {
  if (entry.kind === 'part') {
    const makerId =
      (await catalogue.makerNamed(trx, entry.maker)) ?? (await catalogue.addMaker(trx, entry.maker));
    const part = await catalogue.addPart(trx, makerId, entry);
    if (part === 'already-there') throw inCatalogue(entry);
    return part;
  }
  const part = await catalogue.holdPart(trx, partId!);
  if (!part) throw new NotFound('The part is not in the catalogue any more.', 'Decline the proposal.');
  await demandNew(trx, part.id, entry);
  if (entry.kind === 'feature') {
    await catalogue.addFeature(trx, part.id, entry);
    return part;
  }
  const revision = await catalogue.addRevision(trx, part.id, entry);
  if (revision === 'already-there') throw inCatalogue(entry);
  await catalogue.addRevisionPhotos(trx, revision, photos);
  return part;
}

async function demandNew(db: Knex, partId: number | null, entry: Proposed): Promise<void> {
  const there =
    entry.kind === 'part'
      ? await catalogue.partNamed(db, entry.maker, entry.name)
      : entry.kind === 'revision'
        ? await catalogue.revisionLabelled(db, partId!, entry.label)
        : await catalogue.featureNamed(db, partId!, entry.name);
  if (there) throw inCatalogue(entry);
}

function inCatalogue(entry: Proposed): AlreadyThere {
  return new AlreadyThere(
    `${wordsOf(entry)} is in the catalogue already.`,
    'Look it up there; give it another name if it is another thing.',
  );
}

function personOf({ accountId, displayName }: ProposalRow): DeskProposal['person'] {
  return { id: accountId, displayName };
}

function toProposal(row: ProposalRow, photos: RevisionPhoto[]): Proposal {
  return {
    id: row.id,
    state: row.state,
    part: row.part,
    entry: row.entry,
    photos,
    createdAt: row.createdAt.toISOString(),
    reason: row.reason,
    decidedAt: row.decidedAt?.toISOString() ?? null,
  };
}
