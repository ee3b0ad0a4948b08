import type { SectionName } from '../../shared/contract/export.js';

/** One kind of thing that a person wrote or keeps: where it stands, and the shape in which they get it. */
export interface Section {
  readonly name: SectionName;
  readonly table: string;
  /** Column that names the account. */
  readonly owner: string;
  /** Condition on the table, called `t`, with `:account` for the person. */
  readonly whose: string;
  /** Column or expression by which rows are read on; unique among the rows of one person. */
  readonly key: string;
  /** Name in `data.json` and column of the table, or expression over it. */
  readonly fields: Readonly<Record<string, string>>;
  readonly json: readonly string[];
  readonly flags: readonly string[];
}

const section = (
  name: SectionName,
  table: string,
  owner: string,
  fields: Section['fields'],
  more: Partial<Pick<Section, 'whose' | 'key' | 'json' | 'flags'>> = {},
): Section => ({
  name,
  table,
  owner,
  fields,
  whose: `t.${owner} = :account`,
  key: 't.id',
  json: [],
  flags: [],
  ...more,
});

const found = (what: string, table: string, by: string): string =>
  `(SELECT ${what} FROM ${table} x WHERE x.id = t.${by})`;
const partBy = (column: string) => found('x.name', 'parts', column);
const revisionBy = (column: string) => found('x.label', 'revisions', column);
const makerBy = (column: string) => found('x.name', 'makers', column);
const writeUpBy = (column: string) => found('x.slug', 'write_ups', column);
const takenDown = { takenDownAt: 'taken_down_at', takenDownReason: 'taken_down_reason' };
const createdAt = { createdAt: 'created_at' };

const partOfFeature =
  '(SELECT p.name FROM features f JOIN parts p ON p.id = f.part_id WHERE f.id = t.feature_id)';
const ofFix = (what: string) =>
  `(SELECT ${what} FROM fixes f LEFT JOIN write_ups w ON w.id = f.write_up_id WHERE f.id = t.fix_id)`;
const triedOn = `(SELECT JSON_ARRAYAGG(CONCAT(p.name, ' ', r.label)) FROM trial_revisions x
  JOIN revisions r ON r.id = x.revision_id JOIN parts p ON p.id = r.part_id WHERE x.trial_id = t.id)`;
const askedAbout = `(SELECT JSON_ARRAYAGG(CONCAT_WS(' ', p.name, r.label) ORDER BY x.position) FROM question_parts x
  JOIN parts p ON p.id = x.part_id LEFT JOIN revisions r ON r.id = x.revision_id WHERE x.question_id = t.id)`;

const nameOfSubject = `CASE t.subject
  WHEN 'part' THEN (SELECT x.name FROM parts x WHERE x.id = t.subject_id)
  WHEN 'revision' THEN (SELECT CONCAT(p.name, ' ', x.label) FROM revisions x JOIN parts p ON p.id = x.part_id WHERE x.id = t.subject_id)
  WHEN 'joint' THEN (SELECT x.name FROM joints x WHERE x.id = t.subject_id)
  WHEN 'write-up' THEN (SELECT x.slug FROM write_ups x WHERE x.id = t.subject_id)
  WHEN 'question' THEN (SELECT x.slug FROM questions x WHERE x.id = t.subject_id) END`;

/** What of theirs the desk decides about, by the name its kind has in the audit log. */
const decidedAbout = Object.entries({
  edition: 'editions WHERE author_id',
  'write-up': 'write_ups WHERE created_by',
  question: 'questions WHERE account_id',
  reply: 'question_replies WHERE account_id',
  trial: 'trials WHERE account_id',
  measurement: 'measurements WHERE account_id',
  photo: 'photos WHERE owner_id',
  proposal: 'hardware_proposals WHERE account_id',
  'maker-request': 'maker_requests WHERE account_id',
  account: 'accounts WHERE id',
})
  .map(
    ([kind, rows]) => `(t.subject_kind = '${kind}' AND t.subject_id IN (SELECT id FROM ${rows} = :account))`,
  )
  .join(' OR ');

