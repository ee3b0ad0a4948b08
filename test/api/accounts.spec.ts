import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fromJson } from '../../server/rows.js';
import { startTestApp, type TestApp } from './support/app.js';

const password = 'seventeen brass shims';
const hour = 60 * 60 * 1000;

let app: TestApp;
let timeShift = 0;

beforeAll(async () => {
  app = await startTestApp({ clock: () => new Date(Date.now() + timeShift) });
});
afterAll(() => app.close());

let last = 0;
const newAddress = (): string => `person-${process.pid}-${Date.now()}-${(last += 1)}@members.example`;

async function signUp(email: string, displayName = 'Ada Winder', wish = password) {
  return app.visitor().post('/api/account/sign-up').send({ email, displayName, password: wish });
}

async function confirmedMember(): Promise<string> {
  const email = newAddress();
  await signUp(email);
  await app
    .visitor()
    .post('/api/account/confirm-email')
    .send({ token: await app.mailbox.tokenFor(email) })
    .expect(200);
  return email;
}

const signIn = (email: string, wish = password) => {
  const agent = app.visitor();
  return { agent, answer: agent.post('/api/account/sign-in').send({ email, password: wish }) };
};

describe('the life of an account', () => {
  it('goes from sign-up over the mailed link to a session, and ends the session at sign-out', async () => {
    const email = newAddress();
    expect((await signUp(email)).body).toEqual({ mailed: true });

    const agent = app.visitor();
    const token = await app.mailbox.tokenFor(email);
    const confirmed = await agent.post('/api/account/confirm-email').send({ token });
    expect(confirmed.status).toBe(200);
    expect(confirmed.body.account).toMatchObject({
      email,
      displayName: 'Ada Winder',
      role: 'member',
      noticeMail: true,
      units: 'mm',
    });
    expect((await agent.get('/api/account/session')).body.account.email).toBe(email);

    expect((await agent.post('/api/account/sign-out')).status).toBe(204);
    expect((await agent.get('/api/account/session')).body).toEqual({ account: null });
    expect((await agent.get('/api/bench')).status).toBe(401);
  });

  it('keeps a password only as an argon2id hash with the strength asked for', async () => {
    const email = newAddress();
    await signUp(email);
    const row = await app.knex('accounts').where({ email }).first<{ password_hash: string }>();
    expect(row.password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  it('keeps a mailed token only as its SHA-256', async () => {
    const email = newAddress();
    await signUp(email);
    const token = await app.mailbox.tokenFor(email);
    const { id } = await app.knex('accounts').where({ email }).first<{ id: number }>();
    const rows = await app.knex('account_tokens').where({ account_id: id });
    expect(rows).toHaveLength(1);
    expect((rows[0].token_hash as Buffer).length).toBe(32);
    expect(JSON.stringify(rows)).not.toContain(token);
  });

  it('signs nobody in before the address is confirmed, and says so only to who knows the password', async () => {
    const email = newAddress();
    await signUp(email);
    const right = await signIn(email).answer;
    expect([right.status, right.body.type]).toEqual([403, '/problems/email-not-confirmed']);
    const wrong = await signIn(email, 'not the right password').answer;
    expect([wrong.status, wrong.body.type]).toEqual([401, '/problems/sign-in-refused']);
  });

  it('answers a wrong password and an unknown address with the same words', async () => {
    const email = await confirmedMember();
    const wrong = await signIn(email, 'not the right password').answer;
    const unknown = await signIn(newAddress(), 'not the right password').answer;
    expect(wrong.status).toBe(401);
    expect({ ...wrong.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' });
  });

  it('takes the address in any letter case, with white space around it', async () => {
    const email = await confirmedMember();
    const { answer } = signIn(`  ${email.toUpperCase()} `);
    expect((await answer).body.account?.email).toBe(email);
  });
});

describe('a sign-up for an address that has an account', () => {
  it('gets the same answer, and the owner a mail that says so', async () => {
    const email = await confirmedMember();
    const before = (await app.mailbox.list(email)).length;
    const known = await signUp(email, 'Somebody Else', 'another long password');
    const fresh = await signUp(newAddress());
    expect([known.status, known.body]).toEqual([fresh.status, fresh.body]);

    const [mail] = await app.mailbox.waitFor(email, before + 1);
    expect(mail?.subject).toBe('You already have an account');
    expect(mail?.text).not.toContain('token=');
    expect((await signIn(email).answer).status).toBe(200);
    expect((await signIn(email, 'another long password').answer).status).toBe(401);
  });

  it('stays apart from one that was never confirmed: name and password are those of the mail that is followed', async () => {
    const email = newAddress();
    await signUp(email, 'Rightful Owner', password);
    const ownersToken = await app.mailbox.tokenFor(email);
    await signUp(email, 'Late Comer', 'password of a stranger');
    const strangersToken = await app.mailbox.waitFor(email, 2).then(() => app.mailbox.tokenFor(email));

    const confirmed = await app.visitor().post('/api/account/confirm-email').send({ token: ownersToken });

    expect(confirmed.body.account.displayName).toBe('Rightful Owner');
    expect((await signIn(email).answer).status).toBe(200);
    expect((await signIn(email, 'password of a stranger').answer).status).toBe(401);
    const late = await app.visitor().post('/api/account/confirm-email').send({ token: strangersToken });
    expect([late.status, late.body.type]).toEqual([422, '/problems/token-not-valid']);
  });

  it('reserves nothing: whoever follows their own mail has their own name and password', async () => {
    const email = newAddress();
    await signUp(email, 'First Comer', 'password of a stranger');
    await app.mailbox.waitFor(email, 1);
    await signUp(email, 'Rightful Owner', password);
    const [mail] = await app.mailbox.waitFor(email, 2);
    expect(mail?.text).toContain('Hello Rightful Owner');
    const token = await app.mailbox.tokenFor(email);

    const confirmed = await app.visitor().post('/api/account/confirm-email').send({ token });

    expect(confirmed.body.account.displayName).toBe('Rightful Owner');
    expect((await signIn(email, 'password of a stranger').answer).status).toBe(401);
  });

  it('makes one account when the same sign-up comes many times at once', async () => {
    const email = newAddress();
    const answers = await Promise.all(Array.from({ length: 6 }, () => signUp(email)));
    expect(answers.map((answer) => answer.status)).toEqual(Array(6).fill(202));
    expect(await app.knex('accounts').where({ email })).toHaveLength(1);
  });
});

describe('a mailed link', () => {
  it('confirms once and not again', async () => {
    const email = newAddress();
    await signUp(email);
    const token = await app.mailbox.tokenFor(email);
    await app.visitor().post('/api/account/confirm-email').send({ token }).expect(200);
    const again = await app.visitor().post('/api/account/confirm-email').send({ token });
    expect(again.body.type).toBe('/problems/token-not-valid');
    expect(again.body.remedy).toBeTruthy();
  });

  it('confirms nothing after a day', async () => {
    const email = newAddress();
    await signUp(email);
    const token = await app.mailbox.tokenFor(email);
    timeShift += 24 * hour + 1000;
    const late = await app.visitor().post('/api/account/confirm-email').send({ token });
    expect(late.body.type).toBe('/problems/token-not-valid');
  });

  it('can be asked for again while the address is not confirmed; the answer never tells', async () => {
    const email = newAddress();
    await signUp(email);
    await app.mailbox.waitFor(email, 1);
    const again = await app.visitor().post('/api/account/resend-confirmation').send({ email });
    const unknown = await app
      .visitor()
      .post('/api/account/resend-confirmation')
      .send({ email: newAddress() });
    expect([again.status, again.body]).toEqual([unknown.status, unknown.body]);
    await app.mailbox.waitFor(email, 2);
    await app
      .visitor()
      .post('/api/account/confirm-email')
      .send({ token: await app.mailbox.tokenFor(email) })
      .expect(200);
  });

  it('that confirms an address does not set a password', async () => {
    const email = newAddress();
    await signUp(email);
    const token = await app.mailbox.tokenFor(email);
    const reset = await app.visitor().post('/api/account/reset-password').send({ token, password });
    expect(reset.body.type).toBe('/problems/token-not-valid');
  });
});

describe('a lost password', () => {
  const askForReset = async (email: string): Promise<string> => {
    const before = (await app.mailbox.list(email)).length;
    await app.visitor().post('/api/account/request-password-reset').send({ email }).expect(202);
    await app.mailbox.waitFor(email, before + 1);
    return app.mailbox.tokenFor(email);
  };

  it('is set anew by the mailed link, which ends every session', async () => {
    const email = await confirmedMember();
    const { agent, answer } = signIn(email);
    await answer;
    const token = await askForReset(email);
    await app
      .visitor()
      .post('/api/account/reset-password')
      .send({ token, password: 'a fresh long password' })
      .expect(204);

    expect((await agent.get('/api/account/session')).body).toEqual({ account: null });
    expect((await signIn(email).answer).status).toBe(401);
    expect((await signIn(email, 'a fresh long password').answer).status).toBe(200);
    const again = await app.visitor().post('/api/account/reset-password').send({ token, password });
    expect(again.body.type).toBe('/problems/token-not-valid');
  });

  it('stays as it is when the link is older than an hour', async () => {
    const email = await confirmedMember();
    const token = await askForReset(email);
    timeShift += hour + 1000;
    const late = await app
      .visitor()
      .post('/api/account/reset-password')
      .send({ token, password: 'a fresh long password' });
    expect(late.body.type).toBe('/problems/token-not-valid');
    expect((await signIn(email).answer).status).toBe(200);
  });

  it('of an unknown address is answered like that of a known one, and no mail goes out', async () => {
    const email = newAddress();
    const answer = await app.visitor().post('/api/account/request-password-reset').send({ email });
    expect([answer.status, answer.body]).toEqual([202, { mailed: true }]);
    expect(await app.knex('mail_outbox').where({ to_address: email })).toEqual([]);
  });
});

describe('a session', () => {
  it('gets a new id at sign-in and a token for changes that goes with it', async () => {
    const email = await confirmedMember();
    const { agent, answer } = signIn(email);
    const first = (await answer).headers['set-cookie'] as unknown as string[];
    const second = (await agent.post('/api/account/sign-in').send({ email, password })).headers[
      'set-cookie'
    ] as unknown as string[];
    const idIn = (cookies: string[]) => cookies.find((cookie) => cookie.startsWith('shimlore.sid='));
    expect(idIn(first)).toMatch(/HttpOnly/);
    expect(idIn(first)).toMatch(/SameSite=Lax/);
    expect(idIn(second)).not.toBe(idIn(first));
    expect(second.some((cookie) => cookie.startsWith('XSRF-TOKEN='))).toBe(true);
    expect((await agent.patch('/api/account/profile').send({ units: 'in' })).status).toBe(200);
  });

  it('is not made for visitors', async () => {
    const answer = await fetch(`${app.url}/api/account/session`);
    expect(answer.headers.getSetCookie().map((cookie) => cookie.split('=')[0])).toEqual(['XSRF-TOKEN']);
  });

  it('takes no change without the token of a page, nor with that of a visitor', async () => {
    const email = await confirmedMember();
    const { agent, answer } = signIn(email);
    await answer;
    const without = await agent.patch('/api/account/profile').set('X-XSRF-TOKEN', '').send({ units: 'in' });
    expect([without.status, without.body.type]).toEqual([403, '/problems/csrf-token-missing']);

    const visitors = (await fetch(`${app.url}/api/account/session`)).headers
      .getSetCookie()[0]!
      .split(';')[0]!
      .split('=')[1]!;
    const sid = ((await agent.get('/api/account/session')).headers['set-cookie'] as unknown as string[])
      .find((cookie) => cookie.startsWith('shimlore.sid='))!
      .split(';')[0];
    const borrowed = await fetch(`${app.url}/api/account/profile`, {
      method: 'PATCH',
      headers: {
        'content-type': 'application/json',
        cookie: `${sid}; XSRF-TOKEN=${visitors}`,
        'x-xsrf-token': visitors,
      },
      body: '{"units":"in"}',
    });
    expect(borrowed.status).toBe(403);
  });

  it('acts on a changed role at once', async () => {
    const member = await app.as('member');
    const administrator = await app.as('administrator');
    expect((await member.get('/api/admin/accounts')).status).toBe(403);
    await administrator
      .patch(`/api/admin/accounts/${member.account.id}`)
      .send({ role: 'administrator' })
      .expect(200);
    expect((await member.get('/api/admin/accounts')).status).toBe(200);
  });
});

describe('a profile', () => {
  it('changes what is sent and leaves the rest', async () => {
    const member = await app.memberNamed('Old Name');
    const changed = await member
      .patch('/api/account/profile')
      .send({ displayName: ' New Name ', noticeMail: false });
    expect(changed.body.account).toMatchObject({
      displayName: 'New Name',
      noticeMail: false,
      units: 'mm',
      email: member.account.email,
    });
    expect((await member.patch('/api/account/profile').send({})).body).toEqual(changed.body);
  });

  it('names each field that cannot be taken, with what to do', async () => {
    const member = await app.as('member');
    const answer = await member
      .patch('/api/account/profile')
      .send({ displayName: 'x', units: 'cubits', role: 'administrator' });
    expect(answer.status).toBe(422);
    expect(answer.body.fields.map((field: { path: string }) => field.path).sort()).toEqual([
      'displayName',
      'role',
      'units',
    ]);
    expect(answer.body.remedy).toBeTruthy();
  });
});

describe('the administrator’s list of accounts', () => {
  it('goes page by page from the newest, each account once', async () => {
    const administrator = await app.as('administrator');
    await Promise.all([1, 2, 3, 4].map((number) => app.memberNamed(`Paged ${number}`)));
    const seen: number[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: { body: { items: { id: number }[]; next: string | null } } = await administrator
        .get('/api/admin/accounts')
        .query({ limit: 3, ...(cursor ? { cursor } : {}) });
      seen.push(...page.body.items.map((account) => account.id));
      cursor = page.body.next;
    }
    expect(seen).toEqual([...new Set(seen)].sort((a, b) => b - a));
    const { count } = await app.knex('accounts').first<{ count: number }>(app.knex.raw('COUNT(*) AS count'));
    expect(seen).toHaveLength(count);
  });

  it('finds words in names and addresses, taking wildcards as they are written', async () => {
    const administrator = await app.as('administrator');
    const wanted = await app.memberNamed('Hundred % Brass_Shim');
    await app.memberNamed('Hundred x Brass Shim');
    const names = async (q: string): Promise<string[]> =>
      (await administrator.get('/api/admin/accounts').query({ q })).body.items.map(
        (account: { displayName: string }) => account.displayName,
      );
    expect(await names('d % brass_')).toEqual(['Hundred % Brass_Shim']);
    expect(await names(wanted.account.email.slice(0, 30))).toEqual(['Hundred % Brass_Shim']);
    expect(await names('\\')).toEqual([]);
  });

  it('refuses a place that is not in the list', async () => {
    const administrator = await app.as('administrator');
    const answer = await administrator.get('/api/admin/accounts').query({ cursor: 'bm90aGluZw' });
    expect(answer.status).toBe(422);
    expect(answer.body.fields[0].path).toBe('cursor');
  });
});

describe('a change of role', () => {
  it('is kept with who made it', async () => {
    const administrator = await app.as('administrator');
    const member = await app.as('member');
    const changed = await administrator
      .patch(`/api/admin/accounts/${member.account.id}`)
      .send({ role: 'maker' });
    expect(changed.body).toMatchObject({ id: member.account.id, role: 'maker', confirmed: true });
    await administrator.patch(`/api/admin/accounts/${member.account.id}`).send({ role: 'maker' }).expect(200);
    const rows = await app
      .knex('audit_log')
      .where({ subject_kind: 'account', subject_id: member.account.id });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ action: 'role-changed', actor_id: administrator.account.id });
    expect(fromJson(rows[0].details)).toEqual({ from: 'member', to: 'maker' });
  });

  it('is refused for one’s own account', async () => {
    const administrator = await app.as('administrator');
    const answer = await administrator
      .patch(`/api/admin/accounts/${administrator.account.id}`)
      .send({ role: 'member' });
    expect([answer.status, answer.body.type]).toEqual([403, '/problems/not-allowed']);
    expect((await administrator.get('/api/admin/accounts')).status).toBe(200);
  });

  it('of an account that is not there is not found', async () => {
    const administrator = await app.as('administrator');
    expect((await administrator.patch('/api/admin/accounts/999999999').send({ role: 'maker' })).status).toBe(
      404,
    );
  });
});
