import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { PartPage } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import type { Merge } from '../../../shared/contract/proposals';
import { toApiProblem } from '../core/api-problem';
import { Confirm } from '../ui/confirm/confirm';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Desk } from './desk';
import { PartChoice } from './part-choice';

/** Merges a part into another, or a revision or feature into another of the same part. It cannot be undone. */
@Component({
  selector: 'sl-merge-form',
  imports: [PartChoice, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './merge-form.html',
  styles: `
    form {
      display: grid;
      gap: 1rem;
      justify-items: start;
      max-inline-size: 40rem;
    }
    fieldset {
      border: 0;
      margin: 0;
      padding: 0;
      display: flex;
      flex-wrap: wrap;
      gap: 0 1.5rem;
    }
    fieldset label {
      display: inline-flex;
      align-items: center;
      gap: 0.5rem;
      min-block-size: 2.75rem;
    }
    legend,
    .row {
      font-weight: 600;
    }
    .row {
      display: grid;
      gap: 0.2rem;
    }
    p {
      margin: 0;
      max-inline-size: var(--sl-measure);
    }
  `,
})
export class MergeForm {
  private readonly desk = inject(Desk);
  private readonly confirm = inject(Confirm);
  protected readonly kinds = ['part', 'revision', 'feature'] as const;
  protected readonly kind = signal<Merge['kind']>('part');
  /** The part that goes, or the one whose revisions or features are merged. */
  protected readonly part = signal<PartPage | null>(null);
  protected readonly other = signal<PartPage | null>(null);
  protected readonly from = signal<number | null>(null);
  protected readonly into = signal<number | null>(null);
  private readonly chosenMap = signal<ReadonlyMap<number, number | null>>(new Map());
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly done = signal<string | null>(null);

  /** For each revision of the part that goes: what was chosen, else the one of the same label. */
  protected readonly pairs = computed(() => {
    const into = this.other()?.revisions ?? [];
    return (this.part()?.revisions ?? []).map((revision) => {
      const chosen = this.chosenMap().get(revision.id);
      const alike = into.find((candidate) => candidate.label === revision.label)?.id ?? null;
      return { revision, into: chosen === undefined ? alike : chosen };
    });
  });
  protected readonly choices = computed(() => {
    const part = this.part();
    if (!part || this.kind() === 'part') return [];
    return this.kind() === 'revision'
      ? part.revisions.map(({ id, label }) => ({ id, name: label }))
      : part.features.map(({ id, name, kind }) => ({ id, name: `${name} (${kind.replace('-', ' ')})` }));
  });
  protected readonly wish = computed<Merge | null>(() => {
    const kind = this.kind();
    const from = kind === 'part' ? (this.part()?.id ?? null) : this.from();
    const into = kind === 'part' ? (this.other()?.id ?? null) : this.into();
    if (from === null || into === null) return null;
    const revisionMap =
      kind === 'part'
        ? this.pairs().flatMap((pair) =>
            pair.into === null ? [] : [{ from: pair.revision.id, into: pair.into }],
          )
        : [];
    return { kind, from, into, revisionMap };
  });

  protected become(kind: Merge['kind']): void {
    this.kind.set(kind);
    this.clear();
  }

  protected take(part: PartPage): void {
    this.part.set(part);
    this.clear();
  }

  protected pair(revisionId: number, into: string): void {
    this.chosenMap.update((map) => new Map(map).set(revisionId, idIn(into)));
  }

  protected idIn(value: string): number | null {
    return idIn(value);
  }

  protected async merge(): Promise<void> {
    const wish = this.wish();
    if (!wish || this.busy()) return;
    const sure = await this.confirm.ask({
      title: `Merge this ${wish.kind} into the other?`,
      text: 'What hangs on it moves over, and it is gone from the catalogue. It cannot be undone.',
      yes: 'Merge them',
    });
    if (!sure) return;
    this.busy.set(true);
    this.problem.set(null);
    this.desk
      .merge(wish)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: ({ slug }) => {
          this.done.set(slug);
          this.part.set(null);
          this.other.set(null);
          this.clear();
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }

  private clear(): void {
    this.from.set(null);
    this.into.set(null);
    this.chosenMap.set(new Map());
  }
}

function idIn(value: string): number | null {
  return value === '' ? null : Number(value);
}
