import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  numberAttribute,
  signal,
  viewChild,
} from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { Problem } from '../../../../shared/contract/problem';
import type { Draft } from '../../../../shared/contract/write-ups';
import { toApiProblem } from '../../core/api-problem';
import { loadEach } from '../../core/load';
import { LoadStateView } from '../../ui/load-state/load-state';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { DraftEditor } from './draft-editor';
import { Drafts } from './drafts';

/** A draft: its form while it is the author's, what can be done with it while the desk has it. */
@Component({
  selector: 'sl-draft-page',
  imports: [DraftEditor, LoadStateView, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (draft(); as draft) {
      <h1>{{ draft.number === 1 ? 'Write-up' : 'Edition ' + draft.number }}</h1>
      @switch (draft.state) {
        @case ('submitted') {
          <p role="status">
            “{{ draft.content.title }}” is on the desk. A moderator reads it and publishes it, or gives it
            back with a reason.
          </p>
          @if (problem(); as problem) {
            <sl-problem-note [problem]="problem" />
          }
          <p class="ways">
            <a class="sl-plain-button" [routerLink]="['/drafts', draft.id, 'preview']">See it as its page</a>
            <button type="button" class="sl-plain-button" [disabled]="busy()" (click)="recall(draft)">
              Take it back to change it
            </button>
            <a routerLink="/my/write-ups">My write-ups</a>
          </p>
        }
        @case ('published') {
          <p>This edition is published.</p>
          <p class="ways">
            <a class="sl-strong-button" [routerLink]="['/write-ups', draft.slug]">Read it</a>
            <a class="sl-plain-button" [routerLink]="['/write-ups', draft.slug, 'edit']"
              >Start the next edition</a
            >
          </p>
        }
        @default {
          <sl-draft-editor [draft]="draft" (handedIn)="changed.set($event)" />
        }
      }
    } @else {
      <h1>Write-up</h1>
      <sl-load-state [of]="loaded()" />
    }
  `,
  styles: `
    .ways {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0.75rem 1.25rem;
    }
  `,
})
export class DraftPage {
  readonly id = input.required({ transform: numberAttribute });
  private readonly drafts = inject(Drafts);
  private readonly editor = viewChild(DraftEditor);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  /** The draft after something was done with it here. */
  protected readonly changed = signal<Draft | null>(null);
  protected readonly loaded = loadEach(toObservable(this.id), (id) => this.drafts.read(id));
  protected readonly draft = computed(() => {
    const changed = this.changed();
    const loaded = this.loaded();
    if (changed?.id === this.id()) return changed;
    return loaded.state === 'ready' ? loaded.value : null;
  });

  mayLeave(): Promise<boolean> {
    return this.editor()?.mayLeave() ?? Promise.resolve(true);
  }

  protected recall(draft: Draft): void {
    this.busy.set(true);
    this.problem.set(null);
    this.drafts
      .recall(draft.id)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (recalled) => this.changed.set(recalled),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}
