import { ChangeDetectionStrategy, Component, OnInit, inject, input, output, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { finalize } from 'rxjs';
import type { MakerRef } from '../../../shared/contract/hardware';
import type { MakerAnswer } from '../../../shared/contract/makers';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { Makers } from './makers';

/** The one answer of a maker on a write-up: said, changed, taken back. */
@Component({
  selector: 'sl-answer-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate (ngSubmit)="send()">
      <sl-labelled
        [label]="'What ' + maker().name + ' says'"
        hint="Stands on the write-up under the maker’s name, with yours beside it. Earlier texts stay readable."
        [control]="form.controls.text"
      >
        <textarea slField rows="7" maxlength="6000" formControlName="text"></textarea>
      </sl-labelled>
      <sl-problem-note [problem]="sending.problem() ?? problem()" />
      <div class="ways">
        <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">
          {{ answer() ? 'Change the answer' : 'Answer' }}
        </button>
        @if (answer()) {
          <button type="button" class="sl-bare-button" [disabled]="busy()" (click)="takeBack()">
            Take it back
          </button>
        }
      </div>
    </form>
  `,
  styleUrl: './maker-form.scss',
})
export class AnswerForm implements OnInit {
  readonly slug = input.required<string>();
  readonly maker = input.required<MakerRef>();
  readonly answer = input<MakerAnswer | null>(null);
  readonly changed = output();

  private readonly makers = inject(Makers);
  private readonly undo = inject(Undo);
  protected readonly sending = formSending();
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly form = new FormGroup({
    text: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  ngOnInit(): void {
    this.form.controls.text.setValue(this.answer()?.text.source ?? '');
  }

  protected send(): void {
    this.sending.send(
      this.form,
      () => this.makers.answer(this.slug(), this.maker().slug, this.form.controls.text.value),
      () => {
        this.undo.tell('The answer stands on the write-up.');
        this.changed.emit();
      },
    );
  }

  protected takeBack(): void {
    const said = this.answer()?.text.source ?? '';
    this.busy.set(true);
    this.problem.set(null);
    this.makers
      .takeBackAnswer(this.slug(), this.maker().slug, '')
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: () => {
          this.undo.offer('The answer is not shown any more.', () => this.sayAgain(said));
          this.changed.emit();
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }

  private sayAgain(text: string): void {
    this.makers.answer(this.slug(), this.maker().slug, text).subscribe({
      next: () => this.changed.emit(),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}
