import express, { type Express, type RequestHandler } from 'express';
import type { Knex } from 'knex';
import type { Meilisearch } from 'meilisearch';
import type { Transporter } from 'nodemailer';
import type { Logger } from 'pino';
import { routes } from '../shared/contract/routes.js';
import { createAccounts } from './accounts/accounts.js';
import { createAuditLog } from './audit/audit.js';
import { createAuditReader } from './audit/audit-reader.js';
import { createBench } from './bench/bench.js';
import { createCautionLibrary } from './caution-library/caution-library.js';
import type { Settings } from './config.js';
import { createDeletion } from './deletion/deletion.js';
import { createDump } from './dump/dump.js';
import { createExport } from './export/export.js';
import { createFeeds } from './feeds/feeds.js';
import { createHardware } from './hardware/hardware.js';
import { createCsrf } from './http/csrf.js';
import { mountRoutes } from './http/mount.js';
import { notStored } from './http/not-stored.js';
import { nothingHere, problemHandler } from './http/problem-handler.js';
import { createRateLimits, noRateLimits } from './http/rate-limits.js';
import { pageProblemHandler } from './http/rendered-pages.js';
import { requestLog } from './http/request-log.js';
import { securityHeaders } from './http/security-headers.js';
import { sessionSweeper } from './http/session-sweeper.js';
import { createSessions } from './http/session.js';
import { createJoints } from './joints/joints.js';
import { createMail } from './mail/mail.js';
import { createMakers } from './makers/makers.js';
import { createMeasurements } from './measurements/measurements.js';
import { createLimitLookup, createMembers } from './members/members.js';
import { createDeskClaims } from './moderation/claims.js';
import { createDeskInbox } from './moderation/desk-inbox.js';
import { createDesk } from './moderation/desk.js';
import { createModeration } from './moderation/moderation.js';
import { createTakeDownService } from './moderation/take-down.service.js';
import { createWithdrawals } from './moderation/withdrawals.js';
import { createPhotos } from './photos/photos.js';
import { createProposals } from './proposals/proposals.js';
import { createQuestions } from './questions/questions.js';
import { createSearch } from './search/search.js';
import { createSystem } from './system/system.js';
import { renderText, toPlainText } from './text/render-text.js';
import { createHappenings } from './watches/happenings.js';
import { createWatches } from './watches/watches.js';
import { createWhichOne } from './which-one/which-one.js';
import type { Worker } from './worker.js';
import { createWorksheets } from './worksheets/worksheets.js';
import { createWriteUps } from './write-ups/write-ups.js';

/** All that comes from outside; tests hand in their own. */
export interface Surroundings {
  readonly settings: Settings;
  readonly knex: Knex;
  readonly logger: Logger;
  readonly search: Meilisearch;
  readonly mailTransport: Transporter;
  readonly clock: () => Date;
  /** Off in tests that are not about them. */
  readonly rateLimits: boolean;
  /** Serves the built client's files and rendered pages; absent where only the API is wanted. */
  readonly pages?: PageHandlers;
}

/** What serves everything that is not the API. */
export interface PageHandlers {
  /** Files that are the same for everybody; they come before sessions, so that no cookie goes with them. */
  readonly files: RequestHandler;
  readonly rendered: RequestHandler;
}

export interface Composition {
  readonly app: Express;
  readonly workers: readonly Worker[];
}

