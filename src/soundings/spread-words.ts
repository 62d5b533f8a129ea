import type { SpreadType } from '../../server/contract/spread';

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
