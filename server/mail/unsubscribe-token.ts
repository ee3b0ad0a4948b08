import { createHmac, timingSafeEqual } from 'node:crypto';

/**
 * Token of an unsubscribe link: account id and its HMAC-SHA-256. It never expires, for a mail may be read years
 * later, and is good for nothing but turning notices off.
 */
export function unsubscribeToken(secret: string, accountId: number): string {
  return `${accountId}.${signatureOf(secret, accountId).toString('base64url')}`;
}

/** The account a token was made for; undefined where it was not made with this secret. */
export function accountOfUnsubscribeToken(secret: string, token: string): number | undefined {
  const match = /^([1-9]\d{0,15})\.([A-Za-z0-9_-]{43})$/.exec(token);
  if (!match) return undefined;
  const accountId = Number(match[1]);
  const given = Buffer.from(match[2] ?? '', 'base64url');
  const expected = signatureOf(secret, accountId);
  return given.length === expected.length && timingSafeEqual(given, expected) ? accountId : undefined;
}

function signatureOf(secret: string, accountId: number): Buffer {
  return createHmac('sha256', secret).update(`unsubscribe:${accountId}`).digest();
}
