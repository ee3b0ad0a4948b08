import { Injectable, computed, inject, signal, type OnDestroy } from '@angular/core';
import { Subscription, throwError, type Observable } from 'rxjs';
import { emptyContent } from '../../../../shared/contract/edition-content';
import { missingFromContent } from '../../../../shared/contract/edition-completeness';
import type { Photo } from '../../../../shared/contract/photos';
import type { FieldProblem, Problem } from '../../../../shared/contract/problem';
import type { Draft } from '../../../../shared/contract/write-ups';
import { toApiProblem } from '../../core/api-problem';
import { tellFields } from '../../core/told-fields';
import { Autosave, type SaveState } from './autosave';
import { DraftBackup } from './draft-backup';
import { Drafts } from './drafts';
import { editionForm, textOf, type EditionForm, type EditionText } from './edition-form';
import { contentFields, limitsBroken, limitsProblem } from './edition-limits';
import { mergeRows, mergedText, type MergeRow, type Side } from './edition-merge';
import { PartDirectory } from './part-directory';
import { same } from '../../../../shared/editions/same';

/** A text that was not taken when two were merged; kept in sight so that nothing is lost. */
export interface SetAside {
  row: MergeRow;
  side: Side;
}

/** One draft while it is being written: its form, its way to the server, and what to do when somebody else saved it. */
@Injectable()
export class DraftEditing implements OnDestroy {
  private readonly drafts = inject(Drafts);
  private readonly backup = inject(DraftBackup);
  private readonly directory = inject(PartDirectory);
  private readonly openDraft = signal<Draft | null>(null);
  private readonly openForm = signal<EditionForm>(editionForm(emptyText));
  private readonly text = signal<EditionText>(emptyText);
  private autosave: Autosave | null = null;
  private changes = Subscription.EMPTY;
  /** The text as the server had it when this editor last agreed with it. */
  private base: EditionText = emptyText;

  readonly form = this.openForm.asReadonly();
  readonly draft = computed(() => this.openDraft()!);
  readonly content = computed(() => this.text().content);
  readonly photos = signal<ReadonlyMap<number, Photo>>(new Map());
  /** Set when what is shown came from this browser, with the text that the server had. */
  readonly restored = signal<{ at: Date; serversText: EditionText } | null>(null);
  readonly setAside = signal<readonly SetAside[]>([]);
  /** Set when what this browser kept was built on an older version than the server's: theirs. */
  private readonly ownMerge = signal<Draft | null>(null);
  private readonly savingState = signal<(() => SaveState) | null>(null);
  readonly saveState = computed<SaveState>(() => {
    const theirs = this.ownMerge();
    return theirs ? { kind: 'moved-on', theirs } : this.stateOfSaving();
  });
  readonly mergeRows = computed<MergeRow[] | null>(() => {
    const state = this.saveState();
    return state.kind === 'moved-on' ? mergeRows(this.base, this.text(), textOfDraft(state.theirs)) : null;
  });
  readonly missing = computed<FieldProblem[]>(() => {
    const missing = missingFromContent(this.content());
    if (this.draft().number > 1 && this.text().changeNote.trim() === '') missing.push(changeNoteMissing);
    return missing;
  });

  /** Opens a draft: what this browser kept and the server never got comes first. */
  open(draft: Draft): void {
    this.close();
    this.base = textOfDraft(draft);
    this.openDraft.set(draft);
    this.keepPhotos(draft.photos);
    this.autosave = new Autosave(
      {
        save: (text, version) => this.send(text, version),
        problemOf: (error) => this.problemOf(error),
        saved: (saved) => this.wasSaved(saved),
      },
      { version: draft.version, at: new Date(draft.updatedAt) },
    );
    this.savingState.set(this.autosave.state);
    const partIds = draft.content.joints
      .flatMap((joint) => [joint.a.partId, joint.b.partId])
      .filter((id) => id !== null);
    this.directory.learn(partIds).subscribe();

    const kept = this.backup.find(draft.id);
    if (kept === null || same(kept.text, this.base)) {
      this.backup.drop(draft.id);
      this.useForm(editionForm(this.base));
      return;
    }
    this.useForm(editionForm(kept.text));
    if (kept.version === draft.version) {
      this.restored.set({ at: kept.at, serversText: this.base });
      this.autosave.note(this.text());
    } else {
      this.ownMerge.set(draft);
    }
  }

