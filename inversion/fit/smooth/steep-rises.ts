import { hypot } from '../../math/hypot';
import { log } from '../../math/logarithm';
import { READING_TOLERANCES } from '../../readings/reading-tolerances';
import { plottingSpacing } from '../../spread/plotting-spacing';
import type { Reading } from '../../types';

/** Spreads whose ρa rises no faster than the spacing over flat beds. */
const LIMITED = new Set(['schlumberger', 'half-schlumberger', 'wenner', 'pole-pole']);

function branchOf({ spread, branch = '' }: Reading): string {
  return `${spread.type} ${'halfMN' in spread ? String(spread.halfMN) : ''} ${branch}`;
}

/**
 * Pairs of readings (from 0), neighbours in spacing within one branch, between which ρa rises faster than any ground of flat
 * beds allows: slope above +1 on log–log axes beyond twice its standard error.
 */
export function steepRises(readings: readonly Reading[]): [number, number][] {
  const branches = new Map<string, number[]>();
  readings.forEach((reading, i) => {
    if (!LIMITED.has(reading.spread.type)) return;
    branches.set(branchOf(reading), [...(branches.get(branchOf(reading)) ?? []), i]);
  });
  const { steepestRise, standardErrors } = READING_TOLERANCES;
  const x = (i: number) => log(plottingSpacing(readings[i]!.spread));
  return [...branches.values()].flatMap((branch) => {
    const ordered = branch.toSorted((a, b) => x(a) - x(b));
    return ordered.slice(1).flatMap((to, k): [number, number][] => {
      const from = ordered[k]!;
      const run = x(to) - x(from);
      const rise = log(readings[to]!.apparentResistivity / readings[from]!.apparentResistivity);
      const error = hypot(readings[from]!.relativeError, readings[to]!.relativeError);
      return run > 0 && rise - standardErrors * error > steepestRise * run ? [[from, to]] : [];
    });
  });
}
