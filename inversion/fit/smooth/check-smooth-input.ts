import { InversionError } from '../../inversion-error';
import type { FitSettings, Reading } from '../../types';
import { requireReadingsAndBounds } from '../check-fit-input';
import { FEWEST_CELLS, MOST_CELLS } from './cell-grid';

/** Throws `InversionError` with the path of the first input that a smooth or stepped fit cannot use. */
export function requireSmoothInput(readings: readonly Reading[], settings: FitSettings): void {
  requireReadingsAndBounds(readings, settings);
  const { layers, targetMisfit } = settings;
  if (layers !== 'auto' && !(Number.isInteger(layers) && layers >= FEWEST_CELLS && layers <= MOST_CELLS))
    throw new InversionError(
      'layer-count',
      `layers is ${layers}; a ${settings.kind} ground has ${FEWEST_CELLS} to ${MOST_CELLS} cells, or "auto"`,
      ['settings', 'layers'],
    );
  if (targetMisfit !== undefined && !(targetMisfit > 0 && Number.isFinite(targetMisfit)))
    throw new InversionError('target-misfit', `targetMisfit is ${targetMisfit}; it must be a χ²/N above 0`, [
      'settings',
      'targetMisfit',
    ]);
  const layeredOnly = [
    ['fixed', 'fixed-parameter', settings.fixed.length > 0],
    ['priors', 'prior', settings.priors.length > 0],
    ['start', 'earth-shape', settings.start !== undefined],
  ] as const;
  for (const [field, code, stated] of layeredOnly)
    if (stated)
      throw new InversionError(
        code,
        `${field} belongs to a layered fit; a ${settings.kind} ground has no beds`,
        ['settings', field],
      );
}
