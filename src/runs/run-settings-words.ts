import { DEFAULT_BOUNDS, type FitSettings, type LayeredEarthModel } from '../../server/contract/fit-settings';
import { timesOrDivided } from '../../inversion/three-digits';
import {
  formatCount,
  formatGiven,
  formatLength,
  formatMisfit,
  formatRelativeError,
  formatResistivity,
  formatSignificant,
  withUnit,
} from '../ui/format';
import { bedCount, GROUND_NAMES } from './run-title';

const UNIT = { resistivity: 'Ω·m', thickness: 'm' } as const;

/** What a fit was asked for, one fact an entry; what is as usual is left out but for the count and the seed. */
export function settingsWords(settings: FitSettings): { label: string; value: string }[] {
  const bounds = (['resistivity', 'thickness'] as const).flatMap((key) => {
    const [low, high] = settings.bounds[key];
    const isUsual = low === DEFAULT_BOUNDS[key][0] && high === DEFAULT_BOUNDS[key][1];
    const value = `${formatGiven(low)} to ${withUnit(formatGiven(high), UNIT[key])}`;
    return isUsual
      ? []
      : [{ label: key === 'resistivity' ? 'Resistivity within' : 'Thickness within', value }];
  });
  const held = settings.fixed.map(
    ({ on, index, value }) => `${on} of bed ${index + 1} at ${withUnit(formatSignificant(value), UNIT[on])}`,
  );
  return [
    ...groundWords(settings),
    ...(held.length > 0 ? [{ label: 'Held', value: held.join('; ') }] : []),
    ...(settings.priors.length > 0
      ? [{ label: 'Known beforehand', value: settings.priors.map(priorWords).join('; ') }]
      : []),
    ...(settings.branchShiftSigma === undefined
      ? []
      : [
          {
            label: 'Branches',
            value: `shifted, each within about ${formatRelativeError(settings.branchShiftSigma)}`,
          },
        ]),
    ...(settings.outlierTolerant ? [{ label: 'Outliers', value: 'count for less' }] : []),
    ...bounds,
    { label: 'Seed', value: String(settings.seed) },
  ];
}

function groundWords({ kind, layers, start, targetMisfit }: FitSettings): { label: string; value: string }[] {
  if (kind !== 'layered')
    return [
      {
        label: 'Ground',
        value: `${GROUND_NAMES[kind]}, ${layers === 'auto' ? 'the usual grid of cells' : formatCount(layers, 'cell')}`,
      },
      { label: 'Target', value: `χ²/N\u00a0${formatMisfit(targetMisfit ?? 1)}` },
    ];
  return [
    { label: 'Beds', value: layers === 'auto' ? 'count to be found, 1 to 8' : bedCount(layers) },
    { label: 'Start', value: start ? `a given model: ${earthWords(start)}` : 'the curve' },
  ];
}

/** "base of bed 2 at 12.4 ± 0.300 m", "resistivity of bed 1 near 80.0 Ω·m ×÷ 1.22". */
export function priorWords({ on, index, value, sigma }: FitSettings['priors'][number]): string {
  const where = on === 'depth' ? `base of bed ${index + 1}` : `${on} of bed ${index + 1}`;
  const unit = on === 'resistivity' ? 'Ω·m' : 'm';
  return on === 'depth'
    ? `${where} at ${formatSignificant(value)}\u00a0±\u00a0${withUnit(formatSignificant(sigma), unit)}`
    : `${where} near ${withUnit(formatSignificant(value), unit)} ${timesOrDivided(Math.exp(sigma))}`;
}

/** "120 Ω·m to 2.1 m, 45 Ω·m to 15.4 m, 300 Ω·m below"; depths from the surface. */
function earthWords({ resistivity, thickness }: LayeredEarthModel): string {
  let depth = 0;
  return resistivity
    .map((value, i) => {
      const bed = withUnit(formatResistivity(value), UNIT.resistivity);
      const height = thickness[i];
      if (height !== undefined) return `${bed} to ${withUnit(formatLength((depth += height)), 'm')}`;
      return i === 0 ? `${bed} throughout` : `${bed} below`;
    })
    .join(', ');
}
