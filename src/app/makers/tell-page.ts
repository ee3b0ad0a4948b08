import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { DomSanitizer, type SafeUrl } from '@angular/platform-browser';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import type { MakerLetter } from '../../../shared/contract/makers';
import { formSending } from '../core/form-sending';
import { loadEach } from '../core/load';
import { Field, Labelled } from '../ui/labelled/labelled';
import { LoadStateView } from '../ui/load-state/load-state';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { Makers } from './makers';

/** The letter that tells a maker of a write-up, as it would go out; sent from here. */
@Component({
  selector: 'sl-tell-page',
  imports: [DatePipe, Field, Labelled, LoadStateView, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './tell-page.html',
  styleUrl: './tell-page.scss',
})
export class TellPage {
  private readonly makers = inject(Makers);
  private readonly sanitizer = inject(DomSanitizer);
  private readonly undo = inject(Undo);
  private readonly params = inject(ActivatedRoute).paramMap.pipe(
    map((params) => ({ slug: params.get('slug') ?? '', maker: params.get('maker') ?? '' })),
  );
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({ note: new FormControl('', { nonNullable: true }) });
  protected readonly loaded = loadEach(this.params, (params) =>
    this.makers.letter(params.slug, params.maker).pipe(map((letter) => ({ ...params, letter }))),
  );
  protected readonly page = linkedSignal(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  /** As a picture, in which no script runs whatever stands in it. */
  protected readonly drawing = computed((): SafeUrl | null => {
    const svg = this.page()?.letter.drawing;
    return svg
      ? this.sanitizer.bypassSecurityTrustUrl(`data:image/svg+xml;utf8,${encodeURIComponent(svg)}`)
      : null;
  });

  protected sizeOf({ bytes }: MakerLetter['attachments'][number]): string {
    return `${Math.max(1, Math.round(bytes / 1024))} kB`;
  }

  protected send(): void {
    const page = this.page();
    if (!page) return;
    this.sending.send(
      this.form,
      () => this.makers.sendLetter(page.slug, page.maker, this.form.controls.note.value),
      (letter) => {
        this.page.set({ ...page, letter });
        this.undo.tell(`${letter.maker.name} is told.`);
      },
    );
  }
}
