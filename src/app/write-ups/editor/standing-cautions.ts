import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import type { EditionContent } from '../../../../shared/contract/edition-content';
import { writeUpRoutes, type Caution } from '../../../../shared/contract/write-ups';
import { placeIn } from '../../../../shared/safety/caution-places';
import { Api } from '../../core/api';
import { loadEach } from '../../core/load';
import { CautionBox } from '../../ui/caution-box/caution-box';

/** The cautions that the desk has placed on this write-up, as they stand over what is written now. They cannot be changed here. */
@Component({
  selector: 'sl-standing-cautions',
  imports: [CautionBox],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (standing().length) {
      <section aria-labelledby="standing-cautions">
        <h2 id="standing-cautions">Cautions that stand</h2>
        <p class="sl-quiet sl-narrow">
          The desk has placed them, and they stay whatever you write. Where you take a step or a fix away, its
          caution moves up to the fix or the write-up, and the desk is told.
        </p>
        @for (one of standing(); track one.caution.id) {
          <p class="where">above {{ one.where }}</p>
          <sl-caution-box [caution]="one.caution" />
        }
      </section>
    }
  `,
  styles: `
    section {
      border-block-start: 1px solid var(--sl-ink);
      padding-block-start: 0.75rem;
      margin-block-start: 2.5rem;
      max-inline-size: var(--sl-measure);
    }
    h2 {
      margin-block-start: 0;
    }
    .where {
      margin: 0.75rem 0 -0.5rem;
      color: var(--sl-quiet);
    }
  `,
})
export class StandingCautions {
  readonly draftId = input.required<number>();
  /** What is in the form now. */
  readonly content = input.required<Pick<EditionContent, 'fixes'>>();
  private readonly api = inject(Api);
  private readonly loaded = loadEach(toObservable(this.draftId), (id) =>
    this.api.call(writeUpRoutes.listDraftCautions, { params: { id } }),
  );
  protected readonly standing = computed(() => {
    const now = this.loaded();
    const cautions = now.state === 'ready' ? now.value.items : [];
    return cautions.map((caution) => ({ caution, where: this.whereOf(caution) }));
  });

  private whereOf(caution: Caution): string {
    const { fixes } = this.content();
    const { fixKey, stepKey } = placeIn(this.content(), caution);
    const fix = fixes.find((each) => each.key === fixKey);
    if (!fix) return 'the whole write-up';
    const step = fix.steps.findIndex((each) => each.key === stepKey) + 1;
    const name = `“${fix.title || 'a fix not named yet'}”`;
    return step > 0 ? `step ${step} of ${name}` : name;
  }
}
