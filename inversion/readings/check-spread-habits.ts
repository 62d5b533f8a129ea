import { sameSpread } from './curve-branches';
import { nameOf, say, type CheckedReading, type ReadingCheck } from './reading-check';
import { READING_TOLERANCES } from './reading-tolerances';
import { exp } from '../math/exponential';
import { hypot } from '../math/hypot';
import { log } from '../math/logarithm';

/** Schlumberger readings with a wide MN. K is exact all the same, so this is a word about the field, not about the number. */
export function checkWideMn(readings: readonly CheckedReading[]): ReadingCheck[] {
  const wide = readings.filter(
    ({ reading: { spread } }) =>
      spread.type === 'schlumberger' &&
      spread.halfMN !== null &&
      spread.halfAB <= READING_TOLERANCES.wideMn * spread.halfMN,
  );
  if (wide.length === 0) return [];
  return [
    {
      rows: wide.map(({ row }) => row),
      kind: 'wide-mn',
      message:
        `MN is wide beside AB at ${wide.map(nameOf).join(', ')}. K is exact for it, so ρa stands; ` +
        'but M and N close to A and B feel the ground beside the stakes.',
      rule: `AB above ${READING_TOLERANCES.wideMn}·MN`,
      source: 'ASTM D6431',
    },
  ];
}

/** Readings of one spread, taken more than once, that differ by more than their errors. */
export function checkRepeats(readings: readonly CheckedReading[]): ReadingCheck[] {
  return sameSpread(readings).flatMap((group) => {
    const sorted = group.toSorted(
      (a, b) => a.derived.apparentResistivityOhmM - b.derived.apparentResistivityOhmM,
    );
    const [low, high] = [sorted[0], sorted.at(-1)];
    if (!low || !high || low === high) return [];
    const difference = log(high.derived.apparentResistivityOhmM / low.derived.apparentResistivityOhmM);
    const error = hypot(low.derived.relativeError, high.derived.relativeError);
    if (difference <= READING_TOLERANCES.standardErrors * error) return [];
    return [
      {
        rows: group.map(({ row }) => row),
        kind: 'repeat-disagrees' as const,
        message:
          `${nameOf(low)} was read ${group.length} times, from ${say(low.derived.apparentResistivityOhmM, 4)} to ` +
          `${say(high.derived.apparentResistivityOhmM, 4)} Ω·m: ${say(100 * (exp(difference) - 1), 2)} % apart, ` +
          `where the errors explain ${say(100 * (exp(READING_TOLERANCES.standardErrors * error) - 1), 2)} %.`,
        rule: 'repeats agree within twice the error of their difference',
        source: 'errors of the readings, with the survey’s floor in quadrature',
      },
    ];
  });
}
