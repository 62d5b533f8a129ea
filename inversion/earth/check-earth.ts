import { InversionError } from '../inversion-error';
import { magnitudeFault } from '../magnitudes';
import type { LayeredEarth } from '../types';

/** Throws `InversionError` unless the earth has N ≥ 1 positive resistivities and N − 1 positive thicknesses; `path` says where it stands. */
export function requireEarth(earth: LayeredEarth, path: readonly (string | number)[] = []): void {
  const layers = earth.resistivity.length;
  if (layers < 1)
    throw new InversionError('earth-shape', 'resistivity is empty; it needs one value a layer', [
      ...path,
      'resistivity',
    ]);
  if (earth.thickness.length !== layers - 1) {
    throw new InversionError(
      'earth-shape',
      `thickness has ${earth.thickness.length} entries; it must have ${layers - 1}, one fewer than resistivity`,
      [...path, 'thickness'],
    );
  }
  for (const key of ['resistivity', 'thickness'] as const) {
    earth[key].forEach((value, i) => {
      const fault = magnitudeFault(value, key);
      if (fault)
        throw new InversionError('earth-value', `${key} ${i + 1} is ${value}; ${fault}`, [...path, key, i]);
    });
  }
}
