import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import { editionLinks } from '../../server/write-ups/edition-links.js';
import { standingOf } from '../../shared/fit/standing.js';
import { idsFrom, insertRows } from './ids.js';
import { type PlannedCaution, libraryEntry, planCautions } from './plan-cautions.js';
import { type PhotoIds, resolveContent } from './resolve-content.js';
import { type Catalogue, known } from './seed-catalogue.js';
import { seededNumbers } from './random.js';
import { planTrials } from './trials.js';
import { demoWriteUps } from './write-ups.js';
import type { DemoContent, DemoEdition, DemoWriteUp } from './write-up-shape.js';

const day = 86_400_000;
const hour = 3_600_000;

interface Rows {
  writeUps: object[];
  publishedEditions: { id: number; edition: number }[];
  editions: object[];
  sides: object[];
  revisions: object[];
  symptoms: object[];
  photos: object[];
  fixes: object[];
  editionFixes: object[];
  fixRevisions: object[];
  cautions: object[];
  trials: object[];
  trialRevisions: object[];
  audit: object[];
  outbox: object[];
}

/** Inserts write-ups with editions, links, fixes, cautions, trials, audit entries and the rows that have them indexed. */
export async function seedWriteUps(
  trx: Knex,
  parts: { accounts: ReadonlyMap<string, number>; catalogue: Catalogue; photos: PhotoIds; now: Date },
): Promise<void> {
  const { accounts, catalogue, photos, now } = parts;
  const [writeUpId, editionId, fixId, trialId, cautionId] = (await Promise.all(
    ['write_ups', 'editions', 'fixes', 'trials', 'cautions'].map((table) => idsFrom(trx, table)),
  )) as [() => number, () => number, () => number, () => number, () => number];
  const rows: Rows = {
    writeUps: [],
    publishedEditions: [],
    editions: [],
    sides: [],
    revisions: [],
    symptoms: [],
    photos: [],
    fixes: [],
    editionFixes: [],
    fixRevisions: [],
    cautions: [],
    trials: [],
    trialRevisions: [],
    audit: [],
    outbox: [],
  };
  const next = seededNumbers(60);
  const moderator = known(accounts, 'moderator');

  for (const writeUp of demoWriteUps) {
    const id = writeUpId();
    const fixIds = new Map<string, number>();
    const editions = editionsOf(writeUp);
    const first = editions[0]!;
    const published = editions.filter((item) => item.state === 'published');
    const cautions = planCautions(
      writeUp.cautions,
      published.map((item) => ({
        content: resolveContent(item.content, catalogue, photos),
        told: item.content,
      })),
    );
    const created = new Date(now.getTime() - first.daysAgo * day - 9 * day);
    const firstPublished = published.length > 0 ? instant(first) : null;
    rows.writeUps.push({
      id,
      slug: writeUp.slug,
      created_by: known(accounts, first.by),
      published_edition_id: null,
      first_published_at: firstPublished,
      created_at: created,
    });
    editions.forEach((item, index) => addEdition(item, index + 1));
    if (published.length > 0) {
      rows.outbox.push({ write_up_id: id, created_at: now, attempts: 0, next_try_at: now });
      addFixes(published.at(-1)!);
    }

    function addEdition(item: PlannedEdition, number: number): void {
      const edition_id = editionId();
      const content = resolveContent(item.content, catalogue, photos);
      const at = instant(item);
      const waits = item.state === 'submitted' || item.state === 'returned' || item.state === 'published';
      const submitted = waits ? new Date(at.getTime() - 30 * hour) : null;
      rows.editions.push({
        id: edition_id,
        write_up_id: id,
        number,
        state: item.state,
        author_id: known(accounts, item.by),
        base_edition_id: rows.publishedEditions.find((entry) => entry.id === id)?.edition ?? null,
        title: content.title,
        content: JSON.stringify(content),
        change_note: item.note,
        version: 2 + (number % 5),
        return_reason: item.returnReason,
        created_at: new Date(at.getTime() - 6 * day),
        updated_at: at,
        submitted_at: submitted,
        published_at: item.state === 'published' ? at : null,
      });
      if (item.state === 'published') {
        addLinks(edition_id, content);
        rows.publishedEditions = rows.publishedEditions
          .filter((entry) => entry.id !== id)
          .concat({ id, edition: edition_id });
        addCautions(cautions[number - 1] ?? [], new Date(at.getTime() - hour));
        rows.audit.push({
          at,
          actor_id: moderator,
          action: 'edition-published',
          subject_kind: 'edition',
          subject_id: edition_id,
          subject_name: item.content.title,
          reason: '',
        });
      }
      if (item.state === 'returned') {
        rows.audit.push({
          at,
          actor_id: moderator,
          action: 'edition-returned',
          subject_kind: 'edition',
          subject_id: edition_id,
          subject_name: item.content.title,
          reason: item.returnReason ?? '',
        });
      }
    }

    function addLinks(edition_id: number, content: EditionContent): void {
      const links = editionLinks(content);
      rows.sides.push(
        ...links.sides.map((item) => ({
          edition_id,
          joint: item.joint,
          side: item.side,
          part_id: item.partId,
        })),
      );
      rows.revisions.push(
        ...links.revisions.map((item) => ({ edition_id, revision_id: item.revisionId, holds: item.holds })),
      );
      rows.symptoms.push(
        ...links.symptomSlugs.map((slug) => ({ edition_id, symptom_id: known(catalogue.symptoms, slug) })),
      );
      rows.photos.push(...links.photoIds.map((photo_id) => ({ edition_id, photo_id })));
      for (const item of links.fixes) {
        const fix_id = fixIds.get(item.key) ?? fixId();
        fixIds.set(item.key, fix_id);
        rows.editionFixes.push({ edition_id, fix_id, position: item.position });
        rows.fixRevisions.push(
          ...item.revisionIds.map((revision_id) => ({ edition_id, fix_id, revision_id })),
        );
      }
    }

    function addCautions(planned: readonly PlannedCaution[], at: Date): void {
      for (const { slug, fixKey, stepKey } of planned) {
        const entry = libraryEntry(slug);
        const caution_id = cautionId();
        rows.cautions.push({
          id: caution_id,
          write_up_id: id,
          fix_id: fixKey === null ? null : known(fixIds, fixKey),
          step_key: stepKey,
          library_id: known(catalogue.cautions, slug),
          signal_word: entry.signalWord,
          hazards: JSON.stringify(entry.hazards),
          hazard: entry.hazard,
          consequence: entry.consequence,
          avoidance: entry.avoidance,
          placed_by: moderator,
          placed_at: at,
        });
        rows.audit.push({
          at,
          actor_id: moderator,
          action: 'caution-placed',
          subject_kind: 'caution',
          subject_id: caution_id,
          subject_name: entry.hazard,
          reason: '',
          details: JSON.stringify({ writeUpId: id, fixKey, ...(stepKey === null ? {} : { stepKey }) }),
        });
      }
    }

    function addFixes(latest: PlannedEdition): void {
      const authors = new Set(published.map((item) => item.by));
      const people = [...accounts]
        .filter(([key]) => !authors.has(key) && !['moderator', 'administrator', 'maker'].includes(key))
        .map(([, account]) => account);
      const everyFix = new Map(
        published.flatMap((item) => item.content.fixes).map((entry) => [entry.key, entry]),
      );
      for (const [key, fix_id] of fixIds) {
        const entry = everyFix.get(key)!;
        const trials = planTrials({
          fix: entry,
          content: latest.content,
          people,
          since: instant(first),
          now,
          next,
        });
        for (const planned of trials) {
          const trial_id = trialId();
          rows.trials.push({
            id: trial_id,
            fix_id,
            account_id: planned.accountId,
            outcome: planned.outcome,
            note: planned.note,
            figure: planned.figure,
            worksheet: planned.worksheet && JSON.stringify(planned.worksheet),
            created_at: planned.createdAt,
          });
          rows.trialRevisions.push(
            ...planned.revisions.map((revision) => ({
              trial_id,
              revision_id: known(catalogue.revisions, revision),
            })),
          );
        }
        rows.fixes.push({
          id: fix_id,
          write_up_id: id,
          fix_key: key,
          standing: standingOf(
            trials.map((planned) => ({ ...planned, byAuthor: false })),
            entry.acceptance,
            entry.madeRight !== null,
          ),
          made_right_from: entry.madeRight === null ? null : known(catalogue.revisions, entry.madeRight),
        });
      }
    }

    function instant(item: PlannedEdition): Date {
      return new Date(now.getTime() - item.daysAgo * day - ((item.daysAgo * 7) % 13) * hour);
    }
  }
  await insertAll(trx, rows);
}

