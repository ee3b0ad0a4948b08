import {
  ChangeDetectionStrategy,
  Component,
  Directive,
  booleanAttribute,
  computed,
  inject,
  input,
} from '@angular/core';
import type { AbstractControl } from '@angular/forms';
import { redrawWith } from '../../core/redraw-with';
import { wrongWith } from '../../core/told-fields';
import { Icon } from '../icon/icon';

let count = 0;

/**
 * A field with its name above it, what it is for, and what is wrong with it:
 * `<sl-labelled label="Title" [control]="title"><input slField [formControl]="title" /></sl-labelled>`.
 */
@Component({
  selector: 'sl-labelled',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label [attr.for]="id()"
      >{{ label() }}
      @if (optional()) {
        <span class="optional"> (if you know)</span>
      }
    </label>
    @if (hint(); as hint) {
      <p class="hint" [id]="id() + '-hint'">{{ hint }}</p>
    }
    <ng-content />
    @if (wrong(); as wrong) {
      <p class="wrong" [id]="id() + '-wrong'"><sl-icon name="warning" />{{ wrong }}</p>
    }
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
    label {
      display: block;
      font-weight: 600;
      margin-block-end: 0.2rem;
    }
    .optional {
      font-weight: 400;
      color: var(--sl-quiet);
    }
    .hint {
      margin: 0 0 0.3rem;
      color: var(--sl-quiet);
      font-size: var(--sl-small);
    }
    .wrong {
      display: flex;
      gap: 0.4rem;
      margin: 0.3rem 0 0;
      color: var(--sl-danger);
      font-size: var(--sl-small);
      font-weight: 600;
    }
    .wrong sl-icon {
      margin-block-start: 0.1rem;
    }
  `,
})
export class Labelled {
  readonly label = input.required<string>();
  readonly control = input.required<AbstractControl>();
  readonly hint = input('');
  readonly optional = input(false, { transform: booleanAttribute });
  /** Element id of the field; made up where the page needs to point at none. */
  readonly fieldId = input('');
  private readonly ownId = `sl-labelled-${count++}`;
  readonly id = computed(() => this.fieldId() || this.ownId);

  constructor() {
    redrawWith(this.control);
  }

  wrong(): string {
    return this.control().touched ? wrongWith(this.control()) : '';
  }

  /** Ids of the texts that describe the field. */
  describedBy(): string | null {
    const ids = [this.hint() && `${this.id()}-hint`, this.wrong() && `${this.id()}-wrong`].filter(Boolean);
    return ids.length > 0 ? ids.join(' ') : null;
  }
}

/** The input, select or text area inside `sl-labelled`. */
@Directive({
  selector: '[slField]',
  host: {
    class: 'sl-field',
    '[id]': 'around.id()',
    '[attr.aria-invalid]': 'around.wrong() ? true : null',
    '[attr.aria-describedby]': 'around.describedBy()',
  },
})
export class Field {
  protected readonly around = inject(Labelled);
}
