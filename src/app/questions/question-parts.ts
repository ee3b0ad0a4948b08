import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { QuestionPart } from '../../../shared/contract/questions';

/** The parts that a question is about, each with its revision. */
@Component({
  selector: 'sl-question-parts',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ul class="sl-plain-list" aria-label="Parts">
      @for (item of parts(); track $index) {
        <li>
          <a [routerLink]="['/parts', item.part.slug]">{{ item.part.name }}</a>
          <b>{{ item.revision?.label ?? 'revision not known' }}</b>
        </li>
      }
    </ul>
  `,
  styles: `
    li {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0 0.75rem;
      min-block-size: 2.75rem;
      border-block-end: 1px solid var(--sl-hair);
      max-inline-size: var(--sl-measure);
    }
  `,
})
export class QuestionParts {
  readonly parts = input.required<readonly QuestionPart[]>();
}
