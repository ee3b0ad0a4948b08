import type { Knex } from 'knex';
import type { MakerPage } from '../../shared/contract/makers.js';
import type { HardwareService } from '../hardware/hardware.js';
import { isModerator, type Caller } from '../http/caller.js';
import { NotFound } from '../http/problems.js';
import { makerPageStore as pages } from './maker-page.store.js';
import { makerRequestStore as requests } from './maker-request.store.js';
import { makerStore as makers } from './maker.store.js';
import { toRequest } from './speaking.service.js';

export type MakerPageService = ReturnType<typeof createMakerPageService>;

/** The maker's own page. */
export function createMakerPageService({ knex, hardware }: { knex: Knex; hardware: HardwareService }) {
  return {
    async read(caller: Caller, slug: string): Promise<MakerPage> {
      const maker = await makers.bySlug(knex, slug);
      if (!maker) throw new NotFound('There is no maker of that name.');
      const { accountId } = caller;
      const [partIds, announced, speakers, answers, madeRight, myRequest] = await Promise.all([
        pages.partIds(knex, maker.id),
        pages.announced(knex, maker.id),
        makers.speakers(knex, maker.id),
        pages.answers(knex, maker.id),
        pages.madeRight(knex, maker.id),
        accountId === null ? undefined : requests.latest(knex, accountId, maker.id),
      ]);
      const parts = await hardware.summariesByIds(partIds);
      return {
        id: maker.id,
        slug: maker.slug,
        name: maker.name,
        about: maker.about,
        mailDomain: maker.mailDomain,
        parts: partIds.flatMap((id) => parts.get(id) ?? []),
        speakers: speakers.map((person) => ({ ...person, since: person.since.toISOString() })),
        answers: answers.map((answer) => ({ ...answer, changedAt: answer.changedAt.toISOString() })),
        announced,
        madeRight,
        iSpeak: speakers.some(({ id }) => id === accountId),
        myRequest: myRequest ? toRequest(myRequest) : null,
        contactAddress: isModerator(caller) ? maker.contactAddress : null,
      };
    },
  };
}
