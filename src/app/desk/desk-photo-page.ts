import {
  ChangeDetectionStrategy,
  Component,
  type OnInit,
  inject,
  input,
  numberAttribute,
  signal,
} from '@angular/core';
import type { Observable } from 'rxjs';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { DeskItems } from './desk-items';
import { ItemHead } from './item-head';
import { ItemReading } from './item-page';
import { ItemResult } from './item-result';
import { LookDecision } from './look-decision';
import { QuotedSubject } from './quoted-subject';

/** A photo that no decision on an edition covers. */
@Component({
  selector: 'sl-desk-photo-page',
  imports: [ItemHead, ItemResult, LookDecision, ProblemNote, QuotedSubject],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (decided(); as outcome) {
      <sl-item-result
        [title]="outcome === 'fine' ? 'Found fine' : 'Taken down'"
        [text]="
          outcome === 'fine'
            ? 'It stays where it is and comes up here no more.'
            : 'Its owner gets your reason by mail.'
        "
      />
    } @else if (reading.item(); as photo) {
      <sl-item-head
        overline="Photo"
        [item]="{ kind: 'photo', id: photo.id }"
        [title]="photo.subject.text"
        [since]="photo.since"
        [waiting]="photo.state === 'waiting'"
        (inHand)="mine.set($event)"
      />
      <div class="sheet">
        <section aria-labelledby="thing">
          <h2 id="thing">The photo</h2>
          <sl-quoted-subject [subject]="photo.subject" />
        </section>
        <section aria-labelledby="decision" class="decision" data-decision tabindex="-1">
          <h2 id="decision">Decision</h2>
          @if (photo.state !== 'waiting') {
            <p>Decided: {{ photo.state.replace('-', ' ') }}.</p>
          } @else if (!mine()) {
            <p class="sl-quiet">Somebody else has it in hand.</p>
          } @else {
            <sl-look-decision
              fineMeans="It stays where it is and comes up here no more."
              [fine]="fine"
              [takeDown]="takeDown"
              (decided)="decided.set($event)"
            />
          }
        </section>
      </div>
    } @else if (!reading.problem()) {
      <p class="sl-quiet" role="status">Fetching …</p>
    }
    <sl-problem-note [problem]="reading.problem()" [retryable]="true" (retry)="reading.fetch()" />
  `,
  styleUrl: './item-page.scss',
})
export class DeskPhotoPage implements OnInit {
  readonly id = input.required({ transform: numberAttribute });
  private readonly items = inject(DeskItems);
  protected readonly reading = new ItemReading(() => this.items.photo(this.id()));
  protected readonly mine = signal(true);
  protected readonly decided = signal<'fine' | 'taken-down' | null>(null);
  protected readonly fine = (): Observable<unknown> => this.items.photoIsFine(this.id());
  protected readonly takeDown = (reason: string): Observable<unknown> =>
    this.items.takePhotoDown(this.id(), reason);

  ngOnInit(): void {
    this.reading.fetch();
  }
}
