import { questionRoutes as routes } from '../../shared/contract/questions.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { QuestionService } from './questions.service.js';
import type { ReplyService } from './replies.service.js';
import type { SettlingService } from './settling.service.js';

export function questionBindings(
  questions: QuestionService,
  replies: ReplyService,
  settling: SettlingService,
  limits: RateLimits,
): RouteBinding[] {
  return [
    bind(routes.listQuestions, ({ query }) => questions.list(query)),
    bind(routes.listAlike, ({ query }) => questions.listAlike(query)),
    bind(routes.listCovered, ({ params }) => questions.listCovered(params.slug)),
    bind(routes.readQuestion, ({ params, caller }) => questions.read(params.slug, caller)),
    bind(routes.askQuestion, async ({ caller, body }) => {
      const member = memberOf(caller);
      await limits.take('question', String(member.accountId));
      return questions.ask(member, body);
    }),
    bind(routes.changeQuestion, ({ params, caller, body }) =>
      questions.change(params.slug, memberOf(caller), body),
    ),
    bind(routes.addReply, async ({ params, caller, body }) => {
      const member = memberOf(caller);
      await limits.take('reply', String(member.accountId));
      return replies.reply(params.slug, member, body);
    }),
    bind(routes.changeReply, ({ params, caller, body }) =>
      replies.changeReply(params.id, memberOf(caller), body.text),
    ),
    bind(routes.draftFromReply, ({ params, caller }) => replies.draft(params.id, memberOf(caller))),
    bind(routes.settleQuestion, ({ params, caller, body }) =>
      settling.settle(params.slug, memberOf(caller), body),
    ),
    bind(routes.reopenQuestion, ({ params, caller }) => settling.reopen(params.slug, memberOf(caller))),
  ];
}
