import type { FitResult, FitSettings, Reading } from '../types';
import { fitLayered, type FitOptions } from './fit-layered';
import { fitSmooth } from './smooth/fit-smooth';

/** The fit of one sounding by the kind that its settings name. Throws `InversionError` with a path; inputs are not changed. */
export function fitEarth(
  readings: readonly Reading[],
  settings: FitSettings,
  options: FitOptions = {},
): FitResult {
  return (settings.kind === 'layered' ? fitLayered : fitSmooth)(readings, settings, options);
}
