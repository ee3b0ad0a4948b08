import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { Subscription } from 'rxjs';
import { photoLimits, type Photo } from '../../../../shared/contract/photos';
import type { Problem } from '../../../../shared/contract/problem';
import { toApiProblem } from '../../core/api-problem';
import { tellFields } from '../../core/told-fields';
import { Field, Labelled } from '../labelled/labelled';
import { ProblemNote } from '../problem-note/problem-note';
import { PhotoUpload } from './photo-upload';
import { tooLarge } from './too-large';

/** A photo on its way: shown from the file, stored once it is said what it shows. A refusal keeps the words. */
@Component({
  selector: 'sl-new-photo',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'group', '[attr.aria-label]': '"New photo " + file().name' },
  template: `
    @if (preview(); as preview) {
      <img alt="" [src]="preview" />
    }
    <div class="words">
      <sl-labelled label="What it shows, for those who cannot see it" [hint]="file().name" [control]="alt">
        <input
          #field
          slField
          type="text"
          maxlength="300"
          [formControl]="alt"
          (keydown.enter)="send($event)"
        />
      </sl-labelled>
      @if (problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      @if (sending()) {
        <div class="under-way">
          <progress [attr.value]="share()" max="1" [attr.aria-label]="'Storing ' + file().name"></progress>
          <span class="sl-measured">{{ percent() }}</span>
        </div>
      }
      <div class="ways">
        <button type="button" class="sl-strong-button" [disabled]="sending()" (click)="send()">
          Store the photo
        </button>
        <button type="button" class="sl-bare-button" (click)="forget()">
          {{ sending() ? 'Stop' : 'Leave it out' }}
        </button>
      </div>
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 1rem;
    }
    img {
      max-inline-size: min(14rem, 100%);
      max-block-size: 14rem;
      object-fit: contain;
      object-position: left top;
    }
    .words {
      display: grid;
      gap: 0.75rem;
      min-inline-size: 0;
    }
    .under-way,
    .ways {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0.75rem;
    }
    progress {
      flex: 1;
      accent-color: var(--sl-accent);
    }
    @media (min-width: 48rem) {
      :host {
        grid-template-columns: 14rem minmax(0, 1fr);
      }
    }
  `,
})
export class NewPhoto {
  readonly file = input.required<File>();
  readonly stored = output<Photo>();
  readonly forgotten = output();
  private readonly upload = inject(PhotoUpload);
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');
  private sendingNow: Subscription | null = null;
  protected readonly preview = signal<string | null>(null);
  protected readonly sending = signal(false);
  protected readonly share = signal<number | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly alt = new FormControl('', {
    nonNullable: true,
    validators: [Validators.required, Validators.minLength(5)],
  });
  private readonly form = new FormGroup({ alt: this.alt });
  protected readonly percent = computed(() => {
    const share = this.share();
    return share === null ? '' : `${Math.round(share * 100)} %`;
  });

  constructor() {
    let address: string | undefined;
    afterNextRender(() => {
      address = URL.createObjectURL(this.file());
      this.preview.set(address);
      this.field().nativeElement.focus();
    });
    inject(DestroyRef).onDestroy(() => {
      this.sendingNow?.unsubscribe();
      if (address) URL.revokeObjectURL(address);
    });
  }

  protected send(event?: Event): void {
    event?.preventDefault();
    this.problem.set(null);
    this.alt.updateValueAndValidity();
    this.alt.markAsTouched();
    if (this.file().size > photoLimits.bytes) {
      this.problem.set(tooLarge(this.file()));
    } else if (this.alt.invalid) {
      this.field().nativeElement.focus();
    } else {
      this.start();
    }
  }

  protected forget(): void {
    this.sendingNow?.unsubscribe();
    if (this.sending()) this.sending.set(false);
    else this.forgotten.emit();
  }

  private start(): void {
    this.sending.set(true);
    this.share.set(0);
    this.sendingNow = this.upload.send(this.file(), this.alt.value.trim()).subscribe({
      next: (step) => {
        if (step.kind === 'sending') this.share.set(step.share);
        else this.stored.emit(step.photo);
      },
      error: (error: unknown) => {
        const { problem } = toApiProblem(error);
        this.problem.set({ ...problem, fields: tellFields(this.form, problem.fields ?? []) });
        this.sending.set(false);
      },
    });
  }
}
