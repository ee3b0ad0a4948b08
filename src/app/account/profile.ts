import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { formSending } from '../core/form-sending';
import { Session } from '../core/session';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';
import { ExportPanel } from './export-panel';
import { LimitNote } from './limit-note';
import { MailChoices } from './mail-choices';

@Component({
  selector: 'sl-profile',
  imports: [
    ExportPanel,
    Field,
    Labelled,
    LimitNote,
    MailChoices,
    ProblemNote,
    ReactiveFormsModule,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    <h1>Your account</h1>
    @if (session.account(); as account) {
      <dl class="facts">
        <dt>E-mail address</dt>
        <dd>{{ account.email }}</dd>
        <dt>Role</dt>
        <dd>{{ account.role }}</dd>
      </dl>
    }
    <sl-limit-note />
    <form [formGroup]="form" novalidate (ngSubmit)="save()" (input)="saved.set(false)">
      <sl-labelled label="Name shown to others" [control]="form.controls.displayName">
        <input
          slField
          name="displayName"
          autocomplete="nickname"
          maxlength="60"
          formControlName="displayName"
        />
      </sl-labelled>
      <fieldset>
        <legend>Lengths are shown in</legend>
        <label><input type="radio" value="mm" formControlName="units" /> millimetres</label>
        <label><input type="radio" value="in" formControlName="units" /> inches</label>
      </fieldset>
      @if (sending.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      <div class="actions">
        <button class="sl-strong-button" type="submit" [disabled]="sending.busy()">Save</button>
        <span role="status">{{ saved() ? 'Saved.' : '' }}</span>
      </div>
    </form>
    <sl-mail-choices />
    <p class="links">
      <a routerLink="/my/write-ups">My write-ups</a>
      <a routerLink="/account/forgotten">Change the password</a>
      <a routerLink="/my/hand-overs">Write-ups to look after</a>
    </p>
    <h2>Your data</h2>
    <sl-export-panel />
    <p><a class="danger" routerLink="/account/deletion">Delete your account</a></p>
    @if (signOutProblem(); as problem) {
      <sl-problem-note [problem]="problem" />
    }
    <button class="sl-plain-button" type="button" (click)="signOut()">Sign out</button>
  `,
})
export class Profile {
  protected readonly session = inject(Session);
  private readonly accounts = inject(Accounts);
  private readonly router = inject(Router);
  protected readonly sending = formSending();
  protected readonly saved = signal(false);
  protected readonly signOutProblem = signal<Problem | null>(null);
  private readonly account = this.session.account();
  protected readonly form = new FormGroup({
    displayName: new FormControl(this.account?.displayName ?? '', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(2)],
    }),
    units: new FormControl<'mm' | 'in'>(this.account?.units ?? 'mm', { nonNullable: true }),
  });

  protected save(): void {
    this.saved.set(false);
    this.sending.send(
      this.form,
      () => this.accounts.changeProfile(this.form.getRawValue()),
      () => this.saved.set(true),
    );
  }

  protected async signOut(): Promise<void> {
    try {
      await this.session.signOut();
      await this.router.navigateByUrl('/');
    } catch (error) {
      this.signOutProblem.set(toApiProblem(error).problem);
    }
  }
}
