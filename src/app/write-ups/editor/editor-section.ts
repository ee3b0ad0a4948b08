import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { FieldProblem } from '../../../../shared/contract/problem';
import { DraftEditing } from './draft-editing';

/** One section of the form; it folds, and says how much in it is missing or could not be saved. */
@Component({
  selector: 'sl-editor-section',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details open>
      <summary>
        <h2>{{ heading() }}</h2>
        <span class="state">{{ state() }}</span>
      </summary>
      <div class="fields"><ng-content /></div>
    </details>
  `,
  styles: `
    :host {
      display: block;
      border-block-start: 1px solid var(--sl-ink);
    }
    summary {
      display: flex;
      align-items: baseline;
      justify-content: space-between;
      gap: 1rem;
      padding-block: 0.75rem;
      cursor: pointer;
      list-style: none;
    }
    summary::-webkit-details-marker {
      display: none;
    }
    h2 {
      margin: 0;
    }
    h2::before {
      content: '+';
      display: inline-block;
      inline-size: 1.6ch;
      font-family: var(--sl-mono);
      font-weight: 400;
      color: var(--sl-accent);
    }
    details[open] h2::before {
      content: '−';
    }
    .state {
      font-size: var(--sl-small);
      color: var(--sl-quiet);
      white-space: nowrap;
    }
    .fields {
      display: grid;
      gap: 1.25rem;
      padding-block: 0.25rem 2rem;
    }
  `,
})
export class EditorSection {
  readonly heading = input.required<string>();
  /** First steps of the paths that belong to this section. */
  readonly covers = input.required<readonly string[]>();
  private readonly editing = inject(DraftEditing);

  protected readonly state = computed(() => {
    const held = this.countIn(this.editing.heldBack());
    const missing = this.countIn(this.editing.missing());
    return [held === 0 ? '' : `${held} not saved`, missing === 0 ? '' : `${missing} missing`]
      .filter((words) => words !== '')
      .join(', ');
  });

  private countIn(fields: readonly FieldProblem[]): number {
    return fields.filter((field) => this.covers().includes(field.path.split('.')[0] ?? '')).length;
  }
}
