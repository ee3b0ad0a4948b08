import type { Knex } from 'knex';
import type { AskToSpeak, DeskMakerRequest, MakerRequest } from '../../shared/contract/makers.js';
import { hashOfToken, newMailedToken } from '../accounts/mailed-token.js';
import type { MakerRole } from '../accounts/maker-role.js';
import type { AuditLog } from '../audit/audit.js';
import { AlreadyThere, FieldNotValid, NotAllowed, NotFound, ProblemError } from '../http/problems.js';
import type { MakerMail } from '../mail/maker-mail.js';
import type { DeskClaims } from '../moderation/claims.js';
import { isOpen, makerRequestStore as requests, type MakerRequestRow } from './maker-request.store.js';
import { makerStore as makers, type MakerRow } from './maker.store.js';
import { domainOf, isPublicMailDomain } from './public-mail-domains.js';

const proofLife = 24 * 60 * 60 * 1000;

export interface SpeakingParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly mail: MakerMail;
  readonly audit: AuditLog;
  readonly makerRole: MakerRole;
  readonly claims: Pick<DeskClaims, 'demandFree'>;
}

export type SpeakingService = ReturnType<typeof createSpeakingService>;

/** Who speaks for a maker: asking, proving by mail, deciding, ending. */
export function createSpeakingService({ knex, clock, mail, audit, makerRole, claims }: SpeakingParts) {
  return {
    /** Mails the link or lays the request on the desk; one that waits for mail gives way to the new one. */
    async ask(accountId: number, slug: string, wish: AskToSpeak): Promise<MakerRequest> {
      const { id: makerId } = await demandMaker(slug);
      return knex.transaction(async (trx) => {
        const maker = (await makers.hold(trx, makerId))!;
        if (wish.how === 'mail') demandProvingAddress(wish.address, maker);
        if (await makers.speaks(trx, accountId, maker.id))
          throw new AlreadyThere(`You speak for ${maker.name} already.`, 'Open its page.');
        const before = await requests.latest(trx, accountId, maker.id);
        if (before?.state === 'waiting')
          throw new AlreadyThere(
            'Your request waits at the desk already.',
            'Wait for the desk, or take it back first.',
          );
        const at = clock();
        if (before?.state === 'waiting-for-mail')
          await requests.decide(trx, before.id, { state: 'ended', by: null, reason: 'Asked again.', at });
        const id = await requests.add(trx, {
          accountId,
          makerId: maker.id,
          how: wish.how,
          state: wish.how === 'mail' ? 'waiting-for-mail' : 'waiting',
          note: wish.how === 'mail' ? '' : wish.note,
          at,
        });
        const request = (await requests.byId(trx, id))!;
        if (wish.how === 'mail') await mailProof(trx, request, maker, wish.address);
        await note(trx, accountId, 'maker-request-made', request, maker);
        return toRequest(request);
      });
    },

    /** The link is good for the account that asked for it only: the mailbox alone grants nothing. */
    async prove(accountId: number, token: string): Promise<{ maker: MakerRow }> {
      return knex.transaction(async (trx) => {
        const proof = await requests.useProof(trx, hashOfToken(token), clock());
        const request = proof && (await requests.byId(trx, proof.requestId));
        const maker = request && (await makers.hold(trx, request.makerId));
        if (
          !maker ||
          request.accountId !== accountId ||
          request.state !== 'waiting-for-mail' ||
          domainOf(proof.address) !== maker.mailDomain
        )
          throw new ProblemError(
            'token-not-valid',
            422,
            'The link is used up, expired, not complete, or was mailed for another account.',
            'Sign in as the one who asked, or ask for a new link on the page of the maker.',
          );
        await grant(trx, request, maker, null, null);
        return { maker };
      });
    },

    /** Of their own will: what waits is taken back, what was granted ends. Nothing to end is no error. */
    async stop(accountId: number, slug: string): Promise<void> {
      const { id } = await demandMaker(slug);
      await knex.transaction(async (trx) => {
        const maker = (await makers.hold(trx, id))!;
        const request = await requests.latest(trx, accountId, maker.id);
        const spoke = await makers.removeSpeaker(trx, accountId, maker.id);
        const at = clock();
        if (request && (isOpen(request) || request.state === 'granted')) {
          await requests.decide(trx, request.id, { state: 'ended', by: accountId, reason: null, at });
          await note(trx, accountId, spoke ? 'speaking-stopped' : 'maker-request-taken-back', request, maker);
        }
        if (spoke) await takeRole(trx, accountId, accountId);
      });
    },

    async readRequest(id: number): Promise<DeskMakerRequest> {
      const request = await requests.byId(knex, id);
      if (!request) throw noSuchRequest();
      const [[maker], speakers] = await Promise.all([
        makers.byIds(knex, [request.makerId]),
        makers.speakers(knex, request.makerId),
      ]);
      const { slug, name, mailDomain } = maker!;
      return {
        ...toRequest(request),
        maker: { id: request.makerId, slug, name },
        person: { id: request.accountId, displayName: request.displayName },
        mailDomain,
        speakers: speakers.map(({ since: _, ...person }) => person),
      };
    },

    /** ClaimedByAnother while another moderator has it in hand. */
    async decide(
      id: number,
      moderatorId: number,
      { granted, reason }: { granted: boolean; reason: string },
    ): Promise<void> {
      const found = await requests.byId(knex, id);
      if (!found) throw noSuchRequest();
      if (found.accountId === moderatorId)
        throw new NotAllowed('Nobody decides their own request.', 'Ask another moderator.');
      await claims.demandFree({ kind: 'maker-request', id }, moderatorId);
      await knex.transaction(async (trx) => {
        const maker = (await makers.hold(trx, found.makerId))!;
        const request = (await requests.byId(trx, id))!;
        if (!isOpen(request)) throw new AlreadyThere('This request is decided already.', 'Read it again.');
        if (granted) return grant(trx, request, maker, moderatorId, reason);
        const decision = { state: 'declined', by: moderatorId, reason, at: clock() } as const;
        await requests.decide(trx, id, decision);
        await note(trx, moderatorId, 'maker-request-declined', request, maker, reason);
        await tellAsker(trx, request, maker, false, reason);
      });
    },

    /** A moderator ends that somebody speaks for a maker. NotFound where they do not. */
    async end(slug: string, moderatorId: number, accountId: number, reason: string): Promise<void> {
      const { id } = await demandMaker(slug);
      await knex.transaction(async (trx) => {
        const maker = (await makers.hold(trx, id))!;
        if (!(await makers.removeSpeaker(trx, accountId, maker.id)))
          throw new NotFound('They do not speak for this maker.', 'Read the page again.');
        await takeRole(trx, accountId, moderatorId);
        const request = await requests.latest(trx, accountId, maker.id);
        if (!request) return;
        await requests.decide(trx, request.id, { state: 'ended', by: moderatorId, reason, at: clock() });
        await note(trx, moderatorId, 'speaking-ended', request, maker, reason);
        await mail.queueSpeakingEnded(trx, {
          requestId: request.id,
          accountId,
          makerName: maker.name,
          makerSlug: maker.slug,
          reason,
        });
      });
    },

    async changeAddresses(
      slug: string,
      moderatorId: number,
      addresses: { mailDomain: string | null; contactAddress: string | null },
    ): Promise<void> {
      if (addresses.mailDomain !== null && isPublicMailDomain(addresses.mailDomain))
        throw new FieldNotValid(
          'mailDomain',
          'is one at which anybody can have an address',
          "Name the maker's own domain, or leave it empty and decide requests by hand.",
        );
      const maker = await demandMaker(slug);
      await knex.transaction(async (trx) => {
        await makers.setAddresses(trx, maker.id, addresses);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'maker-addresses-changed',
          subject: { kind: 'maker', id: maker.id, name: maker.name },
          details: {
            from: { mailDomain: maker.mailDomain, contactAddress: maker.contactAddress },
            to: addresses,
          },
        });
      });
    },
  };

  async function demandMaker(slug: string): Promise<MakerRow> {
    const maker = await makers.bySlug(knex, slug);
    if (!maker) throw new NotFound('There is no maker of that name.');
    return maker;
  }

  async function mailProof(
    trx: Knex.Transaction,
    request: MakerRequestRow,
    maker: MakerRow,
    address: string,
  ): Promise<void> {
    const at = clock();
    const { token, hash } = newMailedToken();
    const expiresAt = new Date(at.getTime() + proofLife);
    const proofId = await requests.addProof(trx, { requestId: request.id, address, hash, expiresAt, at });
    await mail.queueMakerProof(trx, {
      proofId,
      accountId: request.accountId,
      address,
      displayName: request.displayName,
      makerName: maker.name,
      token,
    });
  }

  async function grant(
    trx: Knex.Transaction,
    request: MakerRequestRow,
    maker: MakerRow,
    by: number | null,
    reason: string | null,
  ): Promise<void> {
    const at = clock();
    await requests.decide(trx, request.id, { state: 'granted', by, reason, at });
    await makers.addSpeaker(trx, request.accountId, maker.id, at);
    await makerRole.give(trx, request.accountId, by);
    await note(trx, by, 'maker-request-granted', request, maker, reason ?? 'Proved by mail.');
    await tellAsker(trx, request, maker, true, reason);
  }

  /** Only whoever speaks for no other maker stops being one. */
  async function takeRole(trx: Knex.Transaction, accountId: number, by: number): Promise<void> {
    if ((await makers.spokenFor(trx, accountId)).length === 0) await makerRole.take(trx, accountId, by);
  }

  async function tellAsker(
    trx: Knex,
    request: MakerRequestRow,
    maker: MakerRow,
    granted: boolean,
    reason: string | null,
  ): Promise<void> {
    await mail.queueMakerRequestDecided(trx, {
      requestId: request.id,
      accountId: request.accountId,
      makerName: maker.name,
      makerSlug: maker.slug,
      granted,
      reason,
    });
  }

  async function note(
    trx: Knex,
    actorId: number | null,
    action: string,
    request: MakerRequestRow,
    maker: MakerRow,
    reason = '',
  ): Promise<void> {
    await audit.note(trx, {
      actorId,
      action,
      subject: { kind: 'maker-request', id: request.id, name: `${request.displayName} for ${maker.name}` },
      reason,
    });
  }
}

/** FieldNotValid unless mail to the address proves that one belongs to the maker. */
function demandProvingAddress(address: string, maker: MakerRow): void {
  const remedy = 'Ask the desk instead.';
  if (maker.mailDomain === null)
    throw new FieldNotValid('address', `proves nothing: no mail domain of ${maker.name} is known`, remedy);
  const domain = domainOf(address);
  if (isPublicMailDomain(domain))
    throw new FieldNotValid('address', 'is at a domain where anybody can have one', remedy);
  if (domain !== maker.mailDomain)
    throw new FieldNotValid(
      'address',
      `is not at ${maker.mailDomain}`,
      `Name one that ends in @${maker.mailDomain}, or ask the desk instead.`,
    );
}

function noSuchRequest(): NotFound {
  return new NotFound('There is no such request.', 'Read the list again.');
}

export function toRequest(row: MakerRequestRow): MakerRequest {
  const { id, state, how, note, reason, createdAt, decidedAt } = row;
  return {
    id,
    state,
    how,
    note,
    reason,
    createdAt: createdAt.toISOString(),
    decidedAt: decidedAt?.toISOString() ?? null,
  };
}
