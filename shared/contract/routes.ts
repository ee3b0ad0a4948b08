import { accountRoutes } from './accounts.js';
import { benchRoutes, hardwareRoutes } from './hardware.js';
import { jointRoutes } from './joints.js';
import { measurementRoutes } from './measurements.js';
import { deskRoutes } from './moderation.js';
import { ownStockRoutes } from './own-stock.js';
import { photoRoutes } from './photos.js';
import { proposalRoutes } from './proposals.js';
import { questionRoutes } from './questions.js';
import { searchRoutes } from './search.js';
import { systemRoutes } from './system.js';
import { whichOneRoutes } from './which-one.js';
import { writeUpRoutes } from './write-ups.js';

/** Every route of the API, and who may call it. A route that does not stand here is not served. */
export const routes = {
  ...systemRoutes,
  ...accountRoutes,
  ...hardwareRoutes,
  ...whichOneRoutes,
  ...proposalRoutes,
  ...benchRoutes,
  ...measurementRoutes,
  ...jointRoutes,
  ...ownStockRoutes,
  ...searchRoutes,
  ...writeUpRoutes,
  ...photoRoutes,
  ...deskRoutes,
  ...questionRoutes,
};
export type RouteName = keyof typeof routes;
