import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { routes } from '../../shared/contract/routes.js';
import type { RouteDefinition } from '../../shared/contract/route.js';
import { roles, type Role } from '../../shared/contract/vocabulary.js';
import { startTestApp, type Agent, type TestApp } from './support/app.js';

/** Who may call what, said a second time on purpose: opening a route by accident has to fail here. */
const mayCall: Record<keyof typeof routes, readonly Role[]> = accessTable();

let app: TestApp;
let agents: Record<Role, Agent>;

beforeAll(async () => {
  app = await startTestApp({ search: true });
  agents = {
    visitor: app.visitor(),
    member: await app.as('member'),
    maker: await app.as('maker'),
    moderator: await app.as('moderator'),
    administrator: await app.as('administrator'),
  };
});
afterAll(() => app.close());

const declared = Object.entries(routes) as [keyof typeof routes, RouteDefinition][];
// Signing out comes last, for it ends the session the others need.
const inOrder = [...declared].sort(([a], [b]) => Number(a === 'signOut') - Number(b === 'signOut'));

const standIns: Record<string, string> = {
  slug: 'no-such-thing',
  feature: 'boss',
  dimension: 'diameter',
  number: '1',
  file: 'page.js',
  kind: 'write-up',
};
const address = (route: RouteDefinition): string =>
  route.path.replace(/:([a-zA-Z]+)/g, (_, name: string) => standIns[name] ?? '999999999');

describe.each(inOrder)('%s', (name, route) => {
  it.each(roles)('is open to a %s exactly if the table says so', async (role) => {
    const answer = await agents[role][route.method](address(route)).redirects(0);
    const type = String(answer.body?.type ?? '');
    if (mayCall[name].includes(role)) {
      expect(type).not.toBe('/problems/not-signed-in');
      expect(type).not.toBe('/problems/not-allowed');
      expect([401, 403]).not.toContain(answer.status);
      expect(answer.status).toBeLessThan(500);
    } else if (role === 'visitor') {
      expect([answer.status, type]).toEqual([401, '/problems/not-signed-in']);
    } else {
      expect([answer.status, type]).toEqual([403, '/problems/not-allowed']);
    }
  });
});

describe('what the server answers to', () => {
  interface Layer {
    readonly route?: { readonly path: string; readonly stack: readonly { readonly method: string }[] };
    readonly handle: { readonly stack?: unknown };
  }
  const layers = (): readonly Layer[] =>
    (app.app as unknown as { router: { stack: readonly Layer[] } }).router.stack;

  it('is what is declared, no route more and none less', () => {
    const served = layers().flatMap(({ route }) =>
      route ? [...new Set(route.stack.map(({ method }) => `${method} ${route.path}`))] : [],
    );
    expect(served.sort()).toEqual(declared.map(([, route]) => `${route.method} ${route.path}`).sort());
  });

  it('hides no further routes in a router of its own', () => {
    expect(layers().filter((layer) => !layer.route && layer.handle.stack !== undefined)).toEqual([]);
  });

  it('is nothing at an address below /api that is not declared', async () => {
    const answer = await agents.administrator.get('/api/admin');
    expect([answer.status, answer.body.type]).toEqual([404, '/problems/not-found']);
  });
});

