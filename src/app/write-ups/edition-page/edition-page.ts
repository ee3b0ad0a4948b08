import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { instrumentWords } from '../../../../shared/contract/vocabulary';
import type { EditionView, RichText } from '../../../../shared/contract/write-ups';
import { CautionBox } from '../../ui/caution-box/caution-box';
import { PhotoCallouts } from '../../ui/photo-callouts/photo-callouts';
import { RichTextView } from '../../ui/rich-text/rich-text';
import { readingText } from '../figures';
import { TellTheDesk } from '../../ui/tell-the-desk/tell-the-desk';
import { FixSheet } from './fix-sheet';
import { JointSketch } from './joint-sketch';

/** An edition as readers see it: published, old, or in the editor's preview. Cautions stand above what they warn of. */
@Component({
  selector: 'sl-edition-page',
  imports: [CautionBox, FixSheet, JointSketch, PhotoCallouts, RichTextView, TellTheDesk],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './edition-page.html',
  styleUrl: './edition-page.scss',
})
export class EditionPage {
  readonly view = input.required<EditionView>();
  /** The write-up it is published in; null in drafts and at the desk, where nobody is told of it. */
  readonly writeUpId = input<number | null>(null);

  protected readonly instruments = instrumentWords;
  protected readonly readings = computed(() =>
    this.view().readings.map((reading) => ({
      ...reading,
      figure:
        reading.value === null
          ? 'not entered'
          : readingText(reading.value, reading.uncertainty, reading.unit),
    })),
  );

  protected has(text: RichText): boolean {
    return text.html.trim() !== '';
  }
}
