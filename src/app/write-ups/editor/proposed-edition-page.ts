import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, numberAttribute } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { loadEach } from '../../core/load';
import { LoadStateView } from '../../ui/load-state/load-state';
import { Difference } from '../difference';
import { OpinionForm } from './opinion-form';
import { ProposedEditions } from './proposed-editions';

/** An edition that somebody proposes on a write-up of the member's: what it changes, and what the desk is told of it. */
@Component({
  selector: 'sl-proposed-edition-page',
  imports: [DatePipe, Difference, LoadStateView, OpinionForm, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p class="sl-overline">Proposed on your write-up</p>
    @if (edition(); as edition) {
      <h1>
        <a [routerLink]="['/write-ups', edition.slug]">{{ edition.title }}</a>
      </h1>
      <p>
        By {{ edition.author.displayName }}, handed in {{ edition.submittedAt | date: 'd MMM y, HH:mm' }}: “{{
          edition.changeNote
        }}”
      </p>
      <p class="sl-quiet">
        Against edition {{ edition.comparison.from?.number }}, which is published: words that went are
        <del>struck through</del>, words that came are <ins>underlined</ins>.
      </p>
      @for (field of edition.comparison.changed; track field.field) {
        <sl-difference [difference]="field" />
      } @empty {
        <p>It says the same as the edition that is published.</p>
      }
      <sl-opinion-form [editionId]="edition.editionId" [said]="edition.myOpinion" />
      <p><a routerLink="/my/write-ups">My write-ups</a></p>
    } @else {
      <h1>Edition</h1>
      <sl-load-state [of]="loaded()" />
      <p><a routerLink="/my/write-ups">My write-ups</a></p>
    }
  `,
  styles: `
    :host {
      display: block;
      max-inline-size: var(--sl-measure);
    }
  `,
})
export class ProposedEditionPage {
  readonly id = input.required({ transform: numberAttribute });
  private readonly proposed = inject(ProposedEditions);
  protected readonly loaded = loadEach(toObservable(this.id), (id) => this.proposed.read(id));
  protected readonly edition = computed(() => {
    const loaded = this.loaded();
    return loaded.state === 'ready' ? loaded.value : null;
  });
}
