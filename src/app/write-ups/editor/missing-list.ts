import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { FieldProblem } from '../../../../shared/contract/problem';
import { fieldId, fieldName } from './field-names';

/** What the desk would miss, each line leading to its field. */
@Component({
  selector: 'sl-missing-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (missing().length === 0) {
      <p>Nothing is missing. It can go to the desk.</p>
    } @else {
      <ol>
        @for (field of missing(); track field.path) {
          <li>
            <a [href]="'#' + fieldId(field.path)" (click)="go($event, field.path)">{{
              fieldName(field.path)
            }}</a>
            {{ field.message }}. <span class="sl-quiet">{{ field.remedy }}</span>
          </li>
        }
      </ol>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    ol {
      margin: 0;
      padding-inline-start: 1.75rem;
    }
    li {
      padding-block: 0.3rem;
    }
    a {
      font-weight: 600;
    }
  `,
})
export class MissingList {
  readonly missing = input.required<readonly FieldProblem[]>();
  /** Path of a field that somebody wants to see. */
  readonly wanted = output<string>();
  protected readonly fieldId = fieldId;
  protected readonly fieldName = fieldName;

  protected go(event: Event, path: string): void {
    event.preventDefault();
    this.wanted.emit(path);
  }
}
