import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, type OnInit, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import type { Problem } from '../../../shared/contract/problem';
import { withdrawalRoutes as routes, type DeskWriteUp } from '../../../shared/contract/withdrawal';
import { Api } from '../core/api';
import { toApiProblem } from '../core/api-problem';
import { formSending } from '../core/form-sending';
import { ShimloreTitles } from '../core/titles';
import { Icon } from '../ui/icon/icon';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { AuditTrail } from './audit-trail';

const reasonRules = [Validators.required, Validators.minLength(10)];

/** A write-up as the desk has it: withdraw it with a reason, put it back, and what was decided on it. */
@Component({
  selector: 'sl-withdrawal-page',
  imports: [AuditTrail, DatePipe, Field, Icon, Labelled, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './withdrawal-page.html',
  styleUrl: './withdrawal-page.scss',
})
export class WithdrawalPage implements OnInit {
  readonly slug = input.required<string>();
  private readonly api = inject(Api);
  private readonly titles = inject(ShimloreTitles);
  protected readonly writeUp = signal<DeskWriteUp | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly round = signal(0);
  protected readonly sending = formSending();
  protected readonly withdrawing = new FormGroup({
    reason: new FormControl('', { nonNullable: true, validators: reasonRules }),
    instead: new FormControl('', { nonNullable: true }),
  });
  protected readonly puttingBack = new FormGroup({
    reason: new FormControl('', { nonNullable: true, validators: reasonRules }),
  });

  ngOnInit(): void {
    this.fetch();
  }

  protected fetch(): void {
    this.problem.set(null);
    this.api.call(routes.readDeskWriteUp, { params: { slug: this.slug() } }).subscribe({
      next: (writeUp) => this.take(writeUp),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected withdraw(): void {
    const { reason, instead } = this.withdrawing.getRawValue();
    const body = { reason, instead: slugIn(instead) };
    this.sending.send(
      this.withdrawing,
      () => this.api.call(routes.withdrawWriteUp, { params: { slug: this.slug() }, body }),
      (writeUp) => this.take(writeUp),
    );
  }

  protected putBack(): void {
    const body = this.puttingBack.getRawValue();
    this.sending.send(
      this.puttingBack,
      () => this.api.call(routes.putBackWriteUp, { params: { slug: this.slug() }, body }),
      (writeUp) => this.take(writeUp),
    );
  }

  protected namesOf({ authors }: DeskWriteUp): string {
    return authors.map((author) => author.displayName).join(', ');
  }

  private take(writeUp: DeskWriteUp): void {
    this.writeUp.set(writeUp);
    this.withdrawing.reset();
    this.puttingBack.reset();
    this.round.update((round) => round + 1);
    this.titles.describe({ title: writeUp.title });
  }
}

/** The address of a write-up as it was pasted, or its last part. */
function slugIn(text: string): string | null {
  const last = text
    .trim()
    .replace(/[?#].*$/, '')
    .replace(/\/+$/, '')
    .split('/')
    .at(-1);
  return last ? last : null;
}
