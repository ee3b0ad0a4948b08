import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { missingFromContent } from '../shared/contract/edition-completeness.js';
import { EditionContent } from '../shared/contract/edition-content.js';
import { FeatureKind, FixKind, HazardKind, PartKind, Permanence } from '../shared/contract/vocabulary.js';
import { answerHazards, findHazards } from '../shared/safety/hazards.js';
import { demoAccounts, demoMembers } from './demo/accounts.js';
import { demoCautionLibrary } from './demo/caution-library.js';
import { demoMakers } from './demo/makers.js';
import { demoParts } from './demo/parts.js';
import { libraryEntry, planCautions } from './demo/plan-cautions.js';
import { resolveContent } from './demo/resolve-content.js';
import { slugOf } from './demo/slug.js';
import { demoSymptoms } from './demo/symptoms.js';
import { demoWriteUps } from './demo/write-ups.js';
import type { DemoContent, DemoWriteUp } from './demo/write-up-shape.js';

/** Every edition of a write-up with its state, the first one first. */
function editionsOf(writeUp: DemoWriteUp): { state: string; told: DemoContent }[] {
  const editions = [{ state: writeUp.state as string, told: writeUp.content }];
  for (const later of writeUp.later)
    editions.push({ state: later.state, told: later.change(editions.at(-1)!.told) });
  return editions;
}

/** Identities as the database would give them: resolving throws for anything the catalogue lacks. */
function resolve(told: DemoContent): EditionContent {
  const numbered = (keys: string[]): Map<string, number> =>
    new Map(keys.map((key, index) => [key, index + 1]));
  const revisions = demoParts.flatMap((part) =>
    part.revisions.map(({ label }) => `${part.slug}:${label.replace('Rev ', '')}`),
  );
  const catalogue = {
    parts: numbered(demoParts.map((part) => part.slug)),
    revisions: numbered(revisions),
    features: numbered([]),
    symptoms: numbered(demoSymptoms.map((item) => item.slug)),
    cautions: numbered(demoCautionLibrary.map((item) => item.slug)),
  };
  return resolveContent(told, catalogue, numbered(told.drawings.map((item) => item.svg)));
}

const published = demoWriteUps.filter((writeUp) => writeUp.state === 'published');
const everyEdition = demoWriteUps.flatMap((writeUp) =>
  editionsOf(writeUp).map((item) => ({ ...item, name: item.told.title || 'an untitled draft' })),
);

