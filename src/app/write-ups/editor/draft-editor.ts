import { DOCUMENT, DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type OnInit,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import { licence } from '../../../../shared/contract/licence';
import type { Problem } from '../../../../shared/contract/problem';
import type { Draft } from '../../../../shared/contract/write-ups';
import { toApiProblem } from '../../core/api-problem';
import { Confirm } from '../../ui/confirm/confirm';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Undo } from '../../ui/undo/undo';
import { DraftEditing } from './draft-editing';
import { Drafts } from './drafts';
import { contentFields } from './edition-limits';
import { EditorSection } from './editor-section';
import { fieldId } from './field-names';
import { FixesFields } from './fixes-fields';
import { JointsFields } from './joints-fields';
import { MergePanel, type MergeResult } from './merge-panel';
import { MissingList } from './missing-list';
import { PassageField } from './passage-field';
import { PhotosFields } from './photos-fields';
import { ReadingsFields } from './readings-fields';
import { SaveLine } from './save-line';
import { SetAsideList } from './set-aside-list';
import { showField } from './show-field';
import { StandingCautions } from './standing-cautions';
import { SymptomsFields } from './symptoms-fields';

/** The form of one draft, in the order of the work. */
@Component({
  selector: 'sl-draft-editor',
  imports: [
    DatePipe,
    EditorSection,
    Field,
    FixesFields,
    JointsFields,
    Labelled,
    MergePanel,
    MissingList,
    PassageField,
    PhotosFields,
    ProblemNote,
    ReactiveFormsModule,
    ReadingsFields,
    RouterLink,
    SaveLine,
    SetAsideList,
    StandingCautions,
    SymptomsFields,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  providers: [DraftEditing],
  host: {
    '(window:beforeunload)': 'holdBack($event)',
    '(document:visibilitychange)': 'saveWhenHidden()',
    '(window:online)': 'editing.flush()',
    '(keydown.control.s)': 'saveNow($event)',
    '(keydown.meta.s)': 'saveNow($event)',
  },
  templateUrl: './draft-editor.html',
  styleUrl: './draft-editor.scss',
})
export class DraftEditor implements OnInit {
  protected readonly licence = licence;
  readonly draft = input.required<Draft>();
  readonly handedIn = output<Draft>();
  protected readonly editing = inject(DraftEditing);
  private readonly drafts = inject(Drafts);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly confirm = inject(Confirm);
  private readonly document = inject(DOCUMENT);
  protected readonly fieldId = fieldId;
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  private thrownAway = false;
  /** Who wrote the write-up, where the member is none of them; empty otherwise. */
  protected readonly proposedTo = computed(() => {
    const { author, writtenBy } = this.draft();
    const isTheirs = writtenBy.every((person) => person.id !== author.id);
    return isTheirs ? writtenBy.map((person) => person.displayName).join(', ') : '';
  });

  ngOnInit(): void {
    this.editing.open(this.draft());
  }

  /** Saves what waits before the page is left; asks where that cannot be done. */
  async mayLeave(): Promise<boolean> {
    if (this.thrownAway || (await this.editing.flush())) return true;
    return this.confirm.ask({
      title: 'Not everything is saved',
      text: 'A copy of what you typed stays in this browser and comes back when you open this draft here again.',
      yes: 'Leave all the same',
      no: 'Stay',
    });
  }

  protected show(path: string): void {
    showField(this.document, path);
  }

  protected finishMerge(result: MergeResult): void {
    this.problem.set(null);
    this.editing.finishMerge(result);
    setTimeout(() => showField(this.document, 'title'));
  }

  /** Opens the merge with the edition that was published since. */
  protected mergeNow(): void {
    this.problem.set(null);
    this.busy.set(true);
    this.drafts
      .mergeGround(this.draft().id)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (ground) => this.editing.mergeWith(ground),
        error: (error: unknown) => this.failed(error),
      });
  }

  protected dropSetAside(): void {
    const texts = this.editing.setAside();
    this.editing.keepAside([]);
    this.undo.offer('The texts set aside are dropped', () => this.editing.keepAside(texts));
  }

  protected async handIn(): Promise<void> {
    this.problem.set(null);
    if (this.editing.missing().length > 0) {
      this.show('missing');
      return;
    }
    this.busy.set(true);
    if (!(await this.editing.flush())) {
      this.busy.set(false);
      const [held] = this.editing.heldBack();
      if (held) this.show(held.path);
      return;
    }
    this.drafts
      .submit(this.draft().id, this.editing.version())
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (draft) => {
          this.thrownAway = true;
          this.handedIn.emit(draft);
        },
        error: (error: unknown) => this.failed(error),
      });
  }

  protected throwAway(): void {
    const { id, title } = {
      id: this.draft().id,
      title: this.editing.content().title || 'The draft without a title',
    };
    this.problem.set(null);
    this.drafts.discard(id).subscribe({
      next: () => {
        this.thrownAway = true;
        this.editing.forgetBackup();
        void this.router.navigateByUrl('/my/write-ups');
        this.undo.offer(`“${title}” is thrown away`, () => {
          this.drafts.restore(id).subscribe({
            next: () => void this.router.navigate(['/drafts', id]),
            error: (error: unknown) => this.undo.tell(toApiProblem(error).problem.detail),
          });
        });
      },
      error: (error: unknown) => this.failed(error),
    });
  }

  protected saveNow(event: Event): void {
    event.preventDefault();
    void this.editing.flush();
  }

  protected holdBack(event: BeforeUnloadEvent): void {
    if (this.thrownAway || this.editing.isSettled()) return;
    void this.editing.flush();
    event.preventDefault();
  }

  protected saveWhenHidden(): void {
    if (this.document.visibilityState === 'hidden' && !this.thrownAway) void this.editing.flush();
  }

  private failed(error: unknown): void {
    const { problem } = toApiProblem(error);
    if (this.editing.tookMovedOn(problem)) return;
    this.problem.set({ ...problem, fields: problem.fields && contentFields(problem.fields) });
  }
}
