import type { FitSettings } from '../contract/fit-settings';
import { AppError } from '../errors';

/** A fit needs at least one kept reading, and as many as the values it searches. */
export function requireEnoughReadings(kept: number, excluded: number, settings: FitSettings): void {
  const { layers, fixed } = settings;
  const unknowns = layers === 'auto' ? 1 : Math.max(1, 2 * layers - 1 - fixed.length);
  if (kept >= unknowns) return;
  const beds = layers === 1 || layers === 'auto' ? '1 bed' : `${layers} beds`;
  const most = Math.floor((kept + 1) / 2);
  const found = `${kept} kept ${kept === 1 ? 'reading' : 'readings'}, ${excluded} left out`;
  const allowed =
    most < 1
      ? 'at least 1 kept reading'
      : `at most ${most} ${most === 1 ? 'bed' : 'beds'} with ${kept} kept ${kept === 1 ? 'reading' : 'readings'}, or more values held`;
  throw new AppError(
    'invalid',
    `${beds} ${layers === 1 || layers === 'auto' ? 'has' : 'have'} ${unknowns} unknown ${unknowns === 1 ? 'value' : 'values'}, and the revision holds ${found}.`,
    { faults: [{ path: ['body', 'settings', 'layers'], message: 'too few readings', found, allowed }] },
  );
}
