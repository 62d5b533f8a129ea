import type { FitReading } from '../../server/contract/fit';
import { formatLength, formatSignificant, withUnit } from '../ui/format';

const metres = (length: number): string => withUnit(formatLength(length), 'm');

/** A reading as the crew calls it: "AB/2 6.8 m". */
export function spacingLabel(spread: FitReading['spread']): string {
  switch (spread.type) {
    case 'schlumberger':
      return `AB/2 ${metres(spread.halfAB)}`;
    case 'half-schlumberger':
      return `AO ${metres(spread.halfAB)}`;
    case 'wenner':
      return `a ${metres(spread.spacing)}`;
    case 'pole-pole':
      return `AM ${metres(spread.spacing)}`;
    case 'dipole-dipole':
      return `a ${metres(spread.dipole)}, n ${formatSignificant(spread.n, 3)}`;
    case 'electrodes':
      return `AM ${spread.am === null ? 'at infinity' : metres(spread.am)}`;
  }
}
