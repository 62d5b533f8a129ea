import { InversionError } from '../../inversion-error';
import type { EnsembleProgress } from './ensemble-types';

export interface SampleOptions {
  readonly onProgress?: (progress: EnsembleProgress) => void;
  /** asked after every few hundred moves; true ends the run with an `InversionError` of code 'stopped' */
  readonly shouldStop?: () => boolean;
}

/** Tells where the run stands, and ends it where that is wished. */
export function reporter({ onProgress, shouldStop }: SampleOptions): (progress: EnsembleProgress) => void {
  return (progress) => {
    if (shouldStop?.()) throw new InversionError('stopped', 'the run was stopped before its end');
    onProgress?.(progress);
  };
}
