import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  linkedSignal,
  signal,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { catchError, map, of, throwError } from 'rxjs';
import {
  mostProposedPhotos,
  proposalKinds,
  type Proposal,
  type Proposed,
} from '../../../../shared/contract/proposals';
import { formSending } from '../../core/form-sending';
import { loadEach } from '../../core/load';
import { ShimloreTitles } from '../../core/titles';
import { entryFieldsOf } from '../../ui/hardware-entry/entry-fields';
import { entryForm, entryOf } from '../../ui/hardware-entry/entry-form';
import { HardwareEntry } from '../../ui/hardware-entry/hardware-entry';
import { LoadStateView } from '../../ui/load-state/load-state';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Hardware } from '../hardware';
import { Proposals } from '../proposals';
import { headOfEntry } from './proposal-words';

/** Something that the catalogue lacks: a part, or a revision or feature of the part that the address names. */
@Component({
  selector: 'sl-propose-page',
  imports: [HardwareEntry, LoadStateView, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Propose for the catalogue</h1>
    @if (sent(); as sent) {
      <div role="status">
        <h2>It waits at the desk</h2>
        <p>
          {{ head(sent) }}. You get a mail when it is decided; till then it stands among
          <a routerLink="/my/proposals">what you proposed</a>.
        </p>
      </div>
      <p><button type="button" class="sl-plain-button" (click)="another()">Propose something else</button></p>
    } @else if (part(); as state) {
      @if (state.state === 'ready') {
        <form [formGroup]="form" novalidate (ngSubmit)="send()">
          <fieldset>
            <legend>What is missing?</legend>
            <label
              ><input type="radio" name="kind" [checked]="kind() === 'part'" (change)="kind.set('part')" />A
              part</label
            >
            @if (state.value; as part) {
              <label
                ><input
                  type="radio"
                  name="kind"
                  [checked]="kind() === 'revision'"
                  (change)="kind.set('revision')"
                />A revision of {{ part.name }}</label
              >
              <label
                ><input
                  type="radio"
                  name="kind"
                  [checked]="kind() === 'feature'"
                  (change)="kind.set('feature')"
                />A mating feature of {{ part.name }}</label
              >
            }
          </fieldset>
          @if (!state.value) {
            <p class="sl-quiet">
              For a revision or a feature, open the part under <a routerLink="/hardware">Hardware</a> and
              propose it there.
            </p>
          }
          <sl-hardware-entry [form]="form" [kind]="kind()" [makers]="makers()" [mostPhotos]="mostPhotos" />
          <sl-problem-note [problem]="sending.problem()" />
          <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">
            Send it to the desk
          </button>
        </form>
      } @else {
        <sl-load-state [of]="state" />
      }
    }
  `,
  styles: `
    form {
      display: grid;
      gap: 1.25rem;
      justify-items: start;
    }
    fieldset {
      border: 0;
      padding: 0;
      margin: 0;
    }
    legend {
      font-weight: 600;
    }
    label {
      display: flex;
      align-items: center;
      gap: 0.6rem;
      min-block-size: 2.75rem;
    }
    p {
      max-inline-size: var(--sl-measure);
    }
  `,
})
export class ProposePage {
  private readonly hardware = inject(Hardware);
  private readonly proposals = inject(Proposals);
  private readonly query = toSignal(
    inject(ActivatedRoute).queryParamMap.pipe(
      map((params) => ({ part: params.get('part'), kind: kindIn(params.get('kind')) })),
    ),
    { requireSync: true },
  );
  protected readonly form = entryForm();
  protected readonly sending = formSending();
  protected readonly sent = signal<Proposal | null>(null);
  protected readonly head = headOfEntry;
  protected readonly mostPhotos = mostProposedPhotos;
  protected readonly part = loadEach(
    inject(ActivatedRoute).queryParamMap.pipe(map((params) => params.get('part'))),
    (slug) => (slug === null ? of(null) : this.hardware.part(slug)),
  );
  protected readonly kind = linkedSignal<Proposed['kind']>(() =>
    this.query().part === null ? 'part' : (this.query().kind ?? 'revision'),
  );
  protected readonly makers = toSignal(
    this.hardware.makers().pipe(
      map(({ items }) => items.map((maker) => maker.name)),
      catchError(() => of([])),
    ),
    { initialValue: [] as string[] },
  );
  private readonly partId = computed(() => {
    const now = this.part();
    return now.state === 'ready' && now.value ? now.value.id : null;
  });

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() => titles.describe({ title: 'Propose for the catalogue' }));
  }

  protected send(): void {
    const kind = this.kind();
    this.sending.send(
      this.form.controls[kind],
      () =>
        this.proposals
          .propose({ partId: kind === 'part' ? null : this.partId(), entry: entryOf(this.form, kind) })
          .pipe(catchError((error: unknown) => throwError(() => entryFieldsOf(error)))),
      (proposal) => this.sent.set(proposal),
    );
  }

  protected another(): void {
    this.form.reset();
    this.form.controls.revision.controls.photos.clear();
    this.sent.set(null);
  }
}

function kindIn(value: string | null): Proposed['kind'] | null {
  return proposalKinds.find((kind) => kind === value) ?? null;
}