/** Makes every store, service and router, and hands each what it needs. */
export function createApp(around: Surroundings): Composition {
  const { settings, knex, logger, clock } = around;
  const secure = settings.PUBLIC_ADDRESS.startsWith('https:');
  const secret = settings.SESSION_SECRET;
  const csrf = createCsrf({ secret, secure });
  const limits = around.rateLimits ? createRateLimits() : noRateLimits;

  const audit = createAuditLog({ clock });
  const happenings = createHappenings({ clock });
  const claims = createDeskClaims({ knex, clock });
  const deskInbox = createDeskInbox({ clock });
  const mail = createMail({
    knex,
    transport: around.mailTransport,
    clock,
    from: settings.MAIL_FROM,
    publicAddress: settings.PUBLIC_ADDRESS,
    logger,
    secret,
    bounceSecret: settings.BOUNCE_SECRET,
  });
  const limitOn = createLimitLookup({ knex, clock });
  const watches = createWatches({ knex, clock, logger, mail });
  const accounts = createAccounts({ knex, clock, mail: mail.queue, limits, csrf, audit, limitOn });
  const sessions = createSessions({ knex, secret, secure, authenticator: accounts.authenticator });
  const photos = createPhotos({ knex, photoDir: settings.PHOTO_DIR, clock, limits });
  const hardware = createHardware({ knex });
  const bench = createBench({ knex, hardware: hardware.service, clock });
  const search = createSearch({
    knex,
    search: around.search,
    clock,
    logger,
    benchOf: (accountId) => bench.service.benchOf(accountId),
    indexUid: settings.SEARCH_INDEX,
  });
  const writeUps = createWriteUps({
    knex,
    clock,
    hardware: hardware.service,
    photos: photos.service,
    renderText,
    searchOutbox: search.outbox,
    happenings,
    deskInbox,
  });
  const moderation = createModeration({
    knex,
    clock,
    writeUps: writeUps.service,
    mail: mail.queue,
    searchOutbox: search.outbox,
    audit,
    happenings,
    claims,
  });
  const measurements = createMeasurements({
    knex,
    clock,
    hardware: hardware.service,
    limits,
    audit,
    happenings,
    deskInbox,
  });
  const whichOne = createWhichOne({ knex, clock, hardware: hardware.service });
  const proposals = createProposals({
    knex,
    clock,
    limits,
    mail: mail.queue,
    photos: photos.service,
    measurements: measurements.service,
    searchOutbox: search.outbox,
    audit,
    happenings,
    watches: watches.service,
    claims,
    deskInbox,
  });
  const joints = createJoints({
    knex,
    clock,
    measurements: measurements.service,
    writeUps: writeUps.service,
    happenings,
    deskInbox,
  });
  const questions = createQuestions({
    knex,
    clock,
    hardware: hardware.service,
    joints: joints.service,
    photos: photos.service,
    writeUps: writeUps.service,
    renderText,
    limits,
    happenings,
    deskInbox,
  });
  const takeDown = createTakeDownService({
    clock,
    audit,
    mail: mail.queue,
    measurements: measurements.service,
    writeUps: writeUps.service,
    searchOutbox: search.outbox,
  });
  const desk = createDesk({
    knex,
    clock,
    audit,
    mail: mail.queue,
    writeUps: writeUps.service,
    claims,
    takeDown,
    limits,
  });
  const makers = createMakers({
    knex,
    clock,
    limits,
    mail: mail.queue,
    hardware: hardware.service,
    writeUps: writeUps.service,
    joints: joints.service,
    renderText,
    makerRole: accounts.makerRole,
    audit,
    happenings,
    publicAddress: settings.PUBLIC_ADDRESS,
    claims,
  });
  const worksheets = createWorksheets({ knex });
  const cautionLibrary = createCautionLibrary({ knex, clock, audit, cautions: moderation.cautions });
  const withdrawals = createWithdrawals({
    knex,
    clock,
    writeUps: writeUps.service,
    mail: mail.queue,
    searchOutbox: search.outbox,
    audit,
    happenings,
  });
  const members = createMembers({
    knex,
    clock,
    audit,
    mail: mail.queue,
    takeDown,
    withdrawals: withdrawals.desk,
    writeUps: writeUps.service,
  });
  const auditReader = createAuditReader({ knex, clock });
  const deletion = createDeletion({
    knex,
    clock,
    logger,
    leaving: accounts.leaving,
    mail: mail.queue,
    limits,
    audit,
    photos: photos.service,
  });
  const { PUBLIC_ADDRESS: publicAddress, DUMP_DIR: folder } = settings;
  const dump = createDump({ knex, clock, logger, folder, publicAddress });
  const feeds = createFeeds({ knex, publicAddress, renderText, toPlainText });
  const ownData = createExport({ knex, clock, limits, photos: photos.service });
  const system = createSystem({
    knex,
    publicAddress: settings.PUBLIC_ADDRESS,
    declared: routes,
    checks: { search: search.health, mail: mail.health, photos: photos.health },
  });

  const bindings = [
    ...system.bindings,
    ...accounts.bindings,
    ...mail.bindings,
    ...watches.bindings,
    ...photos.bindings,
    ...hardware.bindings,
    ...whichOne.bindings,
    ...proposals.bindings,
    ...bench.bindings,
    ...search.bindings,
    ...writeUps.bindings,
    ...moderation.bindings,
    ...desk.bindings,
    ...cautionLibrary.bindings,
    ...withdrawals.bindings,
    ...members.bindings,
    ...auditReader.bindings,
    ...measurements.bindings,
    ...joints.bindings,
    ...makers.bindings,
    ...worksheets.bindings,
    ...questions.bindings,
    ...ownData.bindings,
    ...dump.bindings,
    ...feeds.bindings,
    ...deletion.bindings,
  ];

  const app = express();
  app.disable('x-powered-by');
  // One proxy in front: the last hop it names is believed, what callers wrote before it is not.
  app.set('trust proxy', settings.TRUST_PROXY ? 1 : false);
  app.use(requestLog(logger), ...securityHeaders({ secure }));
  if (around.pages) app.use(around.pages.files);
  // Photos, feeds and the dump are kept by shared caches, so no session cookie may go with them.
  app.use([...sessions.handlers, ...csrf.issue].map(unlessForEverybody));
  app.use('/api', notStored);
  mountRoutes(app, routes, bindings, {
    callerOf: sessions.callerOf,
    csrf: csrf.demand,
  });
  app.use(['/api', '/photos', '/feeds', /^\/dump\/./], nothingHere, problemHandler);
  if (around.pages) app.use(around.pages.rendered, nothingHere, pageProblemHandler);
  app.use(nothingHere, problemHandler);
  return {
    app,
    workers: [
      mail.worker,
      ...watches.workers,
      search.worker,
      deletion.worker,
      dump.worker,
      sessionSweeper({ knex, clock, logger }),
    ],
  };
}

/** What is the same for everybody, whoever asks. */
const forEverybody = /^\/(?:photos|feeds|dump)\/./;

function unlessForEverybody(handler: RequestHandler): RequestHandler {
  return (request, response, next) => {
    if (forEverybody.test(request.path)) next();
    else void handler(request, response, next);
  };
}
