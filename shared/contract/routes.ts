import { accountRoutes } from './accounts.js';
import { auditRoutes } from './audit.js';
import { cautionLibraryRoutes } from './caution-library.js';
import { dumpRoutes } from './dump.js';
import { feedRoutes } from './feeds.js';
import { deletionRoutes } from './deletion.js';
import { exportRoutes } from './export.js';
import { benchRoutes, hardwareRoutes } from './hardware.js';
import { jointRoutes } from './joints.js';
import { mailRoutes } from './mail.js';
import { makerRoutes } from './makers.js';
import { measurementRoutes } from './measurements.js';
import { memberRoutes } from './members.js';
import { deskPostRoutes } from './desk-posts.js';
import { deskQueueRoutes } from './desk-queue.js';
import { flagRoutes } from './flags.js';
import { deskRoutes } from './moderation.js';
import { ownStockRoutes } from './own-stock.js';
import { photoRoutes } from './photos.js';
import { proposalRoutes } from './proposals.js';
import { proposedEditionRoutes } from './proposed-editions.js';
import { questionRoutes } from './questions.js';
import { searchRoutes } from './search.js';
import { systemRoutes } from './system.js';
import { noticeRoutes, watchRoutes } from './watches.js';
import { whichOneRoutes } from './which-one.js';
import { withdrawalRoutes } from './withdrawal.js';
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
  ...makerRoutes,
  ...proposedEditionRoutes,
  ...photoRoutes,
  ...deskRoutes,
  ...deskQueueRoutes,
  ...flagRoutes,
  ...deskPostRoutes,
  ...cautionLibraryRoutes,
  ...withdrawalRoutes,
  ...memberRoutes,
  ...auditRoutes,
  ...questionRoutes,
  ...watchRoutes,
  ...noticeRoutes,
  ...mailRoutes,
  ...exportRoutes,
  ...dumpRoutes,
  ...feedRoutes,
  ...deletionRoutes,
};
export type RouteName = keyof typeof routes;
