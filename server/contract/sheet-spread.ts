import type { Spread } from '../../inversion/types';
import type { CellFault } from './cell-fault';
import { SHEET_COLUMN_NAMES, type NumberColumnName } from './sheet-columns';
import type { SpreadType } from './spread';

/** The lengths of one row in m; null = nothing written, or at infinity. */
export type SheetLengths = { [column in NumberColumnName]?: number | null };

const missing = (column: NumberColumnName): CellFault => ({
  column,
  found: '',
  message: 'is missing',
  allowed: column === 'n' ? 'a number above 0' : 'a length above 0',
});

/** The four distances of which an electrode at infinity takes two. */
const ELECTRODE_PAIRS = [
  ['am', 'an'],
  ['bm', 'bn'],
  ['am', 'bm'],
  ['an', 'bn'],
] as const;
const DISTANCES = ['am', 'an', 'bm', 'bn'] as const;

/** A blank that no electrode at infinity explains is a forgotten value, and K would be wrong without a word. */
function infinityFault(lengths: SheetLengths): CellFault | null {
  const absent = DISTANCES.filter((column) => (lengths[column] ?? null) === null);
  if (absent.length === DISTANCES.length) return missing('am');
  const unexplained = absent.find(
    (column) =>
      !ELECTRODE_PAIRS.some(
        (pair) => pair.some((name) => name === column) && pair.every((name) => absent.includes(name)),
      ),
  );
  return unexplained
    ? {
        ...missing(unexplained),
        message: `${SHEET_COLUMN_NAMES[unexplained]} alone cannot be at infinity: an electrode there takes two distances`,
        allowed: 'a length above 0, or both distances of the electrode at infinity left blank or ∞',
      }
    : null;
}

/** The spread that the lengths of a row make, or the length that is missing. */
export function spreadOfLengths(spreadType: SpreadType, lengths: SheetLengths): Spread | CellFault {
  const { halfAB, spacing, dipole, n } = lengths;
  switch (spreadType) {
    case 'schlumberger':
    case 'half-schlumberger': {
      const halfMN = lengths.halfMN ?? null;
      if (halfAB === null || halfAB === undefined) return missing('halfAB');
      if (halfMN !== null && halfMN >= halfAB)
        return {
          column: 'halfMN',
          found: '',
          message: `is ${halfMN} m, and ${spreadType === 'schlumberger' ? 'AB/2' : 'AO'} is ${halfAB} m`,
          allowed: `a length below ${halfAB} m`,
        };
      return { type: spreadType, halfAB, halfMN };
    }
    case 'wenner':
    case 'pole-pole':
      return spacing === null || spacing === undefined ? missing('spacing') : { type: spreadType, spacing };
    case 'dipole-dipole':
      if (dipole === null || dipole === undefined) return missing('dipole');
      return n === null || n === undefined ? missing('n') : { type: spreadType, dipole, n };
    case 'electrodes': {
      const { am = null, an = null, bm = null, bn = null } = lengths;
      return infinityFault(lengths) ?? { type: spreadType, am, an, bm, bn };
    }
  }
}

/** The lengths of a spread by column, in m. */
export function spreadLengths(spread: Spread): readonly (readonly [NumberColumnName, number | null])[] {
  switch (spread.type) {
    case 'schlumberger':
    case 'half-schlumberger':
      return [
        ['halfAB', spread.halfAB],
        ['halfMN', spread.halfMN],
      ];
    case 'wenner':
    case 'pole-pole':
      return [['spacing', spread.spacing]];
    case 'dipole-dipole':
      return [
        ['dipole', spread.dipole],
        ['n', spread.n],
      ];
    case 'electrodes':
      return DISTANCES.map((column) => [column, spread[column]] as const);
  }
}
