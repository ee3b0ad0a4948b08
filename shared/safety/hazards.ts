import type { EditionContent, Fix } from '../contract/edition-content.js';
import type { FoundHazard } from '../contract/moderation.js';
import type { HazardKind } from '../contract/vocabulary.js';
import type { Caution } from '../contract/write-ups.js';
import { hazardRules } from './hazard-rules.js';

/** A hazard that a text names; not yet said whether a caution answers it. */
export type NamedHazard = Omit<FoundHazard, 'answered'>;

interface Piece {
  readonly text: string;
  readonly isTool: boolean;
}

const rules = hazardRules.map((rule) => ({
  ...rule,
  words: wholeWords(rule.words, 'giu'),
  beside: rule.beside === undefined ? null : wholeWords(rule.beside, 'iu'),
}));

/**
 * The hazards that an edition's texts name, by the list in hazard-rules.ts: those of the write-up's own text first, then
 * fix by fix, those of all of a fix before those of its steps, with the words that gave each away. Read are titles, summary,
 * what is noticed, cause and photo texts of the write-up, and title, why, tools, materials, notes and steps of each fix; sources
 * are not. O(text × rules).
 */
export function findHazards(content: EditionContent): NamedHazard[] {
  const own = find(ownPieces(content)).map(([hazard, words]) => ({
    hazard,
    fixKey: null,
    fixTitle: null,
    stepKey: null,
    step: null,
    words,
  }));
  return [...own, ...content.fixes.flatMap(hazardsOfFix)];
}

function hazardsOfFix(fix: Fix): NamedHazard[] {
  const at = { fixKey: fix.key, fixTitle: fix.title };
  const whole = find(fixPieces(fix)).map(([hazard, words]) => ({
    hazard,
    ...at,
    stepKey: null,
    step: null,
    words,
  }));
  const inSteps = fix.steps.flatMap((step, index) =>
    find(plain([step.text])).map(([hazard, words]) => ({
      hazard,
      ...at,
      stepKey: step.key,
      step: index + 1,
      words,
    })),
  );
  return [...whole, ...inSteps];
}

/** Where a caution was placed, and what it answers. */
export type Answer = Pick<Caution, 'fixKey' | 'stepKey' | 'hazards'>;

/**
 * Says of each hazard whether a caution answers it: one that lists the hazard and was placed on the same step, on all of
 * its fix or on the whole write-up. One whose step or fix is gone stands further up, but answers for nothing there until the
 * desk has looked at it. Pass only cautions that have not been taken off.
 */
export function answerHazards(found: readonly NamedHazard[], cautions: readonly Answer[]): FoundHazard[] {
  return found.map((named) => ({
    ...named,
    answered: cautions.some((caution) => caution.hazards.includes(named.hazard) && covers(caution, named)),
  }));
}

function covers(caution: Answer, { fixKey, stepKey }: NamedHazard): boolean {
  if (caution.fixKey === null) return true;
  if (caution.fixKey !== fixKey) return false;
  return caution.stepKey === null || caution.stepKey === stepKey;
}

function ownPieces(content: EditionContent): Piece[] {
  return plain([
    content.title,
    content.summary,
    ...content.noticed.split(/\n{2,}/),
    ...content.cause.split(/\n{2,}/),
    ...content.photos.flatMap((use) => [use.alt, use.caption]),
  ]);
}

function fixPieces(fix: Fix): Piece[] {
  return [
    ...plain([fix.title, ...fix.why.split(/\n{2,}/)]),
    ...fix.tools.map((text) => ({ text, isTool: true })),
    ...plain([...fix.materials, fix.afterwardsNote]),
  ];
}

function plain(texts: readonly string[]): Piece[] {
  return texts.map((text) => ({ text, isTool: false }));
}

function find(pieces: readonly Piece[]): [HazardKind, string[]][] {
  const found = new Map<HazardKind, Set<string>>();
  for (const { text, isTool } of pieces) {
    for (const rule of rules) {
      if (rule.toolsOnly && !isTool) continue;
      const hits = text.match(rule.words);
      if (!hits || (rule.beside && !rule.beside.test(text))) continue;
      const words = found.get(rule.hazard) ?? new Set();
      for (const hit of hits) words.add(hit.toLowerCase().replace(/\s+/g, ' '));
      found.set(rule.hazard, words);
    }
  }
  return [...found].map(([hazard, words]) => [hazard, [...words]]);
}

/** Letters and digits on neither side, in any script; emphasis and quotes round a word do not hide it. */
function wholeWords(source: string, flags: string): RegExp {
  return new RegExp(String.raw`(?<![\p{L}\p{N}])${source}(?![\p{L}\p{N}])`, flags);
}