/** What is in an export. A feature with a table of its own adds its line here and its shape in shared/contract/export.ts. */
export const sections: readonly Section[] = [
  section(
    'account',
    'accounts',
    'id',
    {
      email: 'email',
      displayName: 'display_name',
      role: 'role',
      noticeMail: 'notice_mail',
      mailRhythm: 'mail_rhythm',
      benchWatch: 'bench_watch',
      safetyMail: 'safety_mail',
      mailRefusedAt: 'mail_refused_at',
      units: 'units',
      ...createdAt,
      confirmedAt: 'confirmed_at',
      deletionAt: 'deletion_at',
    },
    { flags: ['noticeMail', 'benchWatch', 'safetyMail'] },
  ),
  section('bench', 'bench_items', 'account_id', {
    part: partBy('part_id'),
    revision: revisionBy('revision_id'),
    since: 'created_at',
  }),
  section('ownStock', 'own_stock', 'account_id', {
    name: 'name',
    thickness: 'thickness',
    uncertainty: 'uncertainty',
    available: 'available',
  }),
  section(
    'readings',
    'measurements',
    'account_id',
    {
      part: partOfFeature,
      feature: found('x.name', 'features', 'feature_id'),
      revision: revisionBy('revision_id'),
      dimension: 'dimension',
      value: 'value',
      uncertainty: 'uncertainty',
      entered: 'entered',
      unit: 'unit',
      instrument: 'instrument',
      photo: found("CONCAT(x.hash, '.webp')", 'photos', 'photo_id'),
      ...createdAt,
      setAsideAt: 'set_aside_at',
      setAsideReason: 'set_aside_reason',
    },
    { json: ['entered'] },
  ),
  section(
    'trials',
    'trials',
    'account_id',
    {
      writeUp: ofFix('w.slug'),
      fix: ofFix('f.fix_key'),
      revisions: `COALESCE(${triedOn}, '[]')`,
      outcome: 'outcome',
      note: 'note',
      figure: 'figure',
      worksheet: 'worksheet',
      ...createdAt,
      ...takenDown,
    },
    { json: ['revisions', 'worksheet'] },
  ),
  section(
    'fitReports',
    'fit_reports',
    'account_id',
    {
      joint: found('x.name', 'joints', 'joint_id'),
      revisionA: revisionBy('revision_a'),
      revisionB: revisionBy('revision_b'),
      sat: 'sat',
      note: 'note',
      ...createdAt,
      ...takenDown,
    },
    { flags: ['sat'] },
  ),
  section(
    'questions',
    'questions',
    'account_id',
    {
      address: 'slug',
      title: 'title',
      text: 'text',
      parts: `COALESCE(${askedAbout}, '[]')`,
      readings: 'readings',
      worksheet: 'worksheet',
      settledBy: 'settled_fix_title',
      ...createdAt,
      ...takenDown,
    },
    { json: ['parts', 'readings', 'worksheet'] },
  ),
  section(
    'replies',
    'question_replies',
    'account_id',
    {
      question: found('x.slug', 'questions', 'question_id'),
      text: 'text',
      worksheet: 'worksheet',
      ...createdAt,
      ...takenDown,
    },
    { json: ['worksheet'] },
  ),
  section(
    'editions',
    'editions',
    'author_id',
    {
      writeUp: writeUpBy('write_up_id'),
      number: 'number',
      state: 'state',
      title: 'title',
      content: 'content',
      changeNote: 'change_note',
      returnReason: 'return_reason',
      ...createdAt,
      updatedAt: 'updated_at',
      submittedAt: 'submitted_at',
      publishedAt: 'published_at',
      discardedAt: 'discarded_at',
    },
    { json: ['content'] },
  ),
  section(
    'proposals',
    'hardware_proposals',
    'account_id',
    {
      kind: 'kind',
      proposed: 'payload',
      state: 'state',
      reason: 'reason',
      ...createdAt,
      decidedAt: 'decided_at',
    },
    { json: ['proposed'] },
  ),
  section('photos', 'photos', 'owner_id', {
    file: "CONCAT(t.hash, '.webp')",
    alternativeText: 'alt',
    width: 'width',
    height: 'height',
    ...createdAt,
    ...takenDown,
  }),
  section('makerRequests', 'maker_requests', 'account_id', {
    maker: makerBy('maker_id'),
    state: 'state',
    note: 'note',
    reason: 'reason',
    ...createdAt,
    decidedAt: 'decided_at',
  }),
  section(
    'makersSpokenFor',
    'maker_members',
    'account_id',
    { maker: makerBy('maker_id'), since: 'since' },
    { key: 't.maker_id' },
  ),
  section('makerAnswers', 'maker_answers', 'account_id', {
    maker: makerBy('maker_id'),
    writeUp: writeUpBy('write_up_id'),
    text: 'source',
    ...createdAt,
    changedAt: 'changed_at',
    takenBackAt: 'taken_back_at',
  }),
  section('earlierMakerAnswers', 'maker_answer_texts', 'account_id', {
    text: 'source',
    saidFrom: 'said_from',
    saidTo: 'said_to',
  }),
  section('makerLetters', 'maker_letters', 'account_id', {
    maker: makerBy('maker_id'),
    writeUp: writeUpBy('write_up_id'),
    sentAt: 'sent_at',
  }),
  section('cautionsPlaced', 'cautions', 'placed_by', {
    writeUp: writeUpBy('write_up_id'),
    signalWord: 'signal_word',
    hazard: 'hazard',
    consequence: 'consequence',
    avoidance: 'avoidance',
    placedAt: 'placed_at',
    removedAt: 'removed_at',
  }),
  section(
    'libraryCautions',
    'caution_library_versions',
    'changed_by',
    {
      name: 'name',
      change: '`change`',
      hazard: 'hazard',
      consequence: 'consequence',
      avoidance: 'avoidance',
      why: 'why',
      changedAt: 'changed_at',
    },
    { key: "CONCAT(t.library_id, ' ', t.version)" },
  ),
  section('limits', 'member_limits', 'account_id', {
    kind: 'kind',
    reason: 'reason',
    from: 'from_at',
    until: 'until_at',
    liftedAt: 'lifted_at',
    liftReason: 'lift_reason',
  }),
  section(
    'decisions',
    'audit_log',
    'id',
    { at: 'at', action: 'action', about: 'subject_kind', name: 'subject_name', reason: 'reason' },
    { whose: `(${decidedAbout})` },
  ),
  section(
    'opinions',
    'edition_opinions',
    'account_id',
    { edition: found('x.title', 'editions', 'edition_id'), agrees: 'agrees', line: 'line', at: 'at' },
    { key: 't.edition_id', flags: ['agrees'] },
  ),
  section(
    'watches',
    'watches',
    'account_id',
    { kind: 'subject', name: nameOfSubject, since: 'created_at' },
    { key: "CONCAT(t.subject, ' ', t.subject_id)" },
  ),
  section('notices', 'notices', 'account_id', {
    title: found('x.title', 'happenings', 'happening_id'),
    path: found('x.path', 'happenings', 'happening_id'),
    because: 'because',
    at: 'at',
    readAt: 'read_at',
  }),
  section('flags', 'flags', 'account_id', {
    about: found('x.title', 'flagged', 'flagged_id'),
    ground: 'ground',
    line: 'line',
    outcome: found('x.state', 'flagged', 'flagged_id'),
    ...createdAt,
  }),
  section('handOversOffered', 'hand_overs', 'from_id', {
    to: 'addressed_to',
    state: 'state',
    offeredAt: 'offered_at',
    endsAt: 'ends_at',
    decidedAt: 'decided_at',
  }),
  section('handOversReceived', 'hand_overs', 'to_id', {
    state: 'state',
    offeredAt: 'offered_at',
    endsAt: 'ends_at',
    decidedAt: 'decided_at',
  }),
  section('mails', 'mail_outbox', 'account_id', {
    to: 'to_address',
    subject: 'subject',
    queuedAt: 'created_at',
    sentAt: 'sent_at',
  }),
  section(
    'mailReturns',
    'mail_bounces',
    'account_id',
    { status: 'status', permanent: 'permanent', at: 'at' },
    { key: "CONCAT(t.mail_id, ' ', t.permanent)", flags: ['permanent'] },
  ),
];

