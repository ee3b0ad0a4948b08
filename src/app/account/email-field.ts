import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { Field, Labelled } from '../ui/labelled/labelled';

@Component({
  selector: 'sl-email-field',
  imports: [Field, Labelled, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <sl-labelled label="E-mail address" [control]="control()">
      <input
        slField
        type="email"
        name="email"
        autocomplete="username"
        maxlength="254"
        [formControl]="control()"
      />
    </sl-labelled>
  `,
})
export class EmailField {
  readonly control = input.required<FormControl<string>>();
}