type PlannedEdition = Omit<DemoEdition, 'change'> & { readonly content: DemoContent };

function editionsOf(writeUp: DemoWriteUp): PlannedEdition[] {
  const { by, daysAgo, state, returnReason, content } = writeUp;
  const editions: PlannedEdition[] = [{ by, daysAgo, state, returnReason, content, note: '' }];
  for (const { change, ...rest } of writeUp.later)
    editions.push({ ...rest, content: change(editions.at(-1)!.content) });
  return editions;
}

async function insertAll(trx: Knex, rows: Rows): Promise<void> {
  await insertRows(trx, 'write_ups', rows.writeUps);
  await insertRows(trx, 'editions', rows.editions);
  await trx('write_ups')
    .whereIn(
      'id',
      rows.publishedEditions.map((entry) => entry.id),
    )
    .update({
      published_edition_id: trx('editions')
        .where('write_up_id', trx.ref('write_ups.id'))
        .where('state', 'published')
        .max('id'),
    });
  await insertRows(trx, 'edition_sides', rows.sides);
  await insertRows(trx, 'edition_revisions', rows.revisions);
  await insertRows(trx, 'edition_symptoms', rows.symptoms);
  await insertRows(trx, 'edition_photos', rows.photos);
  await insertRows(trx, 'fixes', rows.fixes);
  await insertRows(trx, 'edition_fixes', rows.editionFixes);
  await insertRows(trx, 'edition_fix_revisions', rows.fixRevisions);
  await insertRows(trx, 'cautions', rows.cautions);
  await insertRows(trx, 'trials', rows.trials);
  await insertRows(trx, 'trial_revisions', rows.trialRevisions);
  await insertRows(trx, 'audit_log', rows.audit);
  await insertRows(trx, 'search_outbox', rows.outbox);
}
