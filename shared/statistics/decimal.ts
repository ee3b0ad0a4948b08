/** A finite decimal as `digits × 10^-scale`, exact. */
export interface Decimal {
  readonly digits: bigint;
  readonly scale: number;
}

/**
 * The decimal that a person typed to get this double: its shortest round-trip form. Sums over such decimals are exact,
 * where sums over doubles lose the digits that a standard deviation of large, close readings lives on
 * (NIST StRD NumAcc4: about 8 correct digits from doubles, all of them from decimals).
 * Throws RangeError for what is not finite.
 */
export function decimalOf(value: number): Decimal {
  if (!Number.isFinite(value)) throw new RangeError('A reading must be a finite number.');
  const match = /^(-?)(\d+)(?:\.(\d+))?(?:e([+-]\d+))?$/.exec(String(value));
  if (!match) throw new RangeError(`${value} has no decimal form.`);
  const [, sign = '', whole = '0', fraction = '', exponent = '0'] = match;
  const shift = Number(exponent) - fraction.length;
  const digits = BigInt(`${sign}${whole}${fraction}`);
  return shift > 0 ? { digits: digits * 10n ** BigInt(shift), scale: 0 } : { digits, scale: -shift };
}

/** The same decimals as integers over one common power of ten. */
export function toCommonScale(decimals: readonly Decimal[]): { digits: bigint[]; scale: number } {
  const scale = decimals.reduce((largest, decimal) => Math.max(largest, decimal.scale), 0);
  return { digits: decimals.map((decimal) => decimal.digits * 10n ** BigInt(scale - decimal.scale)), scale };
}

/** numerator / denominator as the nearest double to about 17 digits, for any sizes of the two; denominator > 0. */
export function ratioToNumber(numerator: bigint, denominator: bigint): number {
  if (numerator < 0n) return -ratioToNumber(-numerator, denominator);
  if (numerator === 0n) return 0;
  // 25 significant digits before the one rounding to double.
  const shift = 25 - (numerator.toString().length - denominator.toString().length);
  const quotient =
    shift >= 0
      ? (numerator * 10n ** BigInt(shift)) / denominator
      : numerator / (denominator * 10n ** BigInt(-shift));
  return Number(`${quotient}e${-shift}`);
}
