import { createHash, timingSafeEqual } from 'node:crypto';
import express, { type Request, type RequestHandler } from 'express';
import { mailRoutes } from '../../shared/contract/mail.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { ProblemError } from '../http/problems.js';
import type { Bounces } from './bounces.js';
import { readDeliveryReport } from './delivery-report.js';
import type { ReturnPath } from './return-path.js';

/** A report quotes at most the mail it is on. */
const largestReport = '512kb';

/**
 * Where the mail server hands in what comes back to the return path. Two proofs are asked for: the secret of the hook,
 * which the mail server has, and the signature in the address the report came to, which no sender can make up.
 */
export function bindBounceIntake(parts: {
  secret: string | undefined;
  returnPath: ReturnPath | undefined;
  bounces: Bounces;
}): RouteBinding {
  const { secret, returnPath, bounces } = parts;
  return bind(
    mailRoutes.takeBounce,
    async ({ request }) => {
      const { to, failure } = await readDeliveryReport(bodyOf(request));
      const mailId = to.map((address) => returnPath?.mailOf(address)).find((id) => id !== undefined);
      if (mailId === undefined)
        throw new ProblemError(
          'token-not-valid',
          422,
          'The report did not come to an address that this site has signed.',
          'Hand in the message as it came, with the header that names its recipient.',
        );
      if (failure) await bounces.record(mailId, failure);
    },
    demandSecret(secret),
    express.raw({ type: 'message/rfc822', limit: largestReport }),
  );
}

function demandSecret(secret: string | undefined): RequestHandler {
  return (request, _response, next) => {
    const given = /^Bearer (.+)$/.exec(request.get('authorization') ?? '')?.[1];
    if (secret === undefined || given === undefined || !timingSafeEqual(hashOf(given), hashOf(secret)))
      throw new ProblemError(
        'token-not-valid',
        422,
        'The secret of this hook is missing or not right.',
        'Send “Authorization: Bearer” with what BOUNCE_SECRET is set to.',
      );
    next();
  };
}

function hashOf(text: string): Buffer {
  return createHash('sha256').update(text).digest();
}

function bodyOf(request: Request): Buffer {
  const body: unknown = request.body;
  if (!Buffer.isBuffer(body) || body.length === 0)
    throw new ProblemError(
      'media-type-not-taken',
      415,
      'This address takes whole messages only.',
      'Send the message with Content-Type: message/rfc822.',
    );
  return body;
}
