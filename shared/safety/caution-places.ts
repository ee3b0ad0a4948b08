import type { Caution } from '../contract/write-ups.js';

/** As much of an edition as places are told by; a text has it, and so has its view. */
export interface Places {
  readonly fixes: readonly { readonly key: string; readonly steps: readonly { readonly key: string }[] }[];
}

/** Where a caution stands in an edition. */
export interface CautionPlace {
  readonly fixKey: string | null;
  readonly stepKey: string | null;
}

/**
 * No edition drops a caution: where the step it was placed on is gone it stands on the fix, where the fix is gone on the
 * write-up. Should a later edition bring the step or the fix back, it stands there again.
 */
export function placeIn(content: Places, placed: CautionPlace): CautionPlace {
  const fix = content.fixes.find((each) => each.key === placed.fixKey);
  if (!fix) return { fixKey: null, stepKey: null };
  const hasStep = fix.steps.some((step) => step.key === placed.stepKey);
  return { fixKey: fix.key, stepKey: hasStep ? placed.stepKey : null };
}

/** Whether it stands further up in this edition than where it was placed. */
export function hasMovedUp(content: Places, placed: CautionPlace): boolean {
  const { fixKey, stepKey } = placeIn(content, placed);
  return fixKey !== placed.fixKey || stepKey !== placed.stepKey;
}

/** The cautions that stand at one place of an edition, in their order. */
export function cautionsAt<C extends Pick<Caution, 'fixKey' | 'stepKey'>>(
  content: Places,
  cautions: readonly C[],
  at: CautionPlace,
): C[] {
  return cautions.filter((caution) => {
    const { fixKey, stepKey } = placeIn(content, caution);
    return fixKey === at.fixKey && stepKey === at.stepKey;
  });
}
