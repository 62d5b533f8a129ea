import { readFileSync } from 'node:fs';
import type { FitSettings, Reading } from '../../inversion';

interface ReferenceCase {
  id: string;
  layers: number;
  relative_error: number;
  best_chi2_per_datum: number;
  readings: { halfAB: number; halfMN: number; rhoa: number }[];
}

/** One curve of the reference set as a line of the command line. */
export interface FitJob {
  readonly id: string;
  readonly readings: Reading[];
  readonly settings: FitSettings & { layers: number };
  /** the least misfit that is known */
  readonly best: number;
}

export function referenceJobs(): FitJob[] {
  const file = new URL('../../tests/reference/inversion.json', import.meta.url);
  const { cases } = JSON.parse(readFileSync(file, 'utf8')) as { cases: ReferenceCase[] };
  return cases.map((one) => ({
    id: one.id,
    best: one.best_chi2_per_datum,
    readings: one.readings.map(({ halfAB, halfMN, rhoa }) => ({
      spread: { type: 'schlumberger', halfAB, halfMN } as const,
      apparentResistivity: rhoa,
      relativeError: one.relative_error,
    })),
    settings: {
      kind: 'layered',
      layers: one.layers,
      seed: 1,
      bounds: { resistivity: [0.1, 1e5], thickness: [0.02, 1000] },
      fixed: [],
      priors: [],
      outlierTolerant: false,
    },
  }));
}
