import { MOST_LAYERS, requireFitInput } from '../fit/check-fit-input';
import { InversionError, type InversionErrorCode } from '../inversion-error';
import { magnitudeFault } from '../magnitudes';
import type { LineBorehole, LineSettings, LineSounding } from './line-types';

/** Scales outside of these are as good as one ground throughout, or as no tie. */
const LATERAL_RANGE = [1e-3, 100] as const;
const FARTHEST = 1e9;

function refuse(code: InversionErrorCode, message: string, path: (string | number)[]): never {
  throw new InversionError(code, message, path);
}

function requirePlace(x: number, path: (string | number)[]): void {
  if (!(Math.abs(x) <= FARTHEST))
    refuse('line-place', `x is ${x}; it must be a number of metres`, [...path, 'x']);
}

function requireSounding({ x, readings }: LineSounding, settings: LineSettings, i: number): void {
  requirePlace(x, ['soundings', i]);
  try {
    requireFitInput(readings, settings);
  } catch (error) {
    if (!(error instanceof InversionError) || error.path[0] !== 'readings') throw error;
    refuse(error.code, error.message, ['soundings', i, ...error.path]);
  }
}

function requireLateral({ lateral }: LineSettings): void {
  const [low, high] = LATERAL_RANGE;
  for (const key of ['resistivity', 'depth'] as const)
    if (!(lateral[key] >= low && lateral[key] <= high))
      refuse('lateral', `the lateral scale of ${key} is ${lateral[key]}; it must be from ${low} to ${high}`, [
        'settings',
        'lateral',
        key,
      ]);
}

function requireBorehole({ x, contacts }: LineBorehole, layers: LineSettings['layers'], b: number): void {
  const path = ['settings', 'boreholes', b];
  requirePlace(x, path);
  const boundaries = (layers === 'auto' ? MOST_LAYERS : layers) - 1;
  contacts.forEach(({ boundary, depth, sigma }, c) => {
    const at = [...path, 'contacts', c];
    if (!(Number.isInteger(boundary) && boundary >= 0 && boundary < boundaries))
      refuse(
        'borehole',
        boundaries > 0
          ? `the boundary of the contact is ${boundary}; it must be a whole number from 0 to ${boundaries - 1}`
          : 'one layer has no boundary for a contact',
        [...at, 'boundary'],
      );
    for (const [field, value] of Object.entries({ depth, sigma })) {
      const fault = magnitudeFault(value, 'thickness');
      if (fault) refuse('borehole', `${field} of the contact is ${value}; ${fault}`, [...at, field]);
    }
    const crossed = contacts.slice(0, c).find((one) => (one.boundary - boundary) * (one.depth - depth) <= 0);
    if (crossed)
      refuse(
        'borehole',
        `boundary ${boundary} at ${depth} m does not agree with boundary ${crossed.boundary} at ${crossed.depth} m; a borehole meets each boundary once, each below the one before`,
        at,
      );
  });
}

/** Throws `InversionError` with the path of the first input that a fit of a line cannot use. */
export function requireLineInput(soundings: readonly LineSounding[], settings: LineSettings): void {
  if (soundings.length === 0)
    refuse('no-readings', 'there are no soundings; a line needs at least one', ['soundings']);
  soundings.forEach((sounding, i) => requireSounding(sounding, settings, i));
  requireLateral(settings);
  settings.boreholes.forEach((borehole, b) => requireBorehole(borehole, settings.layers, b));
}
