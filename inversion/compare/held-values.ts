import { hasCells } from '../fit/smooth/has-cells';
import { isHeldRange } from '../held-range';
import { amount } from '../three-digits';
import type { FitResult } from '../types';

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