  /** Saves at once; resolves to whether everything typed is on the server. */
  flush(): Promise<boolean> {
    return this.autosave && !this.ownMerge()
      ? this.autosave.flush()
      : Promise.resolve(this.ownMerge() === null);
  }

  isSettled(): boolean {
    return this.ownMerge() === null && (this.autosave === null || this.autosave.isSettled());
  }

  version(): number {
    return this.autosave?.currentVersion() ?? this.draft().version;
  }

  /** Gives up what only this browser had and shows the server's text again. */
  takeServersText(): void {
    const restored = this.restored();
    if (restored === null) return;
    this.restored.set(null);
    this.putAside(mergeRows(restored.serversText, this.text(), restored.serversText), 'mine');
    this.useForm(editionForm(restored.serversText));
    this.changed();
  }

  /** Goes on with the text made of both sides. */
  finishMerge(rows: readonly MergeRow[]): void {
    const state = this.saveState();
    if (state.kind !== 'moved-on') return;
    const theirs = textOfDraft(state.theirs);
    const merged = mergedText(this.text(), theirs, rows);
    for (const row of rows)
      if (row.disputed || row.choice === 'theirs')
        this.putAside([row], row.choice === 'mine' ? 'theirs' : 'mine');
    this.base = theirs;
    this.keepPhotos(state.theirs.photos);
    this.openDraft.set(state.theirs);
    this.ownMerge.set(null);
    this.useForm(editionForm(merged));
    this.autosave?.continueFrom(state.theirs.version, merged);
    this.backup.keep(state.theirs.id, state.theirs.version, merged);
  }

  /** Takes what another call than a save has made of the draft: handed in, taken back. */
  adopt(draft: Draft): void {
    this.autosave?.adopt(draft);
    this.openDraft.set(draft);
  }

  keepPhotos(photos: readonly Photo[]): void {
    this.photos.update(
      (known) => new Map([...known, ...photos.map((photo): [number, Photo] => [photo.id, photo])]),
    );
  }

  /** Forgets what this browser kept; for a draft that is thrown away. */
  forgetBackup(): void {
    this.backup.drop(this.draft().id);
  }

  ngOnDestroy(): void {
    this.close();
  }

  private stateOfSaving(): SaveState {
    return this.savingState()?.() ?? { kind: 'saved', at: new Date() };
  }

  private useForm(form: EditionForm): void {
    this.changes.unsubscribe();
    this.openForm.set(form);
    this.text.set(textOf(form));
    this.changes = form.valueChanges.subscribe(() => this.changed());
  }

  private changed(): void {
    const text = textOf(this.form());
    this.text.set(text);
    this.backup.keep(this.draft().id, this.version(), text);
    this.autosave?.note(text);
  }

  private send(text: EditionText, version: number): Observable<Draft> {
    const broken = limitsBroken(text);
    return broken.length > 0
      ? throwError(() => limitsProblem(broken))
      : this.drafts.save(this.draft().id, text, version);
  }

  private problemOf(error: unknown): Problem {
    const { problem } = toApiProblem(error);
    const fields = contentFields(problem.fields ?? []);
    tellFields(this.form(), fields);
    return { ...problem, fields };
  }

  private wasSaved(draft: Draft): void {
    this.base = textOfDraft(draft);
    this.openDraft.set(draft);
    this.keepPhotos(draft.photos);
    if (this.autosave?.isSettled()) this.backup.drop(draft.id);
  }

  private putAside(rows: readonly MergeRow[], side: Side): void {
    this.setAside.update((texts) => [
      ...texts,
      ...rows.filter((row) => row[side] !== undefined).map((row) => ({ row, side })),
    ]);
  }

  private close(): void {
    this.changes.unsubscribe();
    this.autosave?.stop();
  }
}

const emptyText: EditionText = { content: emptyContent, changeNote: '' };

const changeNoteMissing: FieldProblem = {
  path: 'changeNote',
  message: 'is empty',
  remedy: 'Say in one line what is different from the edition that is published.',
};

function textOfDraft(draft: Draft): EditionText {
  return { content: draft.content, changeNote: draft.changeNote };
}
