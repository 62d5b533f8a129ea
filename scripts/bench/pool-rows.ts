import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { runInputSchema } from '../../server/contract/runs';
import { createFitPool } from '../../server/jobs/fit-pool';
import { referenceJobs } from './cases';
import { median, secondsOf, type Row } from './table';

const THREAD = fileURLToPath(new URL('../../server/jobs/fit-thread.ts', import.meta.url));
const BUSY = 'const end = 4e8; let sum = 0; for (let i = 0; i < end; i++) sum += i % 7;';

/** Seconds for `count` soundings, the reference curves over and over, on a pool that is already warm. */
async function poolSeconds(threads: number, counts: readonly number[]): Promise<number[]> {
  const jobs = referenceJobs();
  const pool = createFitPool(THREAD, threads);
  const compute = (count: number) =>
    Promise.all(
      Array.from({ length: count }, (_, i) => {
        const { readings, settings } = jobs[i % jobs.length]!;
        return pool.compute(
          runInputSchema.parse({ readings, settings }),
          new AbortController().signal,
          () => undefined,
        );
      }),
    );
  await compute(60 * threads);
  const seconds: number[] = [];
  for (const count of counts) seconds.push(await secondsOf(() => compute(count)));
  await pool.close();
  return seconds;
}

const busySeconds = (threads: number): Promise<number> =>
  secondsOf(() =>
    Promise.all(
      Array.from(
        { length: threads },
        () => new Promise((resolve) => new Worker(BUSY, { eval: true }).on('exit', resolve)),
      ),
    ),
  );

export async function poolRows(): Promise<Row[]> {
  const [hundred, thousand] = await poolSeconds(2, [100, 1000]);
  const growth = thousand! / hundred!;
  const gains: number[] = [];
  const possibles: number[] = [];
  for (let round = 0; round < 5; round++) {
    const one = (await poolSeconds(1, [100]))[0]!;
    const busyOne = await busySeconds(1);
    const two = (await poolSeconds(2, [100]))[0]!;
    gains.push(one / two);
    possibles.push((2 * busyOne) / (await busySeconds(2)));
  }
  const gain = median(gains);
  const possible = median(possibles);
  return [
    {
      what: '1000 soundings through the pool against 100',
      found: `${thousand!.toFixed(1)} s against ${hundred!.toFixed(2)} s: ${growth.toFixed(2)} ×`,
      wanted: '≤ 10.5 ×',
      reached: growth <= 10.5,
    },
    {
      what: 'gain of a second thread, against that of two busy loops',
      found: `${gain.toFixed(2)} × against ${possible.toFixed(2)} ×`,
      wanted: '≥ 0.9 of it',
      reached: gain >= 0.9 * possible,
    },
  ];
}
