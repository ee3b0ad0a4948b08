/** By revision letters: `{ ABC: 22.5, D: 19.2 }`. A letter that is left out has not been measured by anybody. */
export type ByLetters<Value> = Readonly<Record<string, Value>>;

/** What a feature really measures on each revision, which the demo's readings scatter round. */
export interface MeasuredFeature {
  readonly part: string;
  readonly feature: string;
  /** Dimensions by name, mm, degrees or counts. */
  readonly sizes: Readonly<Record<string, ByLetters<number>>>;
  /** Attributes by name, such as the designation of a thread. */
  readonly words: Readonly<Record<string, ByLetters<string>>>;
  /** How many people measured it, where that is told. */
  readonly people: ByLetters<number>;
}

export function measured(
  part: string,
  feature: string,
  sizes: MeasuredFeature['sizes'],
  words: MeasuredFeature['words'] = {},
  people: MeasuredFeature['people'] = {},
): MeasuredFeature {
  return { part, feature, sizes, words, people };
}

/** The value for one letter, or undefined. */
export function atLetter<Value>(values: ByLetters<Value>, letter: string): Value | undefined {
  return Object.entries(values).find(([letters]) => letters.includes(letter))?.[1];
}
