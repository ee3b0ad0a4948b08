import { ChangeDetectionStrategy, Component, computed, inject, input, numberAttribute } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { loadEach } from '../../core/load';
import { LoadStateView } from '../../ui/load-state/load-state';
import { EditionPage } from '../edition-page/edition-page';
import { Drafts } from './drafts';

/** A draft drawn by the very component that draws its page once it is published. */
@Component({
  selector: 'sl-preview-page',
  imports: [EditionPage, LoadStateView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p class="bar">
      <strong>Preview: only you and the desk can see this.</strong>
      <a class="sl-plain-button" [routerLink]="['/drafts', id()]">Back to the draft</a>
    </p>
    @if (view(); as view) {
      <sl-edition-page [view]="view" />
    } @else {
      <sl-load-state [of]="loaded()" />
    }
  `,
  styles: `
    .bar {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      justify-content: space-between;
      gap: 0.5rem 1rem;
      padding-block-end: 0.75rem;
      border-block-end: 1px solid var(--sl-ink);
    }
  `,
})
export class PreviewPage {
  readonly id = input.required({ transform: numberAttribute });
  private readonly drafts = inject(Drafts);
  protected readonly loaded = loadEach(toObservable(this.id), (id) => this.drafts.preview(id));
  protected readonly view = computed(() => {
    const loaded = this.loaded();
    return loaded.state === 'ready' ? loaded.value.view : null;
  });
}
