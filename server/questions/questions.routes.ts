import { questionRoutes as routes } from '../../shared/contract/questions.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { QuestionService } from './questions.service.js';

export function questionBindings(questions: QuestionService, limits: RateLimits): RouteBinding[] {
  return [
    bind(routes.listQuestions, ({ query }) => questions.list(query)),
    bind(routes.readQuestion, ({ params, caller }) => questions.read(params.slug, caller)),
    bind(routes.askQuestion, async ({ caller, body }) => {
      const member = memberOf(caller);
      await limits.take('question', String(member.accountId));
      return questions.ask(member, body);
    }),
    bind(routes.addReply, async ({ params, caller, body }) => {
      const member = memberOf(caller);
      await limits.take('reply', String(member.accountId));
      return questions.reply(params.slug, member, body);
    }),
    bind(routes.settleQuestion, ({ params, caller, body }) =>
      questions.settle(params.slug, memberOf(caller), body),
    ),
    bind(routes.reopenQuestion, ({ params, caller }) => questions.reopen(params.slug, memberOf(caller))),
  ];
}
