import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { createForwardOperator, geometricFactor, type Spread } from '../../inversion/index';
import { spreadsOf, type DemoSounding } from './scenario';

/** Relative scatter of the invented readings, one standard deviation. */
const SCATTER = 0.025;

interface CrewReading {
  readonly spread: Spread;
  readonly voltageMv: number;
  readonly currentMa: number;
  readonly errorPercent: number;
  readonly remark: string;
}

/** Uniform and normal deviates from one seed; the first values of small seeds are poor and are thrown away. */
function deviates(seed: number): { uniform: () => number; normal: () => number } {
  const generator = xoroshiro128plus(seed);
  const uniform = (): number => ((generator.next() >>> 0) + 0.5) / 4294967296;
  for (let i = 0; i < 20; i += 1) uniform();
  return {
    uniform,
    normal: () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform()),
  };
}

const spacingOf = (spread: Spread): number =>
  spread.type === 'wenner' ? spread.spacing : spread.type === 'schlumberger' ? spread.halfAB : NaN;

/** Current that a crew would set: more as the spread grows, in steps of the transmitter. */
const currentFor = (spacingM: number, wobble: number): number => {
  const step = [20, 50, 100, 200, 350].find((_, i) => spacingM < [5, 20, 60, 150, Infinity][i]!)!;
  return Number((step * (0.92 + 0.16 * wobble)).toFixed(1));
};

function troubleOf(sounding: DemoSounding, spread: Spread): { factor: number; remark: string } {
  const { trouble } = sounding;
  if (trouble?.kind === 'outlier' && spacingOf(spread) === trouble.spacing)
    return { factor: trouble.factor, remark: trouble.excluded ? 'rain, cable wet' : '' };
  if (trouble?.kind === 'branch-shift' && spread.type === 'schlumberger' && spread.halfMN === trouble.halfMN)
    return { factor: trouble.factor, remark: '' };
  return { factor: 1, remark: '' };
}

/** The readings a crew would bring back from one sounding of the demo; the same every time. */
export function crewReadings(sounding: DemoSounding): CrewReading[] {
  const spreads = spreadsOf(sounding.array);
  const exact = createForwardOperator(spreads).predict(sounding.ground);
  const { uniform, normal } = deviates(1500 + Number(sounding.name.slice(2)));
  return spreads.map((spread, i) => {
    const { factor, remark } = troubleOf(sounding, spread);
    const currentMa = currentFor(spacingOf(spread), uniform());
    const apparent = exact[i]! * factor * Math.exp(SCATTER * normal());
    const voltageMv = Number(((apparent * currentMa) / geometricFactor(spread)!).toPrecision(4));
    const errorPercent = Number((0.4 + 1.6 * uniform() ** 2).toFixed(1));
    return { spread, voltageMv, currentMa, errorPercent, remark };
  });
}

/** The crew's sheet as CSV, as it would be typed at the end of the day. */
export function crewSheet(sounding: DemoSounding): string {
  const readings = crewReadings(sounding);
  const [delimiter, mark] = sounding.decimalComma ? [';', ','] : [',', '.'];
  const number = (value: number): string => String(value).replace('.', mark);
  const spacingHeadings = sounding.array === 'wenner' ? ['a (m)'] : ['AB/2 (m)', 'MN/2 (m)'];
  const rows = readings.map((reading) => [
    ...(reading.spread.type === 'schlumberger'
      ? [number(reading.spread.halfAB), number(reading.spread.halfMN!)]
      : [number(spacingOf(reading.spread))]),
    number(reading.voltageMv),
    number(reading.currentMa),
    number(reading.errorPercent),
    reading.remark.includes(delimiter) ? `"${reading.remark}"` : reading.remark,
  ]);
  const lines = [[...spacingHeadings, 'V (mV)', 'I (mA)', 'error (%)', 'remark'], ...rows];
  return lines.map((cells) => cells.join(delimiter)).join('\n') + '\n';
}
