import { readFileSync } from 'node:fs';

function reference(name: string): string {
  return readFileSync(new URL(`../../reference/${name}`, import.meta.url), 'utf8');
}

export interface ForwardCase {
  id: string;
  array: string;
  rho: number[];
  thickness: number[];
  readings: {
    AM: number;
    AN: number | null;
    BM: number | null;
    BN: number | null;
    halfMN: number | null;
    spacing: number;
    K: number;
    rhoa: number;
  }[];
}

export interface InversionCase {
  id: string;
  layers: number;
  relative_error: number;
  true: { rho: number[]; thickness: number[] };
  best_chi2_per_datum: number;
  readings: { halfAB: number; halfMN: number; rhoa: number }[];
}

/** Direct integration between Bessel zeros; `tests/reference/generate.py forward`. */
export function forwardCases(): ForwardCase[] {
  const set: { cases: ForwardCase[] } = JSON.parse(reference('forward.json'));
  return set.cases;
}

/** Noisy soundings with the least misfit a trust-region solver found; `tests/reference/generate.py inversion`. */
export function inversionCases(): InversionCase[] {
  const set: { cases: InversionCase[] } = JSON.parse(reference('inversion.json'));
  return set.cases;
}

/** Rows of a reference CSV as objects of strings. */
export function referenceRows(name: string): Record<string, string>[] {
  const [head, ...lines] = reference(name).trim().split(/\r?\n/);
  const names = head!.split(',');
  return lines.map((line) => Object.fromEntries(line.split(',').map((cell, i) => [names[i]!, cell])));
}

/** Function name → [x, its value, what that double leaves of the value]; `tests/reference/generate_elementary.py`. */
export function elementaryValues(): Record<string, [number, number, number][]> {
  return JSON.parse(reference('elementary.json'));
}
