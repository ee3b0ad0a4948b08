import type { Role } from '../../shared/contract/vocabulary.js';

/** Who makes the request. */
export type Caller = { readonly role: 'visitor'; readonly accountId: null } | MemberCaller;

export interface MemberCaller {
  readonly role: Exclude<Role, 'visitor'>;
  readonly accountId: number;
}

export const visitor: Caller = { role: 'visitor', accountId: null };

export function isModerator(caller: Caller): boolean {
  return caller.role === 'moderator' || caller.role === 'administrator';
}
