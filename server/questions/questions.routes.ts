import { questionRoutes as routes } from '../../shared/contract/questions.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { QuestionService } from './questions.service.js';

export function questionBindings(questions: QuestionService, limits: RateLimits): RouteBinding[] {
  return [
    bind(routes.listQuestions, ({ query }) => questions.list(query)),
    bind(routes.readQuestion, ({ params }) => questions.read(params.slug)),
    bind(routes.askQuestion, async ({ caller, body }) => {
      const { accountId } = memberOf(caller);
      await limits.take('question', String(accountId));
      return questions.ask(accountId, body);
    }),
    bind(routes.addReply, async ({ params, caller, body }) => {
      const { accountId } = memberOf(caller);
      await limits.take('reply', String(accountId));
      return questions.reply(params.slug, accountId, body);
    }),
    bind(routes.settleQuestion, ({ params, caller, body }) =>
      questions.settle(params.slug, memberOf(caller).accountId, body),
    ),
    bind(routes.reopenQuestion, ({ params, caller }) =>
      questions.reopen(params.slug, memberOf(caller).accountId),
    ),
  ];
}
