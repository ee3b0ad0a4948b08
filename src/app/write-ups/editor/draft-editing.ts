import { Injectable, computed, inject, signal, type OnDestroy } from '@angular/core';
import { Subscription, type Observable } from 'rxjs';
import { emptyContent } from '../../../../shared/contract/edition-content';
import { missingFromContent } from '../../../../shared/contract/edition-completeness';
import type { Photo } from '../../../../shared/contract/photos';
import type { FieldProblem, Problem } from '../../../../shared/contract/problem';
import type { MergeGround } from '../../../../shared/contract/proposed-editions';
import type { Draft } from '../../../../shared/contract/write-ups';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { same } from '../../../../shared/editions/same';
import { toApiProblem } from '../../core/api-problem';
import { tellFields } from '../../core/told-fields';
import { Autosave, type SaveState, type Saved } from './autosave';
import { DraftBackup } from './draft-backup';
import { Drafts } from './drafts';
import { editionForm, textOf, type EditionForm } from './edition-form';
import { contentFields } from './edition-limits';
import type { MergeResult } from './merge-panel';
import { mergingWithDraft, mergingWithEdition, textOfDraft, type Merging } from './merging';
import { saveWhatCan } from './partial-save';
import { PartDirectory } from './part-directory';
import { typedBeyond, type SetAside } from './set-aside';

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
  /** Texts that were not taken when two were merged; kept in sight so that nothing is lost. */
  readonly setAside = signal<readonly SetAside[]>([]);
  /** Whether this browser could keep what is not saved. */
  readonly kept = signal(false);
  /** Set when the server has a newer version than this editor knows of: theirs, and what both began from. */
  private readonly ownMerge = signal<{ theirs: Draft; base: EditionText } | null>(null);
  /** Set when the text is to be merged with the edition that was published since it was begun. */
  private readonly editionMerge = signal<MergeGround | null>(null);
  /** The published edition that the text was merged with and that no save has named yet. */
  private mergedWith: number | undefined;
  private readonly savingState = signal<(() => SaveState) | null>(null);
  readonly saveState = computed<SaveState>(() => {
    const own = this.ownMerge();
    return own ? { kind: 'moved-on', theirs: own.theirs } : this.stateOfSaving();
  });
  /** What is to be merged before the form goes on; the draft's own two texts come before a published edition. */
  readonly merging = computed<Merging | null>(() => {
    const state = this.saveState();
    const ground = this.editionMerge();
    const mine = this.text();
    const photos = this.photos();
    if (state.kind === 'moved-on') {
      const base = this.ownMerge()?.base ?? this.base;
      return mergingWithDraft(state.theirs, { base, mine, photos });
    }
    return ground && mergingWithEdition(ground, { mine, photos });
  });
  /** Fields that could not be saved as they are; they are kept in this browser. */
  readonly heldBack = computed<readonly FieldProblem[]>(() => {
    const state = this.saveState();
    if (state.kind === 'partly-saved') return state.heldBack;
    return state.kind === 'not-saved' ? (state.why.fields ?? []) : [];
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
    this.setAside.set(this.backup.findSetAside(draft.id));
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
    this.learnParts(this.base);

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
      this.ownMerge.set({ theirs: draft, base: kept.base });
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
    this.keepAside([
      ...this.setAside(),
      ...typedBeyond(restored.serversText, this.text(), this.directory.namesWith(this.photos())),
    ]);
    this.useForm(editionForm(restored.serversText));
    this.changed();
  }

  /** Opens the merge with the edition that was published since the draft was begun. */
  mergeWith(ground: MergeGround): void {
    this.keepPhotos([...ground.current.photos, ...(ground.base?.photos ?? [])]);
    this.learnParts({ content: ground.current.content, changeNote: '' });
    this.editionMerge.set(ground);
  }

  /** Whether a refusal was a text that has moved on; the merge is open then. */
  tookMovedOn(problem: Problem): boolean {
    if (!problem.type.endsWith('/edition-moved-on')) return false;
    if (problem.status === 409) {
      this.mergedWith = undefined;
      this.mergeWith(problem as unknown as MergeGround);
    } else {
      this.ownMerge.set({ theirs: problem.current as Draft, base: this.base });
    }
    return true;
  }

  /** Goes on with the text made of both sides. */
  finishMerge({ text, setAside }: MergeResult): void {
    const state = this.saveState();
    const ground = this.editionMerge();
    this.keepAside([...this.setAside(), ...setAside]);
    if (state.kind === 'moved-on') {
      this.base = textOfDraft(state.theirs);
      this.keepPhotos(state.theirs.photos);
      this.openDraft.set(state.theirs);
      this.ownMerge.set(null);
      this.useForm(editionForm(text));
      this.autosave?.continueFrom(state.theirs.version, text);
    } else if (ground !== null) {
      this.mergedWith = ground.current.edition.id;
      this.editionMerge.set(null);
      this.useForm(editionForm(text));
      this.autosave?.note(text);
    }
    this.keepHere();
  }

  keepAside(texts: readonly SetAside[]): void {
    this.setAside.set(texts);
    this.backup.keepSetAside(this.draft().id, texts);
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
    this.keepHere();
    this.autosave?.note(text);
  }

  private keepHere(): void {
    this.kept.set(this.backup.keep(this.draft().id, this.version(), this.text(), this.base));
  }

  private learnParts({ content }: EditionText): void {
    const ids = content.joints.flatMap((joint) => [joint.a.partId, joint.b.partId]);
    this.directory.learn(ids.filter((id) => id !== null)).subscribe();
  }

  private send(text: EditionText, version: number): Observable<Saved> {
    return saveWhatCan(text, {
      saved: this.base,
      always: this.mergedWith !== undefined,
      told: (heldBack) => tellFields(this.form(), heldBack),
      send: (rest) => this.drafts.save(this.draft().id, rest, version, this.mergedWith),
    });
  }

  private problemOf(error: unknown): Problem {
    const { problem } = toApiProblem(error);
    if (problem.status === 409) this.tookMovedOn(problem);
    const fields = contentFields(problem.fields ?? []);
    tellFields(this.form(), fields);
    return { ...problem, fields };
  }

  private wasSaved(draft: Draft): void {
    this.base = textOfDraft(draft);
    if (draft.base?.id === this.mergedWith) this.mergedWith = undefined;
    this.openDraft.set(draft);
    this.keepPhotos(draft.photos);
    if (this.autosave?.isSettled()) this.backup.drop(draft.id);
    else this.keepHere();
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
