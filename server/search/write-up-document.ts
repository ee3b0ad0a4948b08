import type { EditionContent, Fix } from '../../shared/contract/edition-content.js';
import type { PartRef, RevisionRef } from '../../shared/contract/hardware.js';
import type { SearchHit, WriteUpDocument } from '../../shared/contract/search.js';
import { afterwardsWords, partKindWords, type Standing } from '../../shared/contract/vocabulary.js';
import { markdownToPlainText } from '../../shared/text/render-markdown.js';
import { withoutHitMarks } from './hit-marks.js';
import { plainFiguresOf, wordsOfReading } from './measurement-words.js';

/** A published write-up as the database has it. */
export interface PublishedWriteUp {
  readonly id: number;
  readonly slug: string;
  readonly content: EditionContent;
  readonly publishedAt: Date;
  /** Parts of its joints in order; one that stands in several joints comes several times. */
  readonly parts: readonly PartRef[];
  readonly revisions: readonly (RevisionRef & { holds: boolean })[];
  readonly symptoms: readonly { slug: string; label: string }[];
  /** By the key of the fix. */
  readonly standings: ReadonlyMap<string, Standing>;
  readonly photo: (Omit<NonNullable<SearchHit['photo']>, 'alt'> & { alt: string }) | undefined;
}

/** The document of one write-up: its words in plain text, what it can be filtered by, and what a result line shows. */
export function writeUpDocument(writeUp: PublishedWriteUp): WriteUpDocument {
  const { content } = writeUp;
  const parts = [...new Map(writeUp.parts.map((part) => [part.id, part])).values()];
  const fixes = cardFixes(content.fixes, writeUp.standings);
  const noticed = words(content.noticed);
  const cause = words(content.cause);
  const fixText = content.fixes.map(wordsOfFix).join('\n');
  const summary = withoutHitMarks(content.summary);
  return {
    id: writeUp.id,
    slug: writeUp.slug,
    title: withoutHitMarks(content.title),
    symptoms: writeUp.symptoms.map((symptom) => symptom.label),
    noticed,
    summary,
    parts: parts.map((part) => wordsOfPart(part, writeUp.revisions)),
    fixTitles: content.fixes.map((fix) => withoutHitMarks(fix.title)),
    measured: wordsOfMeasures(content, [content.title, summary, noticed, cause, fixText].join('\n')),
    cause,
    fixText,
    symptomSlugs: writeUp.symptoms.map((symptom) => symptom.slug),
    partSlugs: parts.map((part) => part.slug),
    revisionIds: writeUp.revisions.filter((revision) => revision.holds).map((revision) => revision.id),
    notRevisionIds: writeUp.revisions.filter((revision) => !revision.holds).map((revision) => revision.id),
    partIds: parts.map((part) => part.id),
    permanence: [...new Set(fixes.map((fix) => fix.permanence))],
    standing: [...new Set(fixes.map((fix) => fix.standing))],
    kind: [...new Set(fixes.map((fix) => fix.kind))],
    publishedAt: writeUp.publishedAt.getTime(),
    card: {
      sides: parts.map((part) => sideOf(part, writeUp.revisions)),
      symptoms: writeUp.symptoms.map((symptom) => symptom.label),
      fixes,
      photo: cardPhoto(writeUp),
      publishedAt: writeUp.publishedAt.toISOString(),
    },
  };
}

function words(markdown: string): string {
  return withoutHitMarks(markdownToPlainText(markdown));
}

function wordsOfPart(part: PartRef, revisions: PublishedWriteUp['revisions']): string {
  const labels = revisions
    .filter((revision) => revision.partId === part.id)
    .map((revision) => revision.label);
  return [part.maker.name, part.name, partKindWords[part.kind], ...labels].join(' ');
}

function wordsOfFix(fix: Fix): string {
  const afterwards = fix.afterwards.map((what) => afterwardsWords[what]);
  return [
    words(fix.why),
    ...fix.steps.map((step) => words(step.text)),
    [...fix.tools, ...fix.materials, ...afterwards].join(', '),
    fix.afterwardsNote,
  ]
    .map(withoutHitMarks)
    .filter(Boolean)
    .join('\n');
}

function wordsOfMeasures(content: EditionContent, prose: string): string {
  const features = content.joints.flatMap((joint) => [joint.a.feature, joint.b.feature]).filter(Boolean);
  return withoutHitMarks(
    [...new Set([...features, ...content.readings.map(wordsOfReading), ...plainFiguresOf(prose)])].join('; '),
  );
}

function cardFixes(fixes: readonly Fix[], standings: ReadonlyMap<string, Standing>): SearchHit['fixes'] {
  return fixes.flatMap(({ key, title, kind, permanence }) =>
    kind && permanence ? [{ title, kind, permanence, standing: standings.get(key) ?? 'told' }] : [],
  );
}

function sideOf(part: PartRef, revisions: PublishedWriteUp['revisions']): SearchHit['sides'][number] {
  const own = revisions.filter((revision) => revision.partId === part.id);
  const refs = (holds: boolean): RevisionRef[] =>
    own
      .filter((revision) => revision.holds === holds)
      .map(({ id, partId, label }) => ({ id, partId, label }));
  return { part, holdsFor: refs(true), notFor: refs(false) };
}

function cardPhoto({ content, photo }: PublishedWriteUp): SearchHit['photo'] {
  if (!photo) return null;
  const { hash, placeholder, width, height, widths } = photo;
  return { hash, alt: content.photos[0]?.alt || photo.alt, placeholder, width, height, widths };
}
