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
import { RouterLink } from '@angular/router';
import type { Observable } from 'rxjs';
import { flagGroundWords, type FlagOutcome } from '../../../shared/contract/flags';
import { takenDownKinds } from '../../../shared/contract/taken-down';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { DeskItems } from './desk-items';
import { ItemHead } from './item-head';
import { ItemReading } from './item-page';
import { ItemResult } from './item-result';
import { QuotedSubject } from './quoted-subject';
import { ReasonForm } from './reason-form';

/** Something members told the desk of: the thing, what each says of it, and the decision. */
@Component({
  selector: 'sl-flag-page',
  imports: [DatePipe, ItemHead, ItemResult, ProblemNote, QuotedSubject, ReasonForm, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './flag-page.html',
  styleUrl: './item-page.scss',
})
export class FlagPage implements OnInit {
  readonly id = input.required({ transform: numberAttribute });
  private readonly items = inject(DeskItems);
  protected readonly grounds = flagGroundWords;
  protected readonly reading = new ItemReading(() => this.items.flag(this.id()));
  protected readonly mine = signal(true);
  protected readonly decided = signal<FlagOutcome | null>(null);
  /** Stands on the pages, and is of a kind that is taken down here. */
  protected readonly canBeTakenDown = computed(() => {
    const subject = this.reading.item()?.subject;
    return !!subject && !subject.takenDown && (takenDownKinds as readonly string[]).includes(subject.kind);
  });
  protected readonly ofWriteUp = computed(() =>
    ['write-up', 'fix'].includes(this.reading.item()?.subject?.kind ?? ''),
  );
  protected readonly keep = this.settle('kept');
  protected readonly takeDown = this.settle('taken-down');
  protected readonly dealtWith = this.settle('dealt-with');

  ngOnInit(): void {
    this.reading.fetch();
  }

  private settle(outcome: FlagOutcome): (reason: string) => Observable<unknown> {
    return (reason) => this.items.settleFlag(this.id(), outcome, reason);
  }
}
