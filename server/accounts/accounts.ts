import type { AuditLog } from '../audit/audit.js';
import type { RouteBinding } from '../http/binding.js';
import type { Csrf } from '../http/csrf.js';
import { createAuthenticator, type Authenticator } from '../http/session.js';
import { bindAccountRoutes } from './accounts.routes.js';
import { createEntryService, type EntryDependencies } from './entry.service.js';
import { createLeaving, type Leaving } from './leaving.js';
import { createLocalStrategy } from './local-strategy.js';
import { createMakerRole, type MakerRole } from './maker-role.js';
import { createPeopleService } from './people.service.js';

export interface Accounts {
  readonly bindings: RouteBinding[];
  /** Knows who a request comes from; sessions are built on it. */
  readonly authenticator: Authenticator;
  readonly makerRole: MakerRole;
  readonly leaving: Leaving;
}

export function createAccounts(needs: EntryDependencies & { csrf: Csrf; audit: AuditLog }): Accounts {
  const entry = createEntryService(needs);
  const people = createPeopleService(needs);
  const authenticator = createAuthenticator({
    strategy: createLocalStrategy(entry),
    findAccount: (id) => people.findAccount(id),
  });
  return {
    bindings: bindAccountRoutes({ entry, people, authenticator, csrf: needs.csrf }),
    authenticator,
    makerRole: createMakerRole(needs),
    leaving: createLeaving(),
  };
}
