import { threeDigits } from '../../inversion/three-digits';
import type { FitProgress } from '../../inversion/types';
import type { FitSettings } from '../contract/fit-settings';

export interface ProgressReport {
  /** share of the work that is done, from 0 to below 1 */
  readonly share: number;
  readonly text: string;
}

const MOST_LAYERS = 8;
const workUpTo = (layers: number): number => (layers * (layers + 1)) / 2;

/** Steps after which about two thirds of a smooth or stepped fit are done. */
const SMOOTH_STEPS = 60;

/** Says in a share and in words where a fit stands. An automatic choice tries 1 to 8 layers; more layers take longer. */
export function progressReport(
  progress: FitProgress,
  { kind, layers }: Pick<FitSettings, 'kind' | 'layers'>,
): ProgressReport {
  const { start, starts, iteration } = progress;
  const misfit = Number.isFinite(progress.chi2PerReading)
    ? `, χ²/N\u00a0${threeDigits(progress.chi2PerReading)}`
    : '';
  if (kind !== 'layered')
    return {
      share: Math.min(0.99, 1 - Math.exp(-iteration / SMOOTH_STEPS)),
      text: `${progress.layers} cells, step ${iteration}${misfit}`,
    };
  const ofThisCount = starts > 0 ? Math.min(1, Math.max(0, (start - 1) / starts)) : 0;
  const before = workUpTo(progress.layers - 1);
  const share =
    layers === 'auto' ? (before + progress.layers * ofThisCount) / workUpTo(MOST_LAYERS) : ofThisCount;
  const beds = progress.layers === 1 ? '1 bed' : `${progress.layers} beds`;
  return { share: Math.min(0.99, share), text: `${beds}, start ${start} of ${starts}${misfit}` };
}
