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
import type { Observable } from 'rxjs';
import { postsUntilKnown } from '../../../shared/contract/desk-posts';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { DeskItems } from './desk-items';
import { ItemHead } from './item-head';
import { ItemReading } from './item-page';
import { ItemResult } from './item-result';
import { LookDecision } from './look-decision';
import { QuotedSubject } from './quoted-subject';

/** One of the first posts of a new member, which stands on the pages already. */
@Component({
  selector: 'sl-first-post-page',
  imports: [ItemHead, ItemResult, LookDecision, ProblemNote, QuotedSubject],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (decided(); as outcome) {
      <sl-item-result
        [title]="outcome === 'fine' ? 'Found fine' : 'Taken down'"
        [text]="outcome === 'fine' ? fineMeans() : 'Its writer gets your reason by mail.'"
      />
    } @else if (reading.item(); as post) {
      <sl-item-head
        overline="First post"
        [item]="{ kind: 'first-post', id: post.id }"
        [title]="post.title"
        [since]="post.since"
        [waiting]="post.state === 'waiting'"
        (inHand)="mine.set($event)"
      />
      <div class="sheet">
        <section aria-labelledby="thing">
          <h2 id="thing">What was posted</h2>
          @if (post.subject; as subject) {
            <sl-quoted-subject [subject]="subject" />
          } @else {
            <p>It is no longer there.</p>
          }
        </section>
        <section aria-labelledby="decision" class="decision" data-decision tabindex="-1">
          <h2 id="decision">Decision</h2>
          @if (post.state !== 'waiting') {
            <p>Decided: {{ post.state.replace('-', ' ') }}.</p>
          } @else if (!mine()) {
            <p class="sl-quiet">Somebody else has it in hand.</p>
          } @else {
            <sl-look-decision
              [fineMeans]="fineMeans()"
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
export class FirstPostPage implements OnInit {
  readonly id = input.required({ transform: numberAttribute });
  private readonly items = inject(DeskItems);
  protected readonly reading = new ItemReading(() => this.items.firstPost(this.id()));
  protected readonly mine = signal(true);
  protected readonly decided = signal<'fine' | 'taken-down' | null>(null);
  protected readonly fine = (): Observable<unknown> => this.items.postIsFine(this.id());
  protected readonly takeDown = (reason: string): Observable<unknown> =>
    this.items.takePostDown(this.id(), reason);
  protected readonly fineMeans = computed(() => {
    const more = postsUntilKnown - 1 - (this.reading.item()?.fineSoFar ?? 0);
    if (more <= 0) return 'With it the desk knows this member; what they post comes up here no more.';
    return more === 1
      ? 'One more fine post, and the desk knows this member.'
      : `${more} more fine posts, and the desk knows this member.`;
  });

  ngOnInit(): void {
    this.reading.fetch();
  }
}
