import { hasCells } from '../fit/smooth/has-cells';
import { isHeldRange } from '../held-range';
import { amount, threeDigits } from '../three-digits';
import type { FitResult } from '../types';
import { chiSquaredSurvival } from '../uncertainty/chi-squared';

/** "the thickness of bed 2 at 25.5 m", one a held value; of cells nothing. */
function heldValues(result: FitResult): string[] {
  if (hasCells(result)) return [];
  return (['resistivity', 'thickness'] as const).flatMap((on) =>
    result.intervals[on].flatMap((range, bed) =>
      isHeldRange(range)
        ? [`the ${on} of bed ${bed + 1} at ${amount(range[0]!, on === 'resistivity' ? 'Ω·m' : 'm')}`]
        : [],
    ),
  );
}

/** "Run A holds the thickness of bed 2 at 25.5 m; …": what two results hold, and what hangs on it; null where neither does. */
export function heldSentence(results: readonly FitResult[], names: readonly string[]): string | null {
  const told = results.flatMap((result, i) => {
    const held = heldValues(result);
    return held.length === 0 ? [] : [`${names[i]!} holds ${held.join(', ')}`];
  });
  if (told.length === 0) return null;
  const [first, ...others] = told.map((words) => `${words}, which the readings did not find`);
  const rest = others.map((words) => words.replace(/^The /, 'the '));
  return `${[first, ...rest].join('; ')}. Other ranges of ${told.length === 1 ? 'that model' : 'both'} hold only if that is so.`;
}

/** The readings speak against what is held where so large a rise of χ² comes about by chance in fewer cases than this. */
const REFUSED = 0.05;

/**
 * What holding cost, where one model leaves free all that the other of as many beds holds: the rise of χ² by the chance of so
 * large a one with as many degrees of freedom as values are held more (Wilks 1938). null where it is no more than chance gives.
 */
export function heldCostSentence(
  results: readonly [FitResult, FitResult],
  names: readonly string[],
): string | null {
  const held = results.map((result) => new Set(heldValues(result)));
  const more = held[0]!.size > held[1]!.size ? 0 : 1;
  const [holding, free] = [results[more], results[1 - more]!];
  const readings = holding.residuals.length;
  const extra = held[more]!.size - held[1 - more]!.size;
  const nested =
    extra > 0 &&
    readings === free.residuals.length &&
    holding.earth.resistivity.length === free.earth.resistivity.length &&
    [...held[1 - more]!].every((value) => held[more]!.has(value));
  if (!nested) return null;
  const rise = readings * (holding.chi2PerReading - free.chi2PerReading);
  const chance = chiSquaredSurvival(Math.max(0, rise), extra);
  if (chance >= REFUSED) return null;
  const percent = chance < 1e-4 ? 'less than 0.01' : threeDigits(100 * chance);
  return `The readings speak against ${extra === 1 ? 'the value' : `the ${extra} values`} that ${names[more]!.replace(/^The /, 'the ')} holds: χ² rises by ${threeDigits(rise)} for ${extra === 1 ? 'it' : 'them'} (chance ${percent}\u00a0%).`;
}
