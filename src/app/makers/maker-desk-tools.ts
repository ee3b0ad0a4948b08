import { ChangeDetectionStrategy, Component, OnInit, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { MakerPage } from '../../../shared/contract/makers';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { Makers } from './makers';

/** For moderators: the maker's addresses, and ending that somebody speaks for it. */
@Component({
  selector: 'sl-maker-desk-tools',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <section class="sl-section" aria-labelledby="desk-tools">
      <h2 id="desk-tools">For the desk</h2>
      <form [formGroup]="addresses" novalidate aria-label="Addresses of the maker" (ngSubmit)="save()">
        <sl-labelled
          label="Its mail domain"
          hint="Mail to an address there proves who speaks for it; exactly this domain, none below it"
          optional
          [control]="addresses.controls.mailDomain"
        >
          <input slField autocomplete="off" maxlength="253" formControlName="mailDomain" />
        </sl-labelled>
        <sl-labelled
          label="Address letters go to"
          hint="Only moderators see it whole"
          optional
          [control]="addresses.controls.contactAddress"
        >
          <input slField type="email" autocomplete="off" maxlength="254" formControlName="contactAddress" />
        </sl-labelled>
        <sl-problem-note [problem]="saving.problem()" />
        <button type="submit" class="sl-plain-button" [disabled]="saving.busy()">Save the addresses</button>
      </form>
      @if (maker().speakers.length) {
        <form [formGroup]="ending" novalidate aria-label="End that somebody speaks for it" (ngSubmit)="end()">
          <h3>End that somebody speaks for it</h3>
          <sl-labelled class="short" label="Who" [control]="ending.controls.accountId">
            <select slField formControlName="accountId">
              <option value="">choose</option>
              @for (person of maker().speakers; track person.id) {
                <option [value]="person.id">{{ person.displayName }}</option>
              }
            </select>
          </sl-labelled>
          <sl-labelled label="Reason" hint="They read it, by mail too" [control]="ending.controls.reason">
            <textarea slField rows="3" maxlength="1000" formControlName="reason"></textarea>
          </sl-labelled>
          <sl-problem-note [problem]="stopping.problem()" />
          <button type="submit" class="sl-plain-button" [disabled]="stopping.busy()">End it</button>
        </form>
      }
    </section>
  `,
  styleUrl: './maker-form.scss',
  styles: `
    h3 {
      margin: 1rem 0 0;
    }
  `,
})
export class MakerDeskTools implements OnInit {
  readonly maker = input.required<MakerPage>();
  readonly changed = output();
  private readonly makers = inject(Makers);
  private readonly undo = inject(Undo);
  protected readonly saving = formSending();
  protected readonly stopping = formSending();
  protected readonly addresses = new FormGroup({
    mailDomain: new FormControl('', { nonNullable: true }),
    contactAddress: new FormControl('', { nonNullable: true, validators: [Validators.email] }),
  });
  protected readonly ending = new FormGroup({
    accountId: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  ngOnInit(): void {
    const { mailDomain, contactAddress } = this.maker();
    this.addresses.setValue({ mailDomain: mailDomain ?? '', contactAddress: contactAddress ?? '' });
  }

  protected save(): void {
    const { mailDomain, contactAddress } = this.addresses.getRawValue();
    this.saving.send(
      this.addresses,
      () =>
        this.makers.changeAddresses(this.maker().slug, {
          mailDomain: mailDomain.trim() || null,
          contactAddress: contactAddress.trim() || null,
        }),
      () => {
        this.undo.tell('The addresses are saved.');
        this.changed.emit();
      },
    );
  }

  protected end(): void {
    const { accountId, reason } = this.ending.getRawValue();
    this.stopping.send(
      this.ending,
      () => this.makers.endSpeaking(this.maker().slug, { accountId: Number(accountId), reason }),
      () => {
        this.ending.reset();
        this.undo.tell('They no longer speak for it.');
        this.changed.emit();
      },
    );
  }
}
