import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import { worksheetAddress, figureIn } from '../../../../shared/contract/worksheet-address';
import type { ShimInputs, WorksheetRecord } from '../../../../shared/contract/worksheet';
import { piecesText, runShim } from '../../../../shared/fit/worksheet-shim';
import { runWorksheet } from '../../../../shared/fit/worksheet';

const shown = 3;

/** How the author sized the fix, and for a shim the same with the reader's own gap. */
@Component({
  selector: 'sl-attached-worksheet',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h4>Worked out</h4>
    <p>
      {{ record().result.sentence }}
      @if (differs()) {
        <b>It comes out otherwise by now: open it to see how.</b>
      }
    </p>
    @if (shim(); as author) {
      <div class="own sl-off-paper">
        <label>
          Your gap
          <span
            ><input
              #field
              class="sl-field"
              type="text"
              inputmode="decimal"
              maxlength="12"
              [value]="typed()"
              (input)="typed.set(field.value)"
            />
            {{ author.unit === 'in' ? 'in' : 'mm' }}</span
          >
        </label>
        <div role="status">
          @if (refused(); as refused) {
            <p>{{ refused }}</p>
          } @else if (mine().length) {
            <p>For your gap, the best first:</p>
            <ol>
              @for (stack of mine(); track $index) {
                <li>
                  {{ stack.names }} <b class="sl-measured">{{ stack.thickness }} mm</b>
                </li>
              }
            </ol>
          }
        </div>
      </div>
    }
    <p class="sl-off-paper"><a [href]="address()">Open the worksheet with these figures</a></p>
  `,
  styles: `
    :host {
      display: block;
      border-inline-start: 3px solid var(--sl-brass-line);
      padding-inline-start: 1rem;
      margin-block: 1rem;
    }
    .own {
      display: flex;
      flex-wrap: wrap;
      gap: 0.5rem 2rem;
      margin-block-end: 0.5rem;
    }
    label {
      display: grid;
      font-weight: 600;
      align-content: start;
    }
    input {
      inline-size: 7rem;
      font-family: var(--sl-mono);
    }
    ol {
      margin: 0;
      padding-inline-start: 1.25rem;
    }
    .own p {
      margin: 0;
    }
  `,
})
export class AttachedWorksheet {
  readonly record = input.required<WorksheetRecord>();

  protected readonly shim = computed((): ShimInputs | null => {
    const record = this.record();
    return record.kind === 'shim' ? record.inputs : null;
  });
  /** The reader's gap as typed; starts as the author's. */
  protected readonly typed = linkedSignal(() => String(this.shim()?.gap ?? ''));
  // A stack of many pieces takes long to find, which no page that is being rendered may wait for.
  protected readonly differs = computed(
    () => this.record().kind !== 'shim' && runWorksheet(this.record()).differs,
  );
  private readonly own = computed((): ShimInputs | null => {
    const author = this.shim();
    const gap = figureIn(this.typed());
    if (!author || this.typed().trim() === '' || gap === author.gap) return null;
    // The author's choice of stack belongs to the author's gap.
    return { ...author, gap: gap !== null && Number.isFinite(gap) ? gap : null, chosen: '' };
  });
  private readonly run = computed(() => {
    const own = this.own();
    return own && runShim(own);
  });
  protected readonly refused = computed(() => {
    const run = this.run();
    if (!run || run.result) return null;
    return run.problems[0]?.message ?? 'A gap in figures, please, such as 1.52.';
  });
  protected readonly mine = computed(() =>
    (this.run()?.result?.lines ?? []).slice(0, shown).map(({ stack }) => ({
      names: piecesText(stack),
      thickness: stack.thickness.toFixed(2),
    })),
  );
  protected readonly address = computed(() => {
    const record = this.record();
    return worksheetAddress(record.kind, this.own() ?? record.inputs);
  });
}
