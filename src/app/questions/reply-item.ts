import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import type { Reply } from '../../../shared/contract/questions';
import { formSending } from '../core/form-sending';
import { Session } from '../core/session';
import { Field, Labelled } from '../ui/labelled/labelled';
import { PhotoStrip } from '../ui/photo/photo-strip';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { RichTextView } from '../ui/rich-text/rich-text';
import { TakenDownNote } from '../ui/taken-down-note/taken-down-note';
import { TellTheDesk } from '../ui/tell-the-desk/tell-the-desk';
import { WorksheetNote } from '../ui/worksheet/worksheet-note';
import { Questions } from './questions';

/** One reply; its writer can change it, and its writer or a moderator makes a write-up of it. */
@Component({
  selector: 'sl-reply-item',
  imports: [
    DatePipe,
    Field,
    Labelled,
    PhotoStrip,
    ProblemNote,
    ReactiveFormsModule,
    RichTextView,
    RouterLink,
    TakenDownNote,
    TellTheDesk,
    WorksheetNote,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let item = reply();
    <p class="who sl-quiet">
      {{ item.person.displayName }}, {{ item.createdAt | date: 'yyyy-MM-dd' }}
      @if (item.changedAt; as changed) {
        <span>, changed {{ changed | date: 'yyyy-MM-dd' }}</span>
      }
    </p>
    <sl-taken-down-note [of]="item.takenDown" />
    @if (changing()) {
      <form [formGroup]="form" novalidate aria-label="Change the reply" (ngSubmit)="send()">
        <sl-labelled label="Your reply" hint="Markdown" [control]="form.controls.text">
          <textarea slField rows="5" maxlength="4000" formControlName="text"></textarea>
        </sl-labelled>
        <sl-problem-note [problem]="sending.problem()" />
        <p class="ways">
          <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Keep the change</button>
          <button type="button" class="sl-bare-button" (click)="changing.set(false)">
            Leave it as it was
          </button>
        </p>
      </form>
    } @else {
      <sl-rich-text [text]="item.text" />
    }
    @if (item.photos.length) {
      <sl-photo-strip label="Photos of this reply" [photos]="photos()" />
    }
    @if (item.worksheet; as record) {
      <sl-worksheet-note [record]="record" />
    }
    @if (item.writeUp; as writeUp) {
      <p>
        <span>Became the write-up </span><a [routerLink]="['/write-ups', writeUp.slug]">{{ writeUp.title }}</a
        ><span>.</span>
      </p>
    }
    @if (!item.takenDown && !isWriter()) {
      <sl-tell-the-desk
        [thing]="{ kind: 'reply', id: item.id, fixKey: null }"
        [name]="'the reply by ' + item.person.displayName"
      />
    }
    @if (mayDraft() && !changing()) {
      <p class="ways sl-off-paper">
        @if (isWriter()) {
          <button type="button" class="sl-bare-button" (click)="change()">Change</button>
        }
        @if (!item.writeUp) {
          <button type="button" class="sl-bare-button" [disabled]="drafting.busy()" (click)="draft()">
            Make a write-up of it
          </button>
        }
      </p>
      <sl-problem-note [problem]="drafting.problem()" />
    }
  `,
  styles: `
    :host {
      display: block;
    }
    .who {
      margin: 0 0 0.25rem;
    }
    form {
      display: grid;
      gap: 0.75rem;
      max-inline-size: var(--sl-measure);
    }
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.25rem 1.5rem;
      margin: 0.25rem 0 0;
    }
  `,
})
export class ReplyItem {
  readonly reply = input.required<Reply>();
  readonly changed = output<Reply>();
  private readonly questions = inject(Questions);
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  protected readonly sending = formSending();
  protected readonly drafting = formSending();
  protected readonly changing = signal(false);
  protected readonly form = new FormGroup({
    text: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
  });
  protected readonly isWriter = computed(() => this.session.account()?.id === this.reply().person.id);
  protected readonly mayDraft = computed(
    () => this.reply().takenDown === null && (this.isWriter() || this.session.isModerator()),
  );
  protected readonly photos = computed(() => this.reply().photos.map((photo) => ({ photo, caption: '' })));

  protected change(): void {
    this.form.reset({ text: this.reply().text.source });
    this.changing.set(true);
  }

  protected send(): void {
    this.sending.send(
      this.form,
      () => this.questions.changeReply(this.reply().id, this.form.getRawValue().text),
      (reply) => {
        this.changing.set(false);
        this.changed.emit(reply);
      },
    );
  }

  protected draft(): void {
    this.drafting.send(
      new FormGroup({}),
      () => this.questions.draftFrom(this.reply().id),
      ({ draftId }) => void this.router.navigate(['/drafts', draftId]),
    );
  }
}
