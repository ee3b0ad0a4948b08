import { ChangeDetectionStrategy, Component, OnInit, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { catchError, throwError } from 'rxjs';
import type { DeskProposal } from '../../../shared/contract/proposals';
import { entryFieldsOf } from '../ui/hardware-entry/entry-fields';
import { formSending } from '../core/form-sending';
import { entryForm, entryOf, fillEntry } from '../ui/hardware-entry/entry-form';
import { HardwareEntry } from '../ui/hardware-entry/hardware-entry';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Desk } from './desk';

export type ProposalDecision = { kind: 'taken'; slug: string } | { kind: 'declined' };

/** One proposal with its fields to amend: take it into the catalogue, or decline it with a reason. */
@Component({
  selector: 'sl-proposal-panel',
  imports: [Field, HardwareEntry, Labelled, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="entry" novalidate (ngSubmit)="take()">
      @if (proposal().part; as part) {
        <p>
          For <a [routerLink]="['/parts', part.slug]">{{ part.name }}</a> by {{ part.maker.name }}
        </p>
      }
      <sl-hardware-entry [form]="entry" [kind]="proposal().entry.kind" />
      <sl-problem-note [problem]="taking.problem()" />
      <button type="submit" class="sl-strong-button" [disabled]="taking.busy()">
        Take it into the catalogue
      </button>
    </form>
    <form [formGroup]="declining" novalidate (ngSubmit)="decline()">
      <sl-labelled
        label="Reason for declining"
        hint="The proposer reads it, by mail too"
        [control]="declining.controls.reason"
      >
        <textarea slField rows="3" maxlength="1000" formControlName="reason"></textarea>
      </sl-labelled>
      <sl-problem-note [problem]="turning.problem()" />
      <button type="submit" class="sl-plain-button" [disabled]="turning.busy()">Decline it</button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 1rem;
      justify-items: start;
      max-inline-size: 34rem;
      padding-block-end: 1.5rem;
    }
    p {
      margin: 0;
    }
    sl-labelled {
      inline-size: 100%;
    }
    textarea {
      display: block;
      resize: vertical;
    }
  `,
})
export class ProposalPanel implements OnInit {
  readonly proposal = input.required<DeskProposal>();
  readonly decided = output<ProposalDecision>();
  private readonly desk = inject(Desk);
  protected readonly taking = formSending();
  protected readonly turning = formSending();
  protected readonly entry = entryForm();
  protected readonly declining = new FormGroup({
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  ngOnInit(): void {
    fillEntry(this.entry, this.proposal());
  }

  protected take(): void {
    const { id, entry } = this.proposal();
    this.taking.send(
      this.entry.controls[entry.kind],
      () =>
        this.desk
          .take(id, entryOf(this.entry, entry.kind))
          .pipe(catchError((error: unknown) => throwError(() => entryFieldsOf(error)))),
      ({ slug }) => this.decided.emit({ kind: 'taken', slug }),
    );
  }

  protected decline(): void {
    this.turning.send(
      this.declining,
      () => this.desk.decline(this.proposal().id, this.declining.controls.reason.value),
      () => this.decided.emit({ kind: 'declined' }),
    );
  }
}
