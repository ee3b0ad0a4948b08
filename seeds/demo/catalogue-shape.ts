import type { FeatureKind, PartKind } from '../../shared/contract/vocabulary.js';

export interface DemoRevision {
  readonly label: string;
  readonly from: string | null;
  readonly to: string | null;
  readonly tell: string;
  readonly changed: string;
}

export interface DemoPart {
  readonly slug: string;
  readonly maker: string;
  readonly kind: PartKind;
  readonly name: string;
  readonly about: string;
  readonly revisions: readonly DemoRevision[];
  readonly features: readonly { readonly kind: FeatureKind; readonly name: string }[];
  readonly drawing: string;
}

/**
 * A revision on the time line. `when` is "from..to" in days (2023-04-01..2024-02-01), half-open; either end may be left
 * out where it is not known or the revision is still sold.
 */
export function revision(letter: string, when: string, tell: string, changed: string): DemoRevision {
  const [from = '', to = ''] = when.split('..');
  return { label: `Rev ${letter}`, from: from || null, to: to || null, tell, changed };
}

/** Mating features: `{ boss: 'raised lip', 'hole-pattern': ['motor holes', 'foot holes'] }`. */
export function features(
  named: Partial<Record<FeatureKind, string | readonly string[]>>,
): DemoPart['features'] {
  return Object.entries(named).flatMap(([kind, value]) =>
    (typeof value === 'string' ? [value] : value).map((name) => ({ kind: kind as FeatureKind, name })),
  );
}
