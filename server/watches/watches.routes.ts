import { mailRoutes } from '../../shared/contract/mail.js';
import { noticeRoutes, watchRoutes } from '../../shared/contract/watches.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { MailChoiceService } from './mail-choices.service.js';
import type { NoticeService } from './notices.service.js';
import type { WatchService } from './watches.service.js';

export function watchBindings(parts: {
  watches: WatchService;
  notices: NoticeService;
  choices: MailChoiceService;
  turnNoticesOff: (token: string) => Promise<void>;
}): RouteBinding[] {
  const { watches, notices, choices, turnNoticesOff } = parts;
  return [
    bind(watchRoutes.watch, async ({ caller, params }) => {
      await watches.watch(memberOf(caller).accountId, params);
    }),
    bind(watchRoutes.endWatch, async ({ caller, params }) => {
      await watches.endWatch(memberOf(caller).accountId, params);
    }),
    bind(watchRoutes.listMyWatches, ({ caller, query }) => watches.list(memberOf(caller).accountId, query)),
    bind(watchRoutes.listMyWatchKeys, async ({ caller }) => ({
      keys: await watches.keys(memberOf(caller).accountId),
    })),
    bind(noticeRoutes.listMyNotices, ({ caller, query }) => notices.list(memberOf(caller).accountId, query)),
    bind(noticeRoutes.countMyNotices, async ({ caller }) => ({
      unread: await notices.countUnread(memberOf(caller).accountId),
    })),
    bind(noticeRoutes.markNoticesRead, async ({ caller, body }) => ({
      readAt: (await notices.markRead(memberOf(caller).accountId, body)).toISOString(),
    })),
    bind(noticeRoutes.markNoticesUnread, async ({ caller, body }) => {
      await notices.markUnread(memberOf(caller).accountId, new Date(body.readAt));
    }),
    bind(mailRoutes.readMailChoices, ({ query }) => choices.read(query.token, query.watch)),
    bind(mailRoutes.makeMailChoice, async ({ body }) => {
      if (body.choice === 'end-watch') await choices.endWatch(body.token, body.watch);
      else if (body.choice === 'weekly') await choices.weekly(body.token);
      else await turnNoticesOff(body.token);
    }),
  ];
}
