import { ChangeDetectionStrategy, Component, DestroyRef, effect, inject, input } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { debounceTime, distinctUntilChanged } from 'rxjs';
import { deskItemKinds, deskItemWords, type DeskQueue } from '../../../shared/contract/desk-queue';
import type { QueueWish } from './desk-items';

const pauseInTyping = 250;

/** What the queue is kept to; it stands in the address, so that going back finds it again. */
@Component({
  selector: 'sl-queue-filter',
  imports: [ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <nav aria-label="Kind">
      <a
        [routerLink]="[]"
        [queryParams]="{ kind: null }"
        queryParamsHandling="merge"
        [class.here]="!wish().kind"
        [attr.aria-current]="wish().kind ? null : 'true'"
        >All <span class="count">{{ all() }}</span></a
      >
      @for (kind of kinds; track kind) {
        <a
          [routerLink]="[]"
          [queryParams]="{ kind }"
          queryParamsHandling="merge"
          [class.here]="wish().kind === kind"
          [attr.aria-current]="wish().kind === kind ? 'true' : null"
          >{{ words[kind].many }} <span class="count">{{ counts()?.[kind] ?? '·' }}</span></a
        >
      }
    </nav>
    <div class="narrow">
      <label>
        <span class="sl-visually-hidden">Words of the title or the name</span>
        <input
          class="sl-field"
          type="search"
          maxlength="100"
          autocomplete="off"
          placeholder="Words of the title or the name"
          [formControl]="typed"
        />
      </label>
      <label>
        <span class="sl-visually-hidden">In whose hand</span>
        <select class="sl-field" [value]="wish().claim ?? ''" (change)="keepTo(hand.value)" #hand>
          <option value="">in anybody's hand</option>
          <option value="free" [selected]="wish().claim === 'free'">in nobody's hand</option>
          <option value="mine" [selected]="wish().claim === 'mine'">in my hand</option>
        </select>
      </label>
    </div>
  `,
  styles: `
    nav {
      display: flex;
      flex-wrap: wrap;
      gap: 0 1.25rem;
    }
    a {
      display: inline-flex;
      align-items: center;
      gap: 0.4rem;
      min-block-size: 2.75rem;
      text-decoration: none;
      border-block-end: 2px solid transparent;
    }
    .here {
      border-color: currentColor;
      font-weight: 600;
    }
    .count {
      font-family: var(--sl-mono);
      font-size: 0.92em;
      font-variant-numeric: tabular-nums;
      color: var(--sl-quiet);
    }
    .narrow {
      display: grid;
      gap: 0.5rem 1rem;
      margin-block: 0.75rem 1rem;
    }
    @media (min-width: 40rem) {
      .narrow {
        grid-template-columns: minmax(0, 24rem) 14rem;
      }
    }
  `,
})
export class QueueFilter {
  readonly wish = input.required<QueueWish>();
  readonly counts = input.required<DeskQueue['counts'] | null>();
  private readonly router = inject(Router);
  protected readonly kinds = deskItemKinds;
  protected readonly words = deskItemWords;
  protected readonly typed = new FormControl('', { nonNullable: true });

  constructor() {
    effect(() => {
      const words = this.wish().words ?? '';
      if (words !== this.typed.value.trim()) this.typed.setValue(words, { emitEvent: false });
    });
    this.typed.valueChanges
      .pipe(debounceTime(pauseInTyping), distinctUntilChanged(), takeUntilDestroyed(inject(DestroyRef)))
      .subscribe((words) => this.goTo({ words: words.trim() || null }));
  }

  protected all(): string {
    const counts = this.counts();
    return counts ? String(Object.values(counts).reduce((total, count) => total + count, 0)) : '·';
  }

  protected keepTo(claim: string): void {
    this.goTo({ claim: claim || null });
  }

  private goTo(queryParams: Record<string, string | null>): void {
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge', replaceUrl: true });
  }
}
