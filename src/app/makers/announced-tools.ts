import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { finalize, type Observable } from 'rxjs';
import type { PartPage, Revision } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { loadEach } from '../core/load';
import { Session } from '../core/session';
import { Confirm } from '../ui/confirm/confirm';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { AnnounceForm } from './announce-form';
import { Makers } from './makers';

/** For whoever speaks for the maker, and moderators: an announced revision is changed, sold or taken out again. */
@Component({
  selector: 'sl-announced-tools',
  imports: [AnnounceForm, ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (may()) {
      @if (changing()) {
        <sl-announce-form [revision]="revision()" (done)="refresh()" (left)="changing.set(false)" />
      } @else {
        <div class="ways">
          <button type="button" class="sl-plain-button" [disabled]="busy()" (click)="sell()">
            It is sold now
          </button>
          <button type="button" class="sl-bare-button" (click)="changing.set(true)">
            Change what is said
          </button>
          <button type="button" class="sl-bare-button" [disabled]="busy()" (click)="withdraw()">
            Take it out again
          </button>
        </div>
      }
      <sl-problem-note [problem]="problem()" />
    }
  `,
  styles: `
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.25rem 1rem;
    }
  `,
})
export class AnnouncedTools {
  readonly part = input.required<PartPage>();
  readonly revision = input.required<Revision>();
  readonly changed = output();

  private readonly makers = inject(Makers);
  private readonly session = inject(Session);
  private readonly confirm = inject(Confirm);
  private readonly undo = inject(Undo);
  protected readonly busy = signal(false);
  protected readonly changing = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  private readonly makerSlug = computed(() => this.part().maker.slug);
  private readonly maker = loadEach(toObservable(this.makerSlug), (slug) => this.makers.read(slug));
  protected readonly may = computed(() => {
    const now = this.maker();
    return this.session.isModerator() || (now.state === 'ready' && now.value.iSpeak);
  });

  protected sell(): void {
    const today = new Date().toISOString().slice(0, 10);
    this.call(this.makers.sell(this.revision().id, today), `${this.revision().label} is sold from today on.`);
  }

  protected async withdraw(): Promise<void> {
    const { label, id } = this.revision();
    const sure = await this.confirm.ask({
      title: `Take ${label} out of the catalogue?`,
      text: 'What was said of it is gone then. It can be announced anew.',
      yes: 'Take it out',
    });
    if (sure) this.call(this.makers.withdrawAnnounced(id), `${label} is not in the catalogue any more.`);
  }

  protected refresh(): void {
    this.changing.set(false);
    this.changed.emit();
  }

  private call(call: Observable<unknown>, done: string): void {
    this.busy.set(true);
    this.problem.set(null);
    call.pipe(finalize(() => this.busy.set(false))).subscribe({
      next: () => {
        this.undo.tell(done);
        this.changed.emit();
      },
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}
