/** One line of the report: what was measured against what, and what is wanted. */
export interface Row {
  readonly what: string;
  readonly found: string;
  readonly wanted: string;
  readonly reached: boolean | null;
}

export const skipped = (what: string, why: string): Row => ({
  what,
  found: `skipped: ${why}`,
  wanted: '',
  reached: null,
});

export function median(values: readonly number[]): number {
  return values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)]!;
}

/** Medians of two measurements taken in turn, so that what else the machine does falls on both alike. */
export async function interleaved(
  rounds: number,
  first: () => number | Promise<number>,
  second: () => number | Promise<number>,
): Promise<[number, number]> {
  const a: number[] = [];
  const b: number[] = [];
  for (let round = 0; round < rounds; round++) {
    a.push(await first());
    b.push(await second());
  }
  return [median(a), median(b)];
}

export async function secondsOf(work: () => unknown): Promise<number> {
  const started = performance.now();
  await work();
  return (performance.now() - started) / 1000;
}

export function printRow({ what, found, wanted, reached }: Row): void {
  const mark = reached === null ? ' ' : reached ? '✓' : '✗';
  console.log(`${mark} ${what.padEnd(58)} ${found.padEnd(54)} ${wanted}`);
}
