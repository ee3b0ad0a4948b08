import { afterAll, beforeAll, expect, it } from 'vitest';
import { startTestApp, type TestApp } from './support/app.js';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ rateLimits: true });
});
afterAll(() => app.close());

it('after ten wrong passwords the right one has to wait too, and the answer says how long', async () => {
  const { email, password } = (await app.as('member')).account;
  const agent = app.visitor();
  for (let round = 0; round < 10; round += 1) {
    await agent.post('/api/account/sign-in').send({ email, password: 'wrong' }).expect(401);
  }
  const refused = await agent.post('/api/account/sign-in').send({ email, password });
  expect([refused.status, refused.body.type]).toEqual([429, '/problems/too-many-requests']);
  expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
  expect(refused.body.remedy).toContain('seconds');
});

it('signing in rightly counts as no try', async () => {
  const { email, password } = (await app.as('member')).account;
  for (let round = 0; round < 12; round += 1) {
    await app.visitor().post('/api/account/sign-in').send({ email, password }).expect(200);
  }
});

it('one address can be sent only so many mails, known or not', async () => {
  const email = 'flooded@members.example';
  const statuses: number[] = [];
  for (let round = 0; round < 6; round += 1) {
    statuses.push((await app.visitor().post('/api/account/request-password-reset').send({ email })).status);
  }
  expect(statuses).toEqual([202, 202, 202, 202, 202, 429]);
});
