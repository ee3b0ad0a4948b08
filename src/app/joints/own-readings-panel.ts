import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { JointPage } from '../../../shared/contract/joints';
import { Instrument, instrumentWords } from '../../../shared/contract/vocabulary';
import { inchToMillimetre, millimetreToInch } from '../../../shared/fit/dimension';
import { featureSpecs } from '../../../shared/fit/feature-dimensions';
import { Icon } from '../ui/icon/icon';
import type { LengthUnit } from './fit-words';
import { hasReadings, readFigure, type OwnReadings, type Side } from './own-readings';

/** Fields for what the reader has read of the two parts in their hand. What is typed replaces the prediction at once. */
@Component({
  selector: 'sl-own-readings-panel',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './own-readings-panel.html',
  styleUrl: './own-readings-panel.scss',
})
export class OwnReadingsPanel {
  readonly joint = input.required<JointPage>();
  readonly own = input.required<OwnReadings>();
  /** Why the readings cannot be right together, by the judge. */
  readonly wrong = input<string | null>(null);
  readonly changed = output<OwnReadings>();

  protected readonly units: readonly LengthUnit[] = ['mm', 'in'];
  protected readonly instruments = Instrument.options
    .filter((value) => value !== 'count')
    .map((value) => ({ value, words: instrumentWords[value] }));
  protected readonly any = computed(() => hasReadings(this.own()));
  protected readonly sides = computed(() => {
    const { sideA, sideB } = this.joint();
    const own = this.own();
    return (
      [
        ['a', sideA],
        ['b', sideB],
      ] as const
    ).map(([name, side]) => ({
      name,
      part: side.part.name,
      feature: side.feature.name,
      attributes: featureSpecs[side.feature.kind].attributes.map((spec) => ({
        ...spec,
        id: `own-${name}-${spec.name}`,
        text: own[name][spec.name] ?? '',
      })),
      dimensions: featureSpecs[side.feature.kind].dimensions.map((spec) => {
        const text = own[name][spec.name] ?? '';
        return {
          ...spec,
          id: `own-${name}-${spec.name}`,
          symbol: spec.unit === 'mm' ? own.unit : spec.unit === 'deg' ? '°' : '',
          text,
          wrong: text.trim() !== '' && readFigure(text) === null,
        };
      }),
    }));
  });

  protected type(side: Side, name: string, text: string): void {
    const own = this.own();
    this.changed.emit({ ...own, [side]: { ...own[side], [name]: text } });
  }

  protected readWith(value: string): void {
    const instrument = Instrument.safeParse(value);
    if (instrument.success) this.changed.emit({ ...this.own(), instrument: instrument.data });
  }

  /** Lengths that stand in the fields are carried over to the other unit. */
  protected switchTo(unit: LengthUnit): void {
    const own = this.own();
    if (unit === own.unit) return;
    const carried = (name: Side): Record<string, string> => {
      const side = name === 'a' ? this.joint().sideA : this.joint().sideB;
      return Object.fromEntries(
        Object.entries(own[name]).map(([dimension, text]) => {
          const spec = featureSpecs[side.feature.kind].dimensions.find((entry) => entry.name === dimension);
          const value = readFigure(text);
          if (spec?.unit !== 'mm' || value === null) return [dimension, text];
          return [
            dimension,
            unit === 'in'
              ? millimetreToInch(value).toFixed(4)
              : String(Number(inchToMillimetre(value).toFixed(3))),
          ];
        }),
      );
    };
    this.changed.emit({ ...own, unit, a: carried('a'), b: carried('b') });
  }

  protected clear(): void {
    this.changed.emit({ ...this.own(), a: {}, b: {} });
  }
}
