import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { instrumentWords } from '../../../../shared/contract/vocabulary';
import type { EditionView, RichText } from '../../../../shared/contract/write-ups';
import { CautionBox } from '../../ui/caution-box/caution-box';
import { PhotoCallouts } from '../../ui/photo-callouts/photo-callouts';
import { RichTextView } from '../../ui/rich-text/rich-text';
import { readingText } from '../figures';
import { FixSheet } from './fix-sheet';
import { JointSketch } from './joint-sketch';

/** An edition as readers see it: published, old, or in the editor's preview. Cautions stand above what they warn of. */
@Component({
  selector: 'sl-edition-page',
  imports: [CautionBox, FixSheet, JointSketch, PhotoCallouts, RichTextView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './edition-page.html',
  styleUrl: './edition-page.scss',
})
export class EditionPage {
  readonly view = input.required<EditionView>();

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
