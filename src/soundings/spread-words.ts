import type { FitReading } from '../../server/contract/fit-settings';
import type { SpreadType } from '../../server/contract/spread';
import { formatGivenLength, withUnit } from '../ui/format';

const metres = (length: number): string => withUnit(formatGivenLength(length), 'm');

/** Within a sentence. */
export const SPREAD_NAMES: Record<SpreadType, string> = {
  schlumberger: 'Schlumberger',
  'half-schlumberger': 'half-Schlumberger',
  wenner: 'Wenner',
  'pole-pole': 'pole–pole',
  'dipole-dipole': 'dipole–dipole',
  electrodes: 'four electrodes',
};

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
      return `a ${metres(spread.dipole)}, n ${formatGivenLength(spread.n)}`;
    case 'electrodes':
      return `AM ${spread.am === null ? 'at infinity' : metres(spread.am)}`;
  }
}

/** MN/2 where it was written down, m: readings of one MN form a branch of the curve. */
export const halfMNOf = (spread: FitReading['spread']): number | undefined =>
  'halfMN' in spread ? (spread.halfMN ?? undefined) : undefined;

/** Name of a curve's x axis: AB/2 itself where the spread has one, else the AB/2 that reaches as deep. */
export const SPACING_AXIS: Record<SpreadType, string> = {
  schlumberger: 'AB/2, m',
  'half-schlumberger': 'AO, m',
  wenner: 'AB/2 (1.5 a), m',
  'pole-pole': 'AB/2 of equal depth, m',
  'dipole-dipole': 'AB/2 of equal depth, m',
  electrodes: 'AB/2 of equal depth, m',
};

/** Standing alone, as in a table or a list to choose from. */
export const SPREAD_LABELS: Record<SpreadType, string> = {
  schlumberger: 'Schlumberger',
  'half-schlumberger': 'Half-Schlumberger',
  wenner: 'Wenner',
  'pole-pole': 'Pole–pole',
  'dipole-dipole': 'Dipole–dipole',
  electrodes: 'Four electrodes anywhere',
};

export const SPREAD_OPTIONS = (Object.keys(SPREAD_LABELS) as SpreadType[]).map((value) => ({
  value,
  label: SPREAD_LABELS[value],
}));
