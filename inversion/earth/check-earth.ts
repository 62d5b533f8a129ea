import { InversionError } from '../inversion-error';
import type { LayeredEarth } from '../types';

/** Throws `InversionError` unless the earth has N ≥ 1 positive resistivities and N − 1 positive thicknesses. */
export function requireEarth(earth: LayeredEarth): void {
  const layers = earth.resistivity.length;
  if (layers < 1) throw new InversionError('earth-shape', 'resistivity is empty; it needs one value a layer');
  if (earth.thickness.length !== layers - 1) {
    throw new InversionError(
      'earth-shape',
      `thickness has ${earth.thickness.length} entries; it must have ${layers - 1}, one fewer than resistivity`,
      ['thickness'],
    );
  }
  for (const key of ['resistivity', 'thickness'] as const) {
    earth[key].forEach((value, i) => {
      if (!(value > 0 && Number.isFinite(value)))
        throw new InversionError('earth-value', `${key} ${i + 1} is ${value}; it must be a number above 0`, [
          key,
          i,
        ]);
    });
  }
}
