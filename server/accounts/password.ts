import { randomBytes } from 'node:crypto';
import { hash, verify } from '@node-rs/argon2';

/**
 * Argon2id with 19 MiB, two passes, one lane: OWASP Password Storage Cheat Sheet, section "Argon2id". Argon2id is
 * what the library takes when no other algorithm is named.
 */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Hash of a password in the PHC string format, with its own salt. */
export function hashPassword(plain: string): Promise<string> {
  return hash(plain, cost);
}

let standIn: Promise<string> | undefined;

/**
 * Whether the password belongs to the hash. Without a hash (no such account) it takes as long as with one and is
 * false, so that the time of an answer does not tell which addresses are known.
 */
export async function passwordMatches(plain: string, passwordHash: string | undefined): Promise<boolean> {
  standIn ??= hashPassword(randomBytes(32).toString('hex'));
  const matches = await verify(passwordHash ?? (await standIn), plain);
  return matches && passwordHash !== undefined;
}
