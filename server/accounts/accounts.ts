import type { Strategy } from 'passport';
import type { RouteBinding } from '../http/binding.js';
import type { Csrf } from '../http/csrf.js';
import type { SessionAccount } from '../http/session.js';
import { bindAccountRoutes } from './accounts.routes.js';
import { createEntryService, type EntryDependencies } from './entry.service.js';
import { createLocalStrategy } from './local-strategy.js';
import { createPeopleService } from './people.service.js';

export interface Accounts {
  readonly bindings: RouteBinding[];
  readonly strategy: Strategy;
  findAccount(id: number): Promise<SessionAccount | undefined>;
}

export function createAccounts(needs: EntryDependencies & { csrf: Csrf }): Accounts {
  const entry = createEntryService(needs);
  const people = createPeopleService(needs);
  const strategy = createLocalStrategy(entry);
  return {
    bindings: bindAccountRoutes({ entry, people, strategy, csrf: needs.csrf }),
    strategy,
    findAccount: (id) => people.findAccount(id),
  };
}
