import type { TellingDimension, TellingMark, WhichOne } from '../../../../shared/contract/which-one';
import { dimensionSpec, type DimensionSpec } from '../../../../shared/fit/feature-dimensions';
import { usualUncertainty } from '../../../../shared/fit/instruments';
import type { RevisionKnowledge } from '../../../../shared/fit/which-revision';

/** A question as it is put to the reader. */
export type Question =
  | { readonly kind: 'mark'; readonly key: string; readonly mark: TellingMark }
  | {
      readonly kind: 'reading';
      readonly key: string;
      readonly dimension: TellingDimension;
      readonly spec: DimensionSpec;
    };

/** Every question that the catalogue knows for the part, marks first; keys are unique within the part. */
export function questionsOf({ marks, dimensions }: Pick<WhichOne, 'marks' | 'dimensions'>): Question[] {
  return [
    ...marks.map((mark) => ({ kind: 'mark' as const, key: `mark-${mark.id}`, mark })),
    ...dimensions.flatMap((dimension) => {
      const spec = dimensionSpec(dimension.feature.kind, dimension.dimension);
      const key = `dimension-${dimension.feature.id}-${dimension.dimension}`;
      return spec ? [{ kind: 'reading' as const, key, dimension, spec }] : [];
    }),
  ];
}

/** The same as shared/fit/which-revision.ts takes it; readings are weighed as a caliper's. */
export function knowledgeOf(told: WhichOne, questions: readonly Question[]): RevisionKnowledge {
  return {
    asOf: told.asOf,
    revisions: told.revisions,
    marks: questions.flatMap((question) =>
      question.kind === 'mark' ? [{ key: question.key, revisions: question.mark.revisions }] : [],
    ),
    dimensions: questions.flatMap((question) =>
      question.kind === 'reading'
        ? [
            {
              key: question.key,
              usualUncertainty: usualUncertainty('caliper', question.spec.unit),
              revisions: question.dimension.revisions,
            },
          ]
        : [],
    ),
  };
}

/** A chance in whole percent; what is not quite certain or impossible is not shown as if it were. */
export function percentOf(chance: number): string {
  if (chance > 0.99 && chance < 1) return 'over 99 %';
  if (chance > 0 && chance < 0.01) return 'under 1 %';
  return `${Math.round(chance * 100)} %`;
}
