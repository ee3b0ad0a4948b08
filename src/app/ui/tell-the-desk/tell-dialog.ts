import { ChangeDetectionStrategy, Component, Injector, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialog, MatDialogModule } from '@angular/material/dialog';
import { flagGroundWords, flagRoutes, type FlagGround } from '../../../../shared/contract/flags';
import { Api } from '../../core/api';
import { formSending } from '../../core/form-sending';
import { Field, Labelled } from '../labelled/labelled';
import { ProblemNote } from '../problem-note/problem-note';
import type { ToldThing } from './tell-the-desk';

export interface Telling {
  readonly thing: ToldThing;
  readonly name: string;
}

/** What is the matter with it, in one choice and one line. */
@Component({
  selector: 'sl-tell-dialog',
  imports: [Field, Labelled, MatButtonModule, MatDialogModule, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h2 mat-dialog-title>Tell the desk</h2>
    @if (told()) {
      <mat-dialog-content>
        <p role="status">The desk has it. You are told by mail what comes of it.</p>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button type="button" mat-flat-button mat-dialog-close cdkFocusInitial>Close</button>
      </mat-dialog-actions>
    } @else {
      <form [formGroup]="form" novalidate (ngSubmit)="send()">
        <mat-dialog-content>
          <p>What is the matter with {{ telling.name }}? The desk reads it; nobody else does.</p>
          <fieldset>
            <legend class="sl-visually-hidden">What is the matter</legend>
            @for (ground of grounds; track ground[0]) {
              <label>
                <input type="radio" formControlName="ground" [value]="ground[0]" />
                <span>{{ ground[1] }}</span>
              </label>
            }
          </fieldset>
          <sl-labelled
            label="In a line"
            hint="What exactly, so that the desk finds it"
            [control]="form.controls.line"
          >
            <input slField maxlength="500" autocomplete="off" formControlName="line" />
          </sl-labelled>
          <sl-problem-note [problem]="sending.problem()" />
        </mat-dialog-content>
        <mat-dialog-actions align="end">
          <button type="button" mat-button mat-dialog-close>Leave it</button>
          <button type="submit" mat-flat-button [disabled]="sending.busy()">Tell the desk</button>
        </mat-dialog-actions>
      </form>
    }
  `,
  styles: `
    fieldset {
      min-inline-size: 0;
      margin: 0 0 1rem;
      padding: 0;
      border: 0;
    }
    label {
      display: flex;
      align-items: baseline;
      gap: 0.6rem;
      padding-block: 0.5rem;
      cursor: pointer;
    }
  `,
})
export class TellDialog {
  private readonly api = inject(Api);
  protected readonly telling = inject<Telling>(MAT_DIALOG_DATA);
  protected readonly grounds = Object.entries(flagGroundWords) as [FlagGround, string][];
  protected readonly sending = formSending();
  protected readonly told = signal(false);
  protected readonly form = new FormGroup({
    ground: new FormControl<FlagGround>('unsafe', { nonNullable: true }),
    line: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  protected send(): void {
    this.sending.send(
      this.form,
      () =>
        this.api.call(flagRoutes.tellDesk, {
          body: { ...this.telling.thing, ...this.form.getRawValue() },
        }),
      () => this.told.set(true),
    );
  }
}

/** Opens the dialog; fetched with it. */
export function openTellDialog(injector: Injector, data: Telling): void {
  injector.get(MatDialog).open(TellDialog, { data, maxWidth: '32rem', autoFocus: 'first-tabbable' });
}