describe('the demo', () => {
  it('has makers, parts and revisions for every page, each slug once', () => {
    expect(demoMakers.length).toBeGreaterThanOrEqual(12);
    expect(demoParts.length).toBeGreaterThanOrEqual(40);
    expect(demoParts.flatMap((part) => part.revisions).length).toBeGreaterThanOrEqual(110);
    for (const slugs of [demoMakers, demoParts, demoSymptoms, demoCautionLibrary].map((list) =>
      list.map((item) => item.slug),
    )) {
      expect(new Set(slugs).size).toBe(slugs.length);
    }
  });

  it('uses every kind of part, feature, fix and permanence', () => {
    const fixes = published.flatMap((writeUp) => editionsOf(writeUp).flatMap((item) => item.told.fixes));
    expect(new Set(demoParts.map((part) => part.kind))).toEqual(new Set(PartKind.options));
    expect(new Set(demoParts.flatMap((part) => part.features.map((item) => item.kind)))).toEqual(
      new Set(FeatureKind.options),
    );
    expect(new Set(fixes.map((item) => item.kind))).toEqual(new Set(FixKind.options));
    expect(new Set(fixes.map((item) => item.permanence))).toEqual(new Set(Permanence.options));
    expect(new Set(demoCautionLibrary.flatMap((item) => item.hazards))).toEqual(new Set(HazardKind.options));
  });

  it('names a maker that exists for every part, and its revisions follow each other without overlap', () => {
    const makers = new Set(demoMakers.map((maker) => maker.slug));
    for (const part of demoParts) {
      expect(makers, part.slug).toContain(part.maker);
      part.revisions.slice(1).forEach((revision, index) => {
        expect(revision.from! >= part.revisions[index]!.to!, `${part.slug} ${revision.label}`).toBe(true);
      });
    }
  });

  it('has at least 60 published write-ups, eight of them with two to four published editions', () => {
    const counts = published.map(
      (writeUp) => editionsOf(writeUp).filter((item) => item.state === 'published').length,
    );
    expect(published.length).toBeGreaterThanOrEqual(60);
    expect(counts.filter((count) => count >= 2 && count <= 4).length).toBeGreaterThanOrEqual(8);
  });

  it.each(published.map((writeUp) => [writeUp.slug, writeUp] as const))(
    'gives %s the slug of its first title',
    (slug, writeUp) => {
      expect(slug).toBe(slugOf(writeUp.content.title));
    },
  );

  it.each(everyEdition.map((item) => [item.name, item.state, item.told] as const))(
    'keeps the contract in “%s” (%s)',
    (_name, state, told) => {
      const content = EditionContent.parse(resolve(told));
      if (state !== 'draft') expect(missingFromContent(content)).toEqual([]);
    },
  );

  it('marks every write-up’s next edition as different from the one before', () => {
    for (const writeUp of demoWriteUps) {
      const editions = editionsOf(writeUp).map((item) => JSON.stringify(resolve(item.told)));
      expect(new Set(editions).size, writeUp.content.title).toBe(editions.length);
    }
  });

  it.each(published.map((writeUp) => [writeUp.slug, writeUp] as const))(
    'answers every hazard that %s names by a caution',
    (_slug, writeUp) => {
      const editions = editionsOf(writeUp)
        .filter((item) => item.state === 'published')
        .map((item) => ({ told: item.told, content: resolve(item.told) }));
      const plan = planCautions(writeUp.cautions, editions);
      const standing = plan
        .flat()
        .map(({ slug, ...at }) => ({ ...at, hazards: [...libraryEntry(slug).hazards] }));
      expect(
        answerHazards(findHazards(editions.at(-1)!.content), standing).filter((hazard) => !hazard.answered),
      ).toEqual([]);
    },
  );

  it('puts a first edition on the desk that names a rotary tool and has no caution', () => {
    const waiting = demoWriteUps
      .filter((writeUp) => writeUp.state === 'submitted')
      .map((writeUp) => resolve(writeUp.content));
    expect(
      waiting.some((content) => findHazards(content).some((hazard) => hazard.hazard === 'power-tool')),
    ).toBe(true);
  });

  it('has an account for each role, with addresses of its own and passwords of at least twelve characters', () => {
    const everyone = [...demoAccounts, ...demoMembers];
    expect(new Set(demoAccounts.map((account) => account.role))).toEqual(
      new Set(['member', 'maker', 'moderator', 'administrator']),
    );
    expect(new Set(everyone.map((account) => account.email)).size).toBe(everyone.length);
    expect(
      everyone.every(
        (account) => account.password.length >= 12 && account.email.endsWith('@shimlore.example'),
      ),
    ).toBe(true);
  });
});

describe('the judged queries', () => {
  const queries = JSON.parse(
    readFileSync(new URL('../search-fixtures/queries.json', import.meta.url), 'utf8'),
  ) as {
    query: string;
    results: Record<string, number>;
  }[];
  const slugs = new Set(published.map((writeUp) => writeUp.slug));

  it('are at least sixty, each asked once', () => {
    expect(queries.length).toBeGreaterThanOrEqual(60);
    expect(new Set(queries.map((item) => item.query)).size).toBe(queries.length);
  });

  it.each(queries.map((item) => [item.query, item.results] as const))(
    'grade published write-ups from 1 to 3 for “%s”',
    (_query, results) => {
      expect(Object.keys(results).filter((slug) => !slugs.has(slug))).toEqual([]);
      expect(Object.values(results).filter((grade) => ![1, 2, 3].includes(grade))).toEqual([]);
      expect(Object.values(results)).toContain(3);
    },
  );
});
