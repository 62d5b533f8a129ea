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

/** What the spacing axis of a curve is called. */
export const SPACING_LABELS: Record<SpreadType, string> = {
  schlumberger: 'AB/2',
  'half-schlumberger': 'AO',
  wenner: 'AB/2 (1.5 a)',
  'pole-pole': 'effective AB/2',
  'dipole-dipole': 'effective AB/2',
  electrodes: 'effective AB/2',
};
