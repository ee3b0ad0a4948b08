import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { Field, Labelled } from '../ui/labelled/labelled';

/** A password that can be looked at while it is typed. */
@Component({
  selector: 'sl-password-field',
  imports: [Field, Labelled, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <sl-labelled [label]="label()" [control]="control()" [hint]="hint()">
      <span class="row">
        <input
          slField
          name="password"
          maxlength="200"
          [type]="shown() ? 'text' : 'password'"
          [attr.autocomplete]="fresh() ? 'new-password' : 'current-password'"
          [formControl]="control()"
        />
        <button
          class="sl-plain-button"
          type="button"
          [attr.aria-pressed]="shown()"
          (click)="shown.set(!shown())"
        >
          {{ shown() ? 'Hide' : 'Show' }}<span class="sl-visually-hidden"> the password</span>
        </button>
      </span>
    </sl-labelled>
  `,
  styles: `
    .row {
      display: flex;
    }
    button {
      border-color: var(--sl-quiet);
      border-inline-start: 0;
    }
  `,
})
export class PasswordField {
  readonly control = input.required<FormControl<string>>();
  readonly label = input('Password');
  /** Whether a new password is made rather than an old one asked for. */
  readonly fresh = input(false);
  protected readonly shown = signal(false);

  protected hint(): string {
    return this.fresh() ? 'At least 12 characters; a few words in a row are easy to keep in mind.' : '';
  }
}
