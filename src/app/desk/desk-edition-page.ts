import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  type OnInit,
  computed,
  inject,
  input,
  numberAttribute,
  signal,
  viewChild,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { Router, RouterLink } from '@angular/router';
import { catchError, of } from 'rxjs';
import type { DeskEdition } from '../../../shared/contract/moderation';
import type { Problem } from '../../../shared/contract/problem';
import { editionStateWords } from '../../../shared/contract/vocabulary';
import { toApiProblem } from '../core/api-problem';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Difference } from '../write-ups/difference';
import { EditionPage } from '../write-ups/edition-page/edition-page';
import { AuditTrail } from './audit-trail';
import { CautionList } from './caution-list';
import { DecisionPanel, type Decision } from './decision-panel';
import { ClaimBar } from './claim-bar';
import { Desk } from './desk';
import { deskKeys } from './desk-keys';
import { EditionPlace } from './edition-place';
import { HazardPanel } from './hazard-panel';
import { keyList } from './key-list';

/** One edition on the desk: what changed, how it will stand, the hazards it names, and the decision. */
@Component({
  selector: 'sl-desk-edition-page',
  imports: [
    AuditTrail,
    CautionList,
    ClaimBar,
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
  private readonly claimBar = viewChild(ClaimBar);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  protected readonly showKeys = keyList();
  /** False while another moderator has it in hand. */
  protected readonly mine = signal(true);
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

  constructor() {
    const router = inject(Router);
    deskKeys([
      { key: 'd', does: 'to what changed', run: () => this.goTo('difference') },
      { key: 't', does: 'to the text as it will stand', run: () => this.goTo('text') },
      { key: 'h', does: 'to the hazards', run: () => this.goTo('hazards') },
      { key: 'w', does: 'to the decision', run: () => this.goTo('decision') },
      { key: 'c', does: 'take it in hand', run: () => this.claimBar()?.take() },
      { key: 'u', does: 'give it up', run: () => this.claimBar()?.giveUp() },
      { key: 'b', does: 'back to the queue', run: () => void router.navigateByUrl('/desk') },
      { key: '?', does: 'show these keys', run: this.showKeys },
    ]);
  }

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

  private goTo(part: string): void {
    const place = this.host.nativeElement.querySelector<HTMLElement>(`[data-part='${part}']`);
    place?.scrollIntoView();
    place?.focus();
  }
}
