import type { FitSettings, LayeredEarthModel } from '../../../server/contract/fit-settings';
import { formatLength, formatResistivity, withUnit } from '../../ui/format';

/** This near to a bound, in ln, a value sits on it. */
const ON_BOUND = 1e-3;

/** The values of a computed model that the bounds of its search hold, each as a sentence. */
export function boundsReached(
  { resistivity, thickness }: LayeredEarthModel,
  { bounds, fixed }: Pick<FitSettings, 'bounds' | 'fixed'>,
): string[] {
  const isOn = (on: 'resistivity' | 'thickness', value: number, index: number): boolean =>
    !fixed.some((held) => held.on === on && held.index === index) &&
    bounds[on].some((bound) => Math.abs(Math.log(value / bound)) < ON_BOUND);
  return [
    ...thickness.flatMap((value, i) =>
      isOn('thickness', value, i)
        ? [`It has a bed ${withUnit(formatLength(value), 'm')} thick, at the bound of the search.`]
        : [],
    ),
    ...resistivity.flatMap((value, i) =>
      isOn('resistivity', value, i)
        ? [`It has a bed of ${withUnit(formatResistivity(value), 'Ω·m')}, at the bound of the search.`]
        : [],
    ),
  ];
}
