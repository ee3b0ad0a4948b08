import { Router, type Request } from 'express';
import { z } from 'zod';
import { actions } from './access.js';
import { ApiError } from './api-error.js';
import { countParam, jsonBody, objectBody, onlyFields, onlyParams, pathParam } from './input.js';
import type { ApiKey } from './key-store.js';
import type { Surroundings } from './surroundings.js';

const fields = ['uid', 'name', 'description', 'actions', 'indexes', 'expiresAt'];
const immutable = ['uid', 'actions', 'indexes', 'expiresAt', 'createdAt', 'updatedAt', 'key'];
const indexPattern = /^(\*|[a-zA-Z0-9_-]{1,399}\*?)$/;

const snakeCase = (name: string) => name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

/** API keys: what they may do, where, and until when. */
export function keyRoutes(around: Surroundings): Router {
  const router = Router();
  const { keys, access } = around;

  const keyInPath = (request: Request): ApiKey => {
    const name = pathParam(request, 'key');
    const key = keys.find(name);
    if (!key) throw new ApiError('api_key_not_found', `API key \`${name}\` not found.`);
    return key;
  };

  router.get('/keys', (request, response) => {
    access.caller(request, 'keys.get');
    onlyParams(request, ['offset', 'limit']);
    const offset = countParam(request, 'offset', 'invalid_api_key_offset', 0);
    const limit = countParam(request, 'limit', 'invalid_api_key_limit', 20);
    response.json({ ...keys.list(offset, limit), offset, limit });
  });

  router.post('/keys', (request, response) => {
    access.caller(request, 'keys.create');
    response.status(201).json(keys.add(readKey(objectBody(jsonBody(request)), around.clock())));
  });

  router.get('/keys/:key', (request, response) => {
    access.caller(request, 'keys.get');
    response.json(keyInPath(request));
  });

  router.patch('/keys/:key', (request, response) => {
    access.caller(request, 'keys.update');
    const body = objectBody(jsonBody(request));
    const fixed = immutable.find((name) => Object.hasOwn(body, name));
    if (fixed !== undefined) {
      throw new ApiError(
        `immutable_api_key_${snakeCase(fixed)}`,
        `Immutable field \`${fixed}\`: expected one of \`description\`, \`name\``,
      );
    }
    onlyFields(body, ['name', 'description']);
    const key = keyInPath(request);
    keys.rename(key.uid, { name: textField(body, 'name'), description: textField(body, 'description') });
    response.json(keys.find(key.uid));
  });

  router.delete('/keys/:key', (request, response) => {
    access.caller(request, 'keys.delete');
    keys.remove(keyInPath(request).uid);
    response.status(204).end();
  });

  return router;
}

function readKey(body: Readonly<Record<string, unknown>>, now: Date) {
  onlyFields(body, fields);
  for (const name of ['actions', 'indexes', 'expiresAt']) {
    if (body[name] === undefined)
      throw new ApiError(`missing_api_key_${snakeCase(name)}`, `Missing field \`${name}\``);
  }
  const uid = body['uid'] ?? undefined;
  if (uid !== undefined && !z.uuid().safeParse(uid).success) {
    throw new ApiError('invalid_api_key_uid', 'Invalid value at `.uid`: expected a UUID');
  }
  const granted = z.array(z.enum(actions)).safeParse(body['actions']);
  if (!granted.success) {
    throw new ApiError(
      'invalid_api_key_actions',
      `Invalid value at \`.actions\`: expected an array of ${actions.map((each) => `\`${each}\``).join(', ')}`,
    );
  }
  const indexes = z.array(z.string().regex(indexPattern)).safeParse(body['indexes']);
  if (!indexes.success) {
    throw new ApiError(
      'invalid_api_key_indexes',
      'Invalid value at `.indexes`: expected an array of index uids or patterns such as `shop*`',
    );
  }
  return {
    ...(uid === undefined ? {} : { uid: uid as string }),
    name: textField(body, 'name') ?? null,
    description: textField(body, 'description') ?? null,
    actions: granted.data,
    indexes: indexes.data,
    expiresAt: expiry(body['expiresAt'], now),
  };
}

function textField(body: Readonly<Record<string, unknown>>, name: string): string | null | undefined {
  const value = body[name];
  if (value === undefined || value === null || typeof value === 'string') return value;
  throw new ApiError(`invalid_api_key_${name}`, `Invalid value at \`.${name}\`: expected a text`);
}

function expiry(value: unknown, now: Date): string | null {
  if (value === null) return null;
  const time = typeof value === 'string' && /^\d{4}-\d{2}-\d{2}/.test(value) ? Date.parse(value) : NaN;
  if (Number.isNaN(time) || time <= now.getTime()) {
    throw new ApiError(
      'invalid_api_key_expires_at',
      `\`${String(value).slice(0, 60)}\` is not a valid date in the future. It should follow the RFC 3339 format, such as 2030-01-31 or 2030-01-31T10:00:00Z.`,
    );
  }
  return new Date(time).toISOString();
}
