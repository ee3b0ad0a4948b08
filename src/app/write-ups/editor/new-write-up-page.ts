import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { formSending } from '../../core/form-sending';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Drafts } from './drafts';

@Component({
  selector: 'sl-new-write-up-page',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="sl-narrow">
      <h1>Leave word</h1>
      <p>
        For the next owner of these parts, and for their maker: what you noticed, what touches what, what you
        did about it, and how you know that it worked. It is saved as you type; a moderator reads it for
        safety before others see it.
      </p>
      <form [formGroup]="form" novalidate (ngSubmit)="start()">
        <sl-labelled
          label="What goes wrong between which parts?"
          hint="It can be worded anew at any time"
          [control]="form.controls.title"
        >
          <input slField type="text" name="title" maxlength="140" formControlName="title" />
        </sl-labelled>
        @if (sending.problem(); as problem) {
          <sl-problem-note [problem]="problem" />
        }
        <p class="ways">
          <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Start writing</button>
          <a routerLink="/my/write-ups">My write-ups</a>
        </p>
      </form>
    </div>
  `,
  styles: `
    .ways {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0.75rem 1.25rem;
      margin-block-start: 1rem;
    }
  `,
})
export class NewWriteUpPage {
  private readonly drafts = inject(Drafts);
  private readonly router = inject(Router);
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    title: new FormControl('', { nonNullable: true, validators: Validators.required }),
  });

  protected start(): void {
    this.sending.send(
      this.form,
      () => this.drafts.start(this.form.controls.title.value),
      (draft) => void this.router.navigate(['/drafts', draft.id], { replaceUrl: true }),
    );
  }
}
