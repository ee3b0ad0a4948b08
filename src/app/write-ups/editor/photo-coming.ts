import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  afterNextRender,
  computed,
  inject,
  input,
  signal,
} from '@angular/core';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { PhotoQueue, type ComingPhoto } from './photo-queue';

/** A photo on its way: how far it has come, a way to stop it, and when it failed why and what helps. */
@Component({
  selector: 'sl-photo-coming',
  imports: [ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'group', '[attr.aria-label]': '"New photo " + coming().file.name' },
  template: `
    <div class="preview">
      @if (preview(); as address) {
        <img alt="" [src]="address" (error)="preview.set(null)" />
      }
    </div>
    <div class="words">
      <p class="name">{{ coming().file.name }}</p>
      @switch (coming().progress.kind) {
        @case ('waiting') {
          <p class="sl-quiet sl-small">Waits its turn.</p>
        }
        @case ('sending') {
          <div class="under-way">
            <progress
              [attr.value]="share()"
              max="1"
              [attr.aria-label]="'Sending ' + coming().file.name"
            ></progress>
            <span class="sl-measured">{{ percent() }}</span>
          </div>
        }
        @case ('failed') {
          @if (problem(); as problem) {
            <sl-problem-note [problem]="problem" />
          }
        }
      }
      <div class="ways">
        @if (problem()) {
          <button type="button" class="sl-plain-button" (click)="queue.retry(coming().id)">
            Send again<span class="sl-visually-hidden"> {{ coming().file.name }}</span>
          </button>
        }
        <button type="button" class="sl-bare-button" (click)="queue.leaveOut(coming().id)">
          {{ problem() ? 'Leave it out' : 'Stop'
          }}<span class="sl-visually-hidden"> {{ coming().file.name }}</span>
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
      opacity: 0.6;
    }
    .words {
      display: grid;
      gap: 0.5rem;
      align-content: start;
      min-inline-size: 0;
    }
    p {
      margin: 0;
      overflow-wrap: anywhere;
    }
    .name {
      font: 400 var(--sl-small) / 1.4 var(--sl-mono);
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
      min-inline-size: 8rem;
      accent-color: var(--sl-accent);
    }
    .sl-measured {
      min-inline-size: 3.5rem;
      text-align: end;
    }
    @media (min-width: 48rem) {
      :host {
        grid-template-columns: 18rem minmax(0, 1fr);
      }
    }
  `,
})
export class PhotoComing {
  readonly coming = input.required<ComingPhoto>();
  protected readonly queue = inject(PhotoQueue);
  protected readonly preview = signal<string | null>(null);
  protected readonly share = computed(() => {
    const { progress } = this.coming();
    return progress.kind === 'sending' ? progress.share : null;
  });
  protected readonly percent = computed(() => {
    const share = this.share();
    // All bytes are there when the server still has to make its sizes of them.
    if (share === 1) return 'storing';
    return share === null ? '' : `${Math.round(share * 100)} %`;
  });
  protected readonly problem = computed(() => {
    const { progress } = this.coming();
    return progress.kind === 'failed' ? progress.problem : null;
  });

  constructor() {
    let address: string | undefined;
    afterNextRender(() => {
      address = URL.createObjectURL(this.coming().file);
      this.preview.set(address);
    });
    inject(DestroyRef).onDestroy(() => {
      if (address) URL.revokeObjectURL(address);
    });
  }
}
