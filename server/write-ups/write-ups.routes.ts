import type { Response } from 'express';
import type { Draft } from '../../shared/contract/write-ups.js';
import { proposedEditionRoutes } from '../../shared/contract/proposed-editions.js';
import { writeUpRoutes } from '../../shared/contract/write-ups.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { WriteUpService } from './write-ups.js';

const routes = { ...writeUpRoutes, ...proposedEditionRoutes };

export function writeUpBindings(writeUps: WriteUpService): RouteBinding[] {
  return [
    bind(routes.readWriteUp, ({ caller, params }) => writeUps.readWriteUp(caller, params.slug)),
    bind(routes.listEditions, async ({ caller, params }) => ({
      items: await writeUps.listEditions(caller, params.slug),
    })),
    bind(routes.readEdition, ({ caller, params }) =>
      writeUps.readEdition(caller, params.slug, params.number),
    ),
    bind(routes.compareEditions, ({ caller, params, query }) =>
      writeUps.compareEditions(caller, params.slug, query),
    ),
    bind(routes.listMine, ({ caller, query }) => writeUps.listMine(memberOf(caller), query)),
    bind(routes.startWriteUp, async ({ caller, body, response }) =>
      tagged(response, await writeUps.startWriteUp(memberOf(caller), body.title ?? '')),
    ),
    bind(routes.startEdition, async ({ caller, params, response }) =>
      tagged(response, await writeUps.startEdition(memberOf(caller), params.slug)),
    ),
    bind(routes.bringEditionBack, async ({ caller, params, response }) =>
      tagged(response, await writeUps.bringEditionBack(memberOf(caller), params.slug, params.number)),
    ),
    bind(routes.readDraft, async ({ caller, params, response }) =>
      tagged(response, await writeUps.readDraft(memberOf(caller), params.id)),
    ),
    bind(routes.saveDraft, async ({ caller, params, version, body, response }) =>
      tagged(response, await writeUps.saveDraft(memberOf(caller), params.id, version, body)),
    ),
    bind(routes.discardDraft, ({ caller, params }) => writeUps.discardDraft(memberOf(caller), params.id)),
    bind(routes.restoreDraft, async ({ caller, params, response }) =>
      tagged(response, await writeUps.restoreDraft(memberOf(caller), params.id)),
    ),
    bind(routes.previewDraft, async ({ caller, params }) => ({
      view: await writeUps.previewDraft(memberOf(caller), params.id),
    })),
    bind(routes.listDraftCautions, async ({ caller, params }) => ({
      items: await writeUps.cautionsOnDraft(memberOf(caller), params.id),
    })),
    bind(routes.submitDraft, async ({ caller, params, version, response }) =>
      tagged(response, await writeUps.submitDraft(memberOf(caller), params.id, version)),
    ),
    bind(routes.recallDraft, async ({ caller, params, response }) =>
      tagged(response, await writeUps.recallDraft(memberOf(caller), params.id)),
    ),
    bind(routes.readMergeGround, ({ caller, params }) =>
      writeUps.readMergeGround(memberOf(caller), params.id),
    ),
    bind(routes.listProposedEditions, ({ caller, query }) =>
      writeUps.listProposedEditions(memberOf(caller), query),
    ),
    bind(routes.readProposedEdition, ({ caller, params }) =>
      writeUps.readProposedEdition(memberOf(caller), params.id),
    ),
    bind(routes.giveOpinion, ({ caller, params, body }) =>
      writeUps.giveOpinion(memberOf(caller), params.id, body),
    ),
    bind(routes.reportTrial, ({ caller, params, body }) =>
      writeUps.reportTrial(memberOf(caller), params.slug, body),
    ),
  ];
}

/** Every answer that carries a draft carries its version as ETag, which the next save names. */
function tagged(response: Response, draft: Draft): Draft {
  response.set('ETag', `"${draft.version}"`);
  return draft;
}
