import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import type { MailRhythm } from '../../../shared/contract/accounts';
import { formSending } from '../core/form-sending';
import { Session } from '../core/session';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';
import { MailRefused } from './mail-refused';

const rhythms: readonly { value: MailRhythm; label: string; means: string }[] = [
  { value: 'at-once', label: 'At once', means: 'readings, trials and reports of fit gathered once a day' },
  { value: 'daily', label: 'Once a day', means: 'in the afternoon, 16:00 UTC, when something happened' },
  { value: 'weekly', label: 'Once a week', means: 'on Mondays, 16:00 UTC, when something happened' },
  { value: 'none', label: 'Not by mail', means: 'only among the notices here' },
];

/** Which mail comes and when. What concerns safety has a switch of its own. */
@Component({
  selector: 'sl-mail-choices',
  imports: [MailRefused, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    <h2 id="mail">Mail</h2>
    <sl-mail-refused />
    <form [formGroup]="form" novalidate (ngSubmit)="save()" (input)="saved.set(false)">
      <fieldset class="rhythms">
        <legend>
          What happens on what I <a routerLink="/my/watches">watch</a> and on my bench is mailed
        </legend>
        @for (rhythm of rhythms; track rhythm.value) {
          <label>
            <input type="radio" [value]="rhythm.value" formControlName="mailRhythm" />
            <span
              >{{ rhythm.label }}<span class="sl-quiet">, {{ rhythm.means }}</span></span
            >
          </label>
        }
      </fieldset>
      <label class="check">
        <input type="checkbox" formControlName="benchWatch" />
        <span>Tell me what changes on the parts of my bench</span>
      </label>
      <label class="check">
        <input type="checkbox" formControlName="noticeMail" />
        <span>Mail me when my editions or proposals are taken or come back from the desk</span>
      </label>
      <label class="check">
        <input type="checkbox" formControlName="safetyMail" />
        <span
          >Safety notices: mail me at once, whatever is chosen above, when the desk places a caution on a fix
          that I tried</span
        >
      </label>
      @if (!form.value.safetyMail) {
        <p class="sl-quiet" role="status">
          Without these, a caution on something you have on your telescope is told only among your notices.
        </p>
      }
      @if (sending.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      <div class="actions">
        <button class="sl-strong-button" type="submit" [disabled]="sending.busy()">Save mail choices</button>
        <span role="status">{{ saved() ? 'Saved.' : '' }}</span>
      </div>
    </form>
  `,
  styles: `
    h2 {
      margin-block-start: 2rem;
    }
    .rhythms {
      display: grid;
    }
    .check,
    .rhythms label {
      align-items: baseline;
      padding-block: 0.4rem;
    }
    .check input,
    .rhythms input {
      transform: translateY(0.15rem);
    }
  `,
})
export class MailChoices {
  private readonly accounts = inject(Accounts);
  private readonly account = inject(Session).account();
  protected readonly rhythms = rhythms;
  protected readonly sending = formSending();
  protected readonly saved = signal(false);
  protected readonly form = new FormGroup({
    mailRhythm: new FormControl<MailRhythm>(this.account?.mailRhythm ?? 'at-once', { nonNullable: true }),
    benchWatch: new FormControl(this.account?.benchWatch ?? false, { nonNullable: true }),
    noticeMail: new FormControl(this.account?.noticeMail ?? true, { nonNullable: true }),
    safetyMail: new FormControl(this.account?.safetyMail ?? true, { nonNullable: true }),
  });

  protected save(): void {
    this.saved.set(false);
    this.sending.send(
      this.form,
      () => this.accounts.changeProfile(this.form.getRawValue()),
      () => this.saved.set(true),
    );
  }
}
