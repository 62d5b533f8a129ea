import { readFileSync } from 'node:fs';
import type { Reading } from '../../inversion';
import { sampleEnsemble } from '../../inversion/uncertainty/ensemble/sample-ensemble';
import { median, skipped, type Row } from './table';
import { missingPython, runPython } from './yardsticks';

interface PosteriorCase {
  layers: number;
  relative_error: number;
  prior: { rho: [number, number]; thickness: [number, number] };
  readings: { halfAB: number; halfMN: number; rhoa: number }[];
}

interface SampleJob {
  readonly readings: Reading[];
  readonly settings: {
    layers: number;
    prior: { resistivity: [number, number]; thickness: [number, number] };
    draws: number;
    seed: number;
  };
}

const WHAT = 'effective samples a second, stated count, against emcee';
const DRAWS = 20_000;
const ROUNDS = 3;

function sampleJobs(): SampleJob[] {
  const file = new URL('../../tests/reference/posterior.json', import.meta.url);
  const { cases } = JSON.parse(readFileSync(file, 'utf8')) as { cases: PosteriorCase[] };
  return cases.map(({ layers, relative_error: relativeError, prior, readings }) => ({
    readings: readings.map(({ halfAB, halfMN, rhoa }) => ({
      spread: { type: 'schlumberger', halfAB, halfMN } as const,
      apparentResistivity: rhoa,
      relativeError,
    })),
    settings: {
      layers,
      prior: { resistivity: prior.rho, thickness: prior.thickness },
      draws: DRAWS,
      seed: 1,
    },
  }));
}

function effectivePerSecond({ readings, settings }: SampleJob): number {
  const started = performance.now();
  const { effectiveSampleSize } = sampleEnsemble(readings, settings);
  return (effectiveSampleSize * 1000) / (performance.now() - started);
}

/** The least ratio over the posterior cases; both count the slowest parameter. The whole of our run is timed, its start included. */
export function samplerRow(): Row {
  const missing = missingPython('emcee');
  if (missing) return skipped(WHAT, missing);
  const ratios = sampleJobs().map((job) => {
    const rounds = Array.from({ length: ROUNDS }, () => {
      const ours = effectivePerSecond(job);
      const [theirs] = runPython<{ effectiveSamplesPerSecond: number }>('emcee_sample.py', [job]);
      return ours / theirs!.effectiveSamplesPerSecond;
    });
    return median(rounds);
  });
  const least = Math.min(...ratios);
  return {
    what: WHAT,
    found: `${ratios.map((ratio) => `${ratio.toFixed(0)} ×`).join(', ')}`,
    wanted: '≥ 10 × each',
    reached: least >= 10,
  };
}
