import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  TemplateRef,
  computed,
  contentChild,
  input,
} from '@angular/core';
import type { LoadState } from '../../core/load';
import { ProblemNote } from '../problem-note/problem-note';

/**
 * Shows what is known: a quiet line while loading, the problem when it failed, else the template inside:
 * `<sl-load-state [of]="page()"><ng-template let-page> … </ng-template></sl-load-state>`; where the template needs the
 * value's type, use `@if (page(); as page)` on a computed of your own instead.
 */
@Component({
  selector: 'sl-load-state',
  imports: [NgTemplateOutlet, ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @switch (of().state) {
      @case ('loading') {
        <p class="waiting" role="status">{{ waitingText() }}</p>
      }
      @case ('failed') {
        <sl-problem-note [problem]="problem()" />
      }
      @case ('ready') {
        @if (content(); as content) {
          <ng-container [ngTemplateOutlet]="content" [ngTemplateOutletContext]="{ $implicit: value() }" />
        }
      }
    }
  `,
  styles: `
    .waiting {
      color: var(--sl-quiet);
      padding-block: 1.5rem;
    }
  `,
})
export class LoadStateView {
  readonly of = input.required<LoadState<unknown>>();
  readonly waitingText = input('Fetching …');
  protected readonly content = contentChild(TemplateRef);
  protected readonly value = computed(() => {
    const now = this.of();
    return now.state === 'ready' ? now.value : undefined;
  });
  protected readonly problem = computed(() => {
    const now = this.of();
    return now.state === 'failed' ? now.problem : undefined;
  });
}
