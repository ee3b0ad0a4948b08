import type { Knex } from 'knex';
import type { Response } from 'express';
import type { RouteDefinition } from '../../shared/contract/route.js';
import { systemRoutes } from '../../shared/contract/system.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { openApiDocument } from '../http/openapi.js';
import { checkHealth, databaseHealth, type HealthChecks } from './health.js';
import { referenceFolder, referencePage, referenceScript } from './reference-page.js';

const oneDaySeconds = 24 * 60 * 60;

/** Health of the site, and the document of its API. */
export function createSystem(needs: {
  knex: Knex;
  publicAddress: string;
  declared: Record<string, RouteDefinition>;
  checks: Omit<HealthChecks, 'database'>;
}): { bindings: RouteBinding[] } {
  const checks: HealthChecks = { ...needs.checks, database: () => databaseHealth(needs.knex) };
  let document: object | undefined;

  return {
    bindings: [
      bind(systemRoutes.health, async ({ response }) => {
        const health = await checkHealth(checks);
        if (!health.ok) response.status(503).json(health);
        return health;
      }),
      bind(systemRoutes.openApi, () => {
        document ??= openApiDocument(needs.declared, needs.publicAddress);
        return Promise.resolve(document);
      }),
      bind(systemRoutes.apiPage, ({ response }) => {
        response.type('html').send(referencePage);
        return Promise.resolve(undefined);
      }),
      bind(systemRoutes.apiPageFile, async ({ params, response }) => {
        response.set('Cache-Control', `private, max-age=${oneDaySeconds}`);
        if (params.file === 'page.js') response.type('text/javascript').send(referenceScript);
        else await sendFile(response, params.file);
      }),
    ],
  };
}

function sendFile(response: Response, file: string): Promise<void> {
  return new Promise((resolve, reject) => {
    response.sendFile(file, { root: referenceFolder, cacheControl: false }, (error) =>
      error ? reject(error) : resolve(),
    );
  });
}
