import { ChangeDetectionStrategy, Component, booleanAttribute, input } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { MarkdownHelp } from './markdown-help';

/** A text of several lines, marked up in Markdown; it grows with what is typed. */
@Component({
  selector: 'sl-passage-field',
  imports: [Field, Labelled, MarkdownHelp, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <sl-labelled [label]="label()" [hint]="hint()" [control]="control()" [fieldId]="fieldId()">
      <textarea slField [rows]="rows()" [attr.maxlength]="longest()" [formControl]="control()"></textarea>
    </sl-labelled>
    @if (help()) {
      <sl-markdown-help />
    }
  `,
  styles: `
    :host {
      display: block;
    }
    textarea {
      display: block;
      resize: vertical;
      field-sizing: content;
      min-block-size: calc(3 * 1.55em);
      max-block-size: 60vh;
    }
  `,
})
export class PassageField {
  readonly label = input.required<string>();
  readonly control = input.required<FormControl<string>>();
  readonly longest = input.required<number>();
  readonly hint = input('');
  readonly fieldId = input('');
  readonly rows = input(4);
  readonly help = input(false, { transform: booleanAttribute });
}