/** Columns that name an account and are in no section, each with the reason. */
export const leftOut: Readonly<Record<string, string>> = {
  'account_tokens.account_id': 'single-use secrets',
  'sessions.account_id': 'secrets of a sign-in',
  'audit_log.actor_id':
    'what somebody did for the site is the record of the site; what was decided about them is in `decisions`',
  'happenings.actor_id': 'names only who did what stands in the other sections',
  'happening_people.account_id': 'only carries notices to the person',
  'digests.account_id': 'only says which notices went into one mail; those are in `notices` and `mails`',
  'desk_claims.moderator_id': 'says for a while who reads what on the desk',
  'first_posts.account_id': 'what the desk looks through stands in the other sections',
  'first_posts.decided_by': 'a decision about the work of somebody else',
  'flagged.writer_id': 'what others told the desk; what was decided is in `decisions`',
  'flagged.decided_by': 'a decision about the work of somebody else',
  'photo_looks.decided_by': 'a decision about the photo of somebody else',
  'measurements.set_aside_by': 'a decision about the reading of somebody else',
  'hardware_proposals.decided_by': 'a decision about the proposal of somebody else',
  'maker_requests.decided_by': 'a decision about the request of somebody else',
  'write_ups.created_by': 'its editions are in `editions`',
  'write_ups.withdrawn_by': 'a decision about the work of somebody else',
  'questions.taken_down_by': 'a decision about the work of somebody else',
  'question_replies.taken_down_by': 'a decision about the work of somebody else',
  'trials.taken_down_by': 'a decision about the work of somebody else',
  'fit_reports.taken_down_by': 'a decision about the work of somebody else',
  'photos.taken_down_by': 'a decision about the work of somebody else',
  'member_limits.set_by': 'a decision about somebody else',
  'member_limits.lifted_by': 'a decision about somebody else',
};
