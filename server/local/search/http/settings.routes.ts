import { Router } from 'express';
import { readSetting, readSettingsChange } from '../settings/settings-change.js';
import { defaultSettings, type IndexSettings } from '../settings/settings.js';
import { jsonBody } from './input.js';
import { enqueue, indexInPath, uidInPath, type Surroundings } from './surroundings.js';

const names = Object.keys(defaultSettings) as (keyof IndexSettings)[];
const patched = new Set<keyof IndexSettings>(['typoTolerance', 'faceting', 'pagination', 'embedders']);
const kebabCase = (name: string) => name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);

/** Settings of an index, all at once and each by itself. */
export function settingsRoutes(around: Surroundings): Router {
  const router = Router();
  const path = '/indexes/:uid/settings';

  router.get(path, (request, response) => {
    response.json(indexInPath(around, request, 'settings.get').index.settings);
  });

  router.patch(path, (request, response) => {
    const { uid } = uidInPath(around, request, 'settings.update');
    const change = readSettingsChange(jsonBody(request)) as Record<string, unknown>;
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'settingsUpdate',
      work: { kind: 'changeSettings', change, mayCreate: true },
      details: change,
    });
  });

  router.delete(path, (request, response) => {
    const { uid } = uidInPath(around, request, 'settings.update');
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'settingsUpdate',
      work: {
        kind: 'changeSettings',
        change: Object.fromEntries(names.map((name) => [name, null])),
        mayCreate: false,
      },
      details: Object.fromEntries(names.map((name) => [name, null])),
    });
  });

  for (const name of names) {
    const own = `${path}/${kebabCase(name)}`;
    router.get(own, (request, response) => {
      response.json(indexInPath(around, request, 'settings.get').index.settings[name]);
    });
    router[patched.has(name) ? 'patch' : 'put'](own, (request, response) => {
      const { uid } = uidInPath(around, request, 'settings.update');
      const change = { [name]: readSetting(name, jsonBody(request)) };
      enqueue(around, request, response, {
        indexUid: uid,
        type: 'settingsUpdate',
        work: { kind: 'changeSettings', change, mayCreate: true },
        details: change,
      });
    });
    router.delete(own, (request, response) => {
      const { uid } = uidInPath(around, request, 'settings.update');
      enqueue(around, request, response, {
        indexUid: uid,
        type: 'settingsUpdate',
        work: { kind: 'changeSettings', change: { [name]: null }, mayCreate: false },
        details: { [name]: null },
      });
    });
  }

  return router;
}
