import { plottingSpacing } from '../../inversion';
import type { FitReading } from '../../server/contract/fit-settings';

type Spread = FitReading['spread'];

interface PlacedSpread {
  spread: Spread;
  /** On the axis of the curve, m. */
  spacing: number;
}

/** A place on a curve: the spread that would read there. */
export interface CurvePlace extends PlacedSpread {
  /** The curve begins anew here: this branch starts before the one above it ends. */
  startsBranch: boolean;
}

const STEPS_PER_DECADE = 24;
/** With more different spreads than this, the readings themselves lie close enough for a curve. */
const MOST_SPREADS = 250;

/** Spreads of one branch are alike but for their length; null where no length stands between two of them. */
function branchOf(spread: Spread): { key: string; length: number; at: (length: number) => Spread } | null {
  switch (spread.type) {
    case 'schlumberger':
    case 'half-schlumberger':
      return {
        key: `${spread.type} ${spread.halfMN}`,
        length: spread.halfAB,
        at: (halfAB) => ({ ...spread, halfAB }),
      };
    case 'wenner':
    case 'pole-pole':
      return { key: spread.type, length: spread.spacing, at: (spacing) => ({ ...spread, spacing }) };
    case 'dipole-dipole':
      return { key: `${spread.type} ${spread.dipole}`, length: spread.n, at: (n) => ({ ...spread, n }) };
    case 'electrodes':
      return null;
  }
}

/** From one spread to the next in even steps of ln length, the first left out and the last given. */
function stepsBetween(from: Spread, to: Spread): Spread[] {
  const [first, last] = [branchOf(from), branchOf(to)];
  if (!first || !last || first.key !== last.key) return [to];
  const ratio = last.length / first.length;
  const count = Math.max(1, Math.ceil(Math.abs(Math.log10(ratio)) * STEPS_PER_DECADE));
  return Array.from({ length: count }, (_, i) =>
    i === count - 1 ? to : first.at(first.length * ratio ** ((i + 1) / count)),
  );
}

const placed = (spread: Spread): PlacedSpread => ({ spread, spacing: plottingSpacing(spread) });

/** Each spread once, by branch, and in a branch by its spacing. */
function branchesOf(spreads: readonly Spread[]): PlacedSpread[][] {
  const branches = new Map<string, Map<number, PlacedSpread>>();
  for (const place of spreads.map(placed)) {
    const key = branchOf(place.spread)?.key ?? '';
    const branch = branches.get(key) ?? new Map<number, PlacedSpread>();
    branches.set(key, branch.set(place.spacing, place));
  }
  const bySpacing = (a: PlacedSpread | undefined, b: PlacedSpread | undefined) =>
    (a?.spacing ?? 0) - (b?.spacing ?? 0);
  return [...branches.values()]
    .map((branch) => [...branch.values()].toSorted(bySpacing))
    .toSorted(([a], [b]) => bySpacing(a, b));
}

/**
 * Where a predicted curve is to be computed so that it is drawn as a curve: every spread that was read, and between
 * two of one branch (one MN, one dipole) further ones evenly in the logarithm. Empty where the readings are dense.
 */
export function curvePlaces(spreads: readonly Spread[]): CurvePlace[] {
  const branches = branchesOf(spreads);
  if (branches.flat().length > MOST_SPREADS) return [];
  let reach = 0;
  return branches.flatMap((branch) => {
    const dense = branch.flatMap((place, i) => {
      const before = branch[i - 1];
      return before ? stepsBetween(before.spread, place.spread).map(placed) : [place];
    });
    const passed = reach;
    reach = Math.max(reach, dense.at(-1)?.spacing ?? 0);
    return dense.map((place, i) => ({ ...place, startsBranch: i === 0 && place.spacing <= passed }));
  });
}
