import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { HazardKind } from '../../shared/contract/vocabulary.js';
import type { FoundHazard } from '../../shared/contract/moderation.js';
import { answerHazards, findHazards } from '../../shared/safety/hazards.js';
import { demoCautionLibrary } from './caution-library.js';
import type { DemoContent } from './write-up-shape.js';

export interface PlannedCaution {
  readonly slug: string;
  /** Null: on the whole write-up. */
  readonly fixKey: string | null;
  /** Null: on all of the fix. */
  readonly stepKey: string | null;
}

/** What a moderator takes from the library for a hazard that nothing answers yet. */
const usual: Record<HazardKind, string> = {
  blade: 'blade',
  'power-tool': 'rotary-tool',
  dust: 'dust',
  solvent: 'solvent',
  adhesive: 'epoxy',
  heat: 'heat',
  'lithium-cell': 'lithium',
  mains: 'mains',
  sun: 'sun',
  'swarf-near-optics': 'swarf',
  pinch: 'pinch',
  magnet: 'magnet',
};

export const libraryEntry = (slug: string) => {
  const entry = demoCautionLibrary.find((caution) => caution.slug === slug);
  if (!entry) throw new Error(`The caution library has no “${slug}”.`);
  return entry;
};

/**
 * The cautions that a moderator places before each published edition, edition by edition: those the demo names for the
 * write-up and its new fixes, then the usual one for every hazard that the rules find unanswered.
 */
export function planCautions(
  forWriteUp: readonly string[],
  editions: readonly { readonly content: EditionContent; readonly told: DemoContent }[],
): PlannedCaution[][] {
  const placed: PlannedCaution[] = [];
  const seen = new Set<string>();
  return editions.map(({ content, told }, index) => {
    const before = placed.length;
    const place = (slug: string, fixKey: string | null, stepKey: string | null = null): void => {
      const same = (item: PlannedCaution): boolean =>
        item.slug === slug && item.fixKey === fixKey && item.stepKey === stepKey;
      if (!placed.some(same)) placed.push({ slug, fixKey, stepKey });
    };
    const open = (): FoundHazard[] =>
      answerHazards(
        findHazards(content),
        placed.map(({ slug, ...at }) => ({ ...at, hazards: [...libraryEntry(slug).hazards] })),
      ).filter((item) => !item.answered);
    if (index === 0) forWriteUp.forEach((slug) => place(slug, null));
    for (const fix of told.fixes.filter((item) => !seen.has(item.key))) {
      seen.add(fix.key);
      fix.cautions.forEach((slug) => place(slug, fix.key));
    }
    for (let left = open(); left.length > 0; left = open()) {
      const [first] = left as [FoundHazard];
      const alike = left.filter((item) => item.hazard === first.hazard && item.fixKey === first.fixKey);
      // One step alone names it: above that step, else above all of the fix.
      place(usual[first.hazard], first.fixKey, alike.length === 1 ? first.stepKey : null);
    }
    return placed.slice(before);
  });
}