function accessTable(): Record<keyof typeof routes, readonly Role[]> {
  const everybody: readonly Role[] = ['visitor', 'member', 'maker', 'moderator', 'administrator'];
  const accounts: readonly Role[] = ['member', 'maker', 'moderator', 'administrator'];
  const speakers: readonly Role[] = ['maker', 'moderator', 'administrator'];
  const desk: readonly Role[] = ['moderator', 'administrator'];
  const office: readonly Role[] = ['administrator'];
  return {
    health: everybody,
    openApi: everybody,
    apiPage: everybody,
    apiPageFile: everybody,
    session: everybody,
    signUp: everybody,
    confirmEmail: everybody,
    resendConfirmation: everybody,
    signIn: everybody,
    signOut: everybody,
    requestPasswordReset: everybody,
    resetPassword: everybody,
    changeProfile: accounts,
    exportOwnData: accounts,
    readDumpSummary: everybody,
    serveDump: everybody,
    serveDumpSchema: everybody,
    writeUpFeed: everybody,
    cautionFeed: everybody,
    partFeed: everybody,
    readDeletion: accounts,
    askForDeletion: accounts,
    callDeletionOff: accounts,
    listHandOvers: accounts,
    takeHandOver: accounts,
    declineHandOver: accounts,
    unsubscribe: everybody,
    openUnsubscribe: everybody,
    listAccounts: office,
    changeRole: office,
    listMakers: everybody,
    listParts: everybody,
    readPart: everybody,
    listSymptoms: everybody,
    addRevisionPhoto: desk,
    removeRevisionPhoto: desk,
    readWhichOne: everybody,
    propose: accounts,
    listMyProposals: accounts,
    listDeskProposals: desk,
    takeProposal: desk,
    declineProposal: desk,
    merge: desk,
    readBench: accounts,
    addToBench: accounts,
    changeBenchItem: accounts,
    removeFromBench: accounts,
    readPartMeasurements: everybody,
    readDimension: everybody,
    addMeasurement: accounts,
    setAsideMeasurement: desk,
    takeBackMeasurement: desk,
    readMaker: everybody,
    askToSpeak: accounts,
    proveByMail: accounts,
    stopSpeaking: accounts,
    readMakerRequest: desk,
    decideMakerRequest: desk,
    endSpeaking: desk,
    changeMakerAddresses: desk,
    readMakerSide: everybody,
    putMakerAnswer: speakers,
    takeBackMakerAnswer: speakers,
    markMadeRight: speakers,
    unmarkMadeRight: speakers,
    announceRevision: speakers,
    changeAnnounced: speakers,
    sellRevision: speakers,
    withdrawAnnounced: speakers,
    listWantedReadings: everybody,
    readMakerLetter: accounts,
    sendMakerLetter: accounts,
    listJoints: everybody,
    readJoint: everybody,
    reportFit: accounts,
    checkFit: everybody,
    compareParts: everybody,
    listOwnStock: accounts,
    addOwnStock: accounts,
    removeOwnStock: accounts,
    search: everybody,
    readWriteUp: everybody,
    listEditions: everybody,
    readEdition: everybody,
    compareEditions: everybody,
    listMine: accounts,
    startWriteUp: accounts,
    startEdition: accounts,
    readDraft: accounts,
    saveDraft: accounts,
    discardDraft: accounts,
    restoreDraft: accounts,
    previewDraft: accounts,
    listDraftCautions: accounts,
    submitDraft: accounts,
    recallDraft: accounts,
    reportTrial: accounts,
    bringEditionBack: accounts,
    readMergeGround: accounts,
    listProposedEditions: accounts,
    readProposedEdition: accounts,
    giveOpinion: accounts,
    addPhoto: accounts,
    servePhoto: everybody,
    readDesk: desk,
    readClaim: desk,
    claimItem: desk,
    giveUpClaim: desk,
    takeDown: desk,
    putBack: desk,
    tellDesk: accounts,
    readDeskFlag: desk,
    settleFlag: desk,
    readFirstPost: desk,
    findPostFine: desk,
    takePostDown: desk,
    readDeskPhoto: desk,
    findPhotoFine: desk,
    takePhotoDown: desk,
    readDeskProposal: desk,
    readDeskEdition: desk,
    listLibraryCautions: desk,
    placeCaution: desk,
    changeCaution: desk,
    moveCaution: desk,
    removeCaution: desk,
    publishEdition: desk,
    readCautionLibrary: desk,
    readLibraryEntry: desk,
    addLibraryEntry: desk,
    changeLibraryEntry: desk,
    retireLibraryEntry: desk,
    putBackLibraryEntry: desk,
    orderCautionLibrary: desk,
    listLibraryVersions: desk,
    compareLibraryVersions: desk,
    listLibraryUses: desk,
    applyLibraryEntry: desk,
    readDeskWriteUp: desk,
    withdrawWriteUp: desk,
    putBackWriteUp: desk,
    readMyLimit: accounts,
    listMembers: desk,
    readMember: desk,
    limitMember: desk,
    liftLimit: desk,
    listAudit: office,
    listAuditNames: office,
    exportAudit: office,
    readSubjectAudit: desk,
    returnEdition: desk,
    listQuestions: everybody,
    listAlike: everybody,
    listCovered: everybody,
    readQuestion: everybody,
    askQuestion: accounts,
    changeQuestion: accounts,
    addReply: accounts,
    changeReply: accounts,
    draftFromReply: accounts,
    settleQuestion: accounts,
    reopenQuestion: accounts,
    watch: accounts,
    endWatch: accounts,
    listMyWatches: accounts,
    listMyWatchKeys: accounts,
    listMyNotices: accounts,
    countMyNotices: accounts,
    markNoticesRead: accounts,
    markNoticesUnread: accounts,
    readMailChoices: everybody,
    makeMailChoice: everybody,
    takeBounce: everybody,
    confirmAddressAgain: accounts,
  };
}
