import { compiledKernel, createForwardOperator } from '../../inversion';
import { interleaved, skipped, type Row } from './table';
import { compileKernel } from './yardsticks';

const WHAT = 'ρa and Jacobian, 25 readings, 4 layers, against C';
const RUNS = 4000;

/** Microseconds of one forward run with its Jacobian. */
function engineKernel(): () => number {
  const spreads = Array.from({ length: 25 }, (_, i) => {
    const halfAB = 1.5 * 200 ** (i / 24);
    return { type: 'schlumberger', halfAB, halfMN: halfAB / 5 } as const;
  });
  const operator = createForwardOperator(spreads, compiledKernel());
  const parameters = Float64Array.of(120, 30, 300, 15, 2, 12, 25);
  return () => {
    const started = performance.now();
    for (let k = 0; k < RUNS; k++) {
      parameters[0] = 120 + 1e-9 * k;
      operator.slopeRows(parameters, 4);
    }
    return ((performance.now() - started) * 1000) / RUNS;
  };
}

export async function kernelRow(): Promise<Row> {
  const kernel = compileKernel();
  if (!kernel) return skipped(WHAT, 'no gcc');
  const engine = engineKernel();
  engine();
  const [ours, theirs] = await interleaved(9, engine, () => kernel.run().jacobianMicroseconds);
  kernel.remove();
  const ratio = ours / theirs;
  return {
    what: WHAT,
    found: `${ours.toFixed(1)} µs against ${theirs.toFixed(1)} µs: ${ratio.toFixed(2)} ×`,
    wanted: '≤ 3 ×',
    reached: ratio <= 3,
  };
}
