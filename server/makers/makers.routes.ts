import { makerRoutes as routes } from '../../shared/contract/makers.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { AnswerService } from './answers.service.js';
import type { CorrectingService } from './correcting.service.js';
import type { MakerPageService } from './maker-page.service.js';
import type { SpeakingService } from './speaking.service.js';
import type { TellingService } from './telling.service.js';

export interface MakerServices {
  readonly pages: MakerPageService;
  readonly speaking: SpeakingService;
  readonly answers: AnswerService;
  readonly correcting: CorrectingService;
  readonly telling: TellingService;
}

export function makerBindings(services: MakerServices, limits: RateLimits): RouteBinding[] {
  const { pages, speaking } = services;
  return [
    bind(routes.readMaker, ({ caller, params }) => pages.read(caller, params.slug)),
    bind(routes.askToSpeak, async ({ caller, params, body }) => {
      const { accountId } = memberOf(caller);
      await limits.take('maker-request', String(accountId));
      if (body.how === 'mail') await limits.take('account-mail', body.address);
      return speaking.ask(accountId, params.slug, body);
    }),
    bind(routes.proveByMail, async ({ caller, body, request }) => {
      await limits.take('token', request.ip ?? '');
      const { maker } = await speaking.prove(memberOf(caller).accountId, body.token);
      return { maker: { id: maker.id, slug: maker.slug, name: maker.name } };
    }),
    bind(routes.stopSpeaking, ({ caller, params }) => speaking.stop(memberOf(caller).accountId, params.slug)),
    bind(routes.readMakerRequest, ({ params }) => speaking.readRequest(params.id)),
    bind(routes.decideMakerRequest, ({ caller, params, body }) =>
      speaking.decide(params.id, memberOf(caller).accountId, body),
    ),
    bind(routes.endSpeaking, ({ caller, params, body }) =>
      speaking.end(params.slug, memberOf(caller).accountId, body.accountId, body.reason),
    ),
    bind(routes.changeMakerAddresses, ({ caller, params, body }) =>
      speaking.changeAddresses(params.slug, memberOf(caller).accountId, body),
    ),
    ...writeUpBindings(services, limits),
    ...revisionBindings(services, limits),
  ];
}

/** What makers say on a write-up, and telling them of it. */
function writeUpBindings(services: MakerServices, limits: RateLimits): RouteBinding[] {
  const { answers, correcting, telling } = services;
  return [
    bind(routes.readMakerSide, ({ caller, params }) => answers.readSide(caller, params.slug)),
    bind(routes.putMakerAnswer, async ({ caller, params, body }) => {
      const member = memberOf(caller);
      await limits.take('maker-word', String(member.accountId));
      return answers.put(member, params.slug, params.maker, body.text);
    }),
    bind(routes.takeBackMakerAnswer, ({ caller, params, body }) =>
      answers.takeBack(memberOf(caller), params.slug, params.maker, body.reason),
    ),
    bind(routes.markMadeRight, ({ caller, params, body }) =>
      correcting.markMadeRight(memberOf(caller), params.slug, body),
    ),
    bind(routes.unmarkMadeRight, ({ caller, params, body }) =>
      correcting.unmarkMadeRight(memberOf(caller), params.slug, body.fixKeys),
    ),
    bind(routes.readMakerLetter, ({ caller, params }) =>
      telling.preview(memberOf(caller), params.slug, params.maker),
    ),
    bind(routes.sendMakerLetter, ({ caller, params, body }) =>
      telling.send(memberOf(caller), params.slug, params.maker, body.note),
    ),
  ];
}

function revisionBindings({ correcting }: MakerServices, limits: RateLimits): RouteBinding[] {
  return [
    bind(routes.announceRevision, async ({ caller, params, body }) => {
      const member = memberOf(caller);
      await limits.take('maker-word', String(member.accountId));
      return correcting.announce(member, params.slug, body);
    }),
    bind(routes.changeAnnounced, ({ caller, params, body }) =>
      correcting.changeAnnounced(memberOf(caller), params.id, body),
    ),
    bind(routes.sellRevision, ({ caller, params, body }) =>
      correcting.sell(memberOf(caller), params.id, body.soldFrom),
    ),
    bind(routes.withdrawAnnounced, ({ caller, params }) => correcting.withdraw(memberOf(caller), params.id)),
    bind(routes.listWantedReadings, async ({ params }) => ({
      items: await correcting.wantedReadings(params.slug),
    })),
  ];
}
