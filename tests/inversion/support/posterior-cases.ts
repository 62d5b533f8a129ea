import { readFileSync } from 'node:fs';
import type { Reading } from '../../../inversion';

interface RawCase {
  layers: number;
  relative_error: number;
  prior: { rho: [number, number]; thickness: [number, number] };
  readings: { halfAB: number; halfMN: number; rhoa: number }[];
  quantiles_log10: Record<
    string,
    Record<'p5' | 'p50' | 'p95', number> & { mc_error: Record<'p5' | 'p50' | 'p95', number> }
  >;
}

export interface PosteriorCase extends Omit<RawCase, 'readings' | 'prior'> {
  readings: Reading[];
  prior: { resistivity: [number, number]; thickness: [number, number] };
}

/** Posterior quantiles by tempered population runs, with their Monte-Carlo errors; `tests/reference/generate.py posterior`. */
export function posteriorCases(): PosteriorCase[] {
  const file = new URL('../../reference/posterior.json', import.meta.url);
  const { cases }: { cases: RawCase[] } = JSON.parse(readFileSync(file, 'utf8'));
  return cases.map((one) => ({
    ...one,
    prior: { resistivity: one.prior.rho, thickness: one.prior.thickness },
    readings: one.readings.map(({ halfAB, halfMN, rhoa }) => ({
      spread: { type: 'schlumberger', halfAB, halfMN },
      apparentResistivity: rhoa,
      relativeError: one.relative_error,
    })),
  }));
}
