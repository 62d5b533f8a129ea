import {
  createForwardOperator,
  fitLine,
  type LineSettings,
  type LineSounding,
  type Spread,
} from '../../inversion';

/** Time of a fit of 400 soundings of a line over that of 100: medians of interleaved runs in one process. */
const COUNTS = [100, 400] as const;
const RUNS = 7;

const spreads: Spread[] = [1.5, 2.5, 4, 6, 10, 15, 25, 40, 60, 100, 150, 250].map((halfAB) => ({
  type: 'schlumberger',
  halfAB,
  halfMN: halfAB / 10,
}));
const settings: LineSettings = {
  kind: 'layered',
  layers: 3,
  seed: 1,
  bounds: { resistivity: [0.1, 1e5], thickness: [0.02, 1000] },
  fixed: [],
  priors: [],
  outlierTolerant: false,
  lateral: { resistivity: 0.2, depth: 0.2 },
  boreholes: [],
};

/** Three beds that change slowly along the line, with 3 % of ripple in place of noise. */
function lineOf(count: number): LineSounding[] {
  const operator = createForwardOperator(spreads);
  return Array.from({ length: count }, (_, s) => {
    const x = 100 * s;
    const resistivity = [80, 25 * (1 + 0.3 * Math.sin(x / 700)), 400];
    const thickness = [3 + Math.sin(x / 900), 12 + 6 * Math.sin(x / 1500)];
    const readings = Array.from(operator.predict({ resistivity, thickness }), (value, i) => ({
      spread: spreads[i]!,
      apparentResistivity: value * Math.exp(0.03 * Math.SQRT2 * Math.sin(12.9898 * (12 * s + i))),
      relativeError: 0.03,
    }));
    return { x, readings };
  });
}

const median = (values: readonly number[]): number =>
  values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)]!;

const lines = COUNTS.map(lineOf);
const times: number[][] = COUNTS.map(() => []);
fitLine(lines[0]!, settings);
for (let run = 0; run < RUNS; run++)
  lines.forEach((line, k) => {
    const begun = performance.now();
    fitLine(line, settings);
    times[k]!.push(performance.now() - begun);
  });
const [few, many] = times.map(median);
console.log(
  `line of ${COUNTS[0]} soundings ${few!.toFixed(0)} ms, of ${COUNTS[1]} ${many!.toFixed(0)} ms: ${(many! / few!).toFixed(2)} times (wanted ≤ 4.4)`,
);
