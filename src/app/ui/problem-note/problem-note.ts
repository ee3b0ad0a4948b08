import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { Problem } from '../../../../shared/contract/problem';
import { Icon } from '../icon/icon';

/** The one place that shows a problem: what happened, what to do, which fields, and the id to report. */
@Component({
  selector: 'sl-problem-note',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'alert' },
  template: `
    @if (problem(); as problem) {
      <div class="note">
        <sl-icon name="warning" />
        <div>
          <p class="title">{{ problem.title }}</p>
          <p>{{ problem.detail }} {{ problem.remedy }}</p>
          @if (problem.fields?.length) {
            <ul>
              @for (field of problem.fields; track $index) {
                <li>
                  @if (field.path) {
                    <code>{{ field.path }}</code>
                  }
                  {{ field.message }}{{ field.remedy ? '. ' + field.remedy : '' }}
                </li>
              }
            </ul>
          }
          @if (problem.status >= 500 && problem.requestId) {
            <p class="id">
              Request <code>{{ problem.requestId }}</code>
            </p>
          }
          @if (retryable()) {
            <button type="button" class="sl-plain-button" (click)="retry.emit()">Try again</button>
          }
        </div>
      </div>
    }
  `,
  styles: `
    .note {
      display: flex;
      gap: 0.75rem;
      border: 1px solid var(--sl-danger);
      border-inline-start-width: 6px;
      padding: 0.75rem 1rem;
      margin-block: 1rem;
      background: var(--sl-paper);
    }
    sl-icon {
      color: var(--sl-danger);
      margin-top: 0.15rem;
    }
    p {
      margin: 0 0 0.25rem;
    }
    .title {
      font-weight: 600;
    }
    ul {
      margin: 0.25rem 0;
      padding-inline-start: 1.1rem;
    }
    .id {
      color: var(--sl-quiet);
      font-size: var(--sl-small);
    }
  `,
})
export class ProblemNote {
  readonly problem = input.required<Problem | null | undefined>();
  /** Offers "Try again". */
  readonly retryable = input(false);
  readonly retry = output();
}
