import type { ParamMap } from '@angular/router';
import { Instrument } from '../../../shared/contract/vocabulary';
import type { Instrument as InstrumentName } from '../../../shared/contract/vocabulary';
import type { LengthUnit } from './fit-words';

export type Side = 'a' | 'b';

/** What the reader has typed of the parts in their hand: text by the name of the dimension or attribute. */
export interface OwnReadings {
  readonly a: Readonly<Record<string, string>>;
  readonly b: Readonly<Record<string, string>>;
  readonly instrument: InstrumentName;
  readonly unit: LengthUnit;
}

const nameAndText = /^([ab])\.([a-z][A-Za-z]{0,39}):(.{1,40})$/;
const mostReadings = 24;

/** What an address says; what it does not say, or cannot be read, is left out. */
export function ownReadingsIn(params: ParamMap, unit: LengthUnit): OwnReadings {
  const sides: Record<Side, Record<string, string>> = { a: {}, b: {} };
  for (const text of params.getAll('own').slice(0, mostReadings)) {
    const [, side, name, value] = nameAndText.exec(text) ?? [];
    if (side && name && value) sides[side as Side][name] = value;
  }
  const instrument = Instrument.safeParse(params.get('with'));
  const named = params.get('unit');
  return {
    ...sides,
    instrument: instrument.success ? instrument.data : 'caliper',
    unit: named === 'mm' || named === 'in' ? named : unit,
  };
}

/** The part of an address that holds the readings; null takes a name out of it. */
export function addressOfOwn(own: OwnReadings): Record<'own' | 'with' | 'unit', string | string[] | null> {
  const of = (side: Side): string[] =>
    Object.entries(own[side])
      .filter(([, text]) => text.trim() !== '')
      .map(([name, text]) => `${side}.${name}:${text.trim()}`);
  const readings = [...of('a'), ...of('b')];
  return {
    own: readings.length > 0 ? readings : null,
    with: readings.length > 0 && own.instrument !== 'caliper' ? own.instrument : null,
    unit: own.unit,
  };
}

export function hasReadings(own: OwnReadings): boolean {
  return [...Object.values(own.a), ...Object.values(own.b)].some((text) => text.trim() !== '');
}

/** A figure as typed, with point or comma; null where it is none. */
export function readFigure(text: string): number | null {
  const plain = text.trim().replace(',', '.').replace('−', '-');
  if (!/^[-+]?(?:\d+\.?\d*|\.\d+)$/.test(plain)) return null;
  return Number(plain);
}
