import { randomUUID } from 'node:crypto';
import { CookieAccessInfo } from 'cookiejar';
import type { Knex } from 'knex';
import request from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { hashPassword } from '../../../server/accounts/password.js';
import type { AccountRole } from '../../../shared/contract/vocabulary.js';

/** Keeps cookies and, as a browser's page would, sends the X-XSRF-TOKEN header with every change. */
export type Agent = TestAgent;

export interface TestAccount {
  readonly id: number;
  readonly email: string;
  readonly password: string;
  readonly displayName: string;
  readonly role: AccountRole;
}

/** An agent that is signed in. */
export type MemberAgent = Agent & { readonly account: TestAccount };

const password = 'a long enough password';
let passwordHash: Promise<string> | undefined;

/** What a first visit leaves in a browser, as `name=value`. */
export async function cookiesOfFirstVisit(url: string): Promise<string[]> {
  const answer = await fetch(`${url}/api/account/session`);
  return answer.headers.getSetCookie().map((cookie) => cookie.split(';')[0] ?? '');
}

/** A browser that has opened the site once, whose cookies are `cookies` (`name=value`). */
export function openAgent(url: string, cookies: readonly string[]): Agent {
  const agent = request.agent(url);
  const { hostname } = new URL(url);
  agent.jar.setCookies(
    cookies.map((cookie) => `${cookie}; path=/`),
    hostname,
    '/',
  );
  for (const method of ['post', 'put', 'patch', 'delete'] as const) {
    const send = agent[method].bind(agent);
    agent[method] = (...given) => {
      const token = agent.jar.getCookie(
        'XSRF-TOKEN',
        new CookieAccessInfo(hostname, '/', false, false),
      )?.value;
      const test = send(...given);
      return token ? test.set('X-XSRF-TOKEN', decodeURIComponent(token)) : test;
    };
  }
  return agent;
}

/** Puts a confirmed account straight into the database. */
export async function insertAccount(
  knex: Knex,
  role: AccountRole,
  displayName: string,
  now: Date,
): Promise<TestAccount> {
  passwordHash ??= hashPassword(password);
  const email = `${role}-${randomUUID()}@members.example`;
  const [id] = (await knex('accounts').insert({
    email,
    display_name: displayName,
    role,
    password_hash: await passwordHash,
    confirmed_at: now,
    created_at: now,
  })) as [number];
  return { id, email, password, displayName, role };
}

/** Signs `agent` in through the route that everybody signs in by. */
export async function signIn(agent: Agent, account: TestAccount): Promise<MemberAgent> {
  const answer = await agent
    .post('/api/account/sign-in')
    .send({ email: account.email, password: account.password });
  if (answer.status !== 200) throw new Error(`Signing in was answered ${answer.status}: ${answer.text}`);
  return Object.assign(agent, { account });
}
