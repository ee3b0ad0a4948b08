import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { MakerPage, MakerRequest } from '../../../shared/contract/makers';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Makers } from './makers';

/** Asks to speak for a maker: by a link mailed to its domain, or by a word to the desk. */
@Component({
  selector: 'sl-ask-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (maker().mailDomain; as domain) {
      <fieldset>
        <legend>How can we know that you belong to {{ maker().name }}?</legend>
        <label class="choice"
          ><input type="radio" name="how" [checked]="byMail()" (change)="chosen.set('mail')" />
          <span>I have an address that ends in &#64;{{ domain }}</span></label
        >
        <label class="choice"
          ><input type="radio" name="how" [checked]="!byMail()" (change)="chosen.set('desk')" />I tell the
          desk</label
        >
      </fieldset>
    }
    @if (byMail()) {
      <form [formGroup]="mail" novalidate (ngSubmit)="askByMail()">
        <sl-labelled
          label="Your address there"
          hint="A link goes to it, good for 24 hours and only while you are signed in here"
          [control]="mail.controls.address"
        >
          <input
            slField
            type="email"
            inputmode="email"
            autocomplete="email"
            maxlength="254"
            formControlName="address"
          />
        </sl-labelled>
        <sl-problem-note [problem]="sending.problem()" />
        <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Mail me the link</button>
      </form>
    } @else {
      <form [formGroup]="desk" novalidate (ngSubmit)="askTheDesk()">
        <sl-labelled
          label="What shows that you belong to them"
          hint="A moderator reads it: your part in the company, a page that names you, a number to call"
          [control]="desk.controls.note"
        >
          <textarea slField rows="5" maxlength="2000" formControlName="note"></textarea>
        </sl-labelled>
        <sl-problem-note [problem]="sending.problem()" />
        <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Ask the desk</button>
      </form>
    }
  `,
  styleUrl: './maker-form.scss',
  styles: `
    fieldset {
      margin-block-end: 1rem;
    }
  `,
})
export class AskForm {
  readonly maker = input.required<MakerPage>();
  readonly asked = output<MakerRequest>();
  private readonly makers = inject(Makers);
  protected readonly sending = formSending();
  protected readonly chosen = signal<'mail' | 'desk'>('mail');
  /** Mail proves nothing while no domain of the maker is known. */
  protected readonly byMail = computed(() => this.maker().mailDomain !== null && this.chosen() === 'mail');
  protected readonly mail = new FormGroup({
    address: new FormControl('', { nonNullable: true, validators: [Validators.required, Validators.email] }),
  });
  protected readonly desk = new FormGroup({
    note: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(20)],
    }),
  });

  protected askByMail(): void {
    this.sending.send(
      this.mail,
      () => this.makers.ask(this.maker().slug, { how: 'mail', address: this.mail.controls.address.value }),
      (request) => this.asked.emit(request),
    );
  }

  protected askTheDesk(): void {
    this.sending.send(
      this.desk,
      () => this.makers.ask(this.maker().slug, { how: 'desk', note: this.desk.controls.note.value }),
      (request) => this.asked.emit(request),
    );
  }
}
