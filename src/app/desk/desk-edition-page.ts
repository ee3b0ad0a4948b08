import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type OnInit,
  computed,
  inject,
  input,
  numberAttribute,
  signal,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { catchError, of } from 'rxjs';
import type { DeskEdition } from '../../../shared/contract/moderation';
import type { Problem } from '../../../shared/contract/problem';
import { editionStateWords } from '../../../shared/contract/vocabulary';
import { toApiProblem } from '../core/api-problem';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Difference } from '../write-ups/difference';
import { EditionPage } from '../write-ups/edition-page/edition-page';
import { CautionList } from './caution-list';
import { DecisionPanel, type Decision } from './decision-panel';
import { Desk } from './desk';
import { EditionPlace } from './edition-place';
import { HazardPanel } from './hazard-panel';

/** One edition on the desk: what changed, how it will stand, the hazards it names, and the decision. */
@Component({
  selector: 'sl-desk-edition-page',
  imports: [
    CautionList,
    DatePipe,
    DecisionPanel,
    Difference,
    EditionPage,
    EditionPlace,
    HazardPanel,
    Icon,
    ProblemNote,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './desk-edition-page.html',
  styleUrl: './desk-edition-page.scss',
})
export class DeskEditionPage implements OnInit {
  readonly id = input.required({ transform: numberAttribute });
  private readonly desk = inject(Desk);
  protected readonly states = editionStateWords;
  protected readonly edition = signal<DeskEdition | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly decision = signal<Decision | null>(null);
  protected readonly library = toSignal(this.desk.library().pipe(catchError(() => of([]))), {
    initialValue: [],
  });
  protected readonly open = computed(
    () => this.edition()?.hazards.filter((hazard) => !hazard.answered).length ?? 0,
  );

  ngOnInit(): void {
    this.fetch();
  }

  /** Reads the edition anew; what is shown stays until the answer is there. */
  protected fetch(): void {
    this.problem.set(null);
    this.desk.edition(this.id()).subscribe({
      next: (edition) => this.edition.set(edition),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}
