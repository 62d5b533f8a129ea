import { InversionError } from '../inversion-error';
import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import { studentChance, studentPoint } from '../uncertainty/student-t';
import { threeDigits } from '../three-digits';
import { requireValue } from './require-value';

/** A pumped well of the survey and the aquifer under the sounding beside it. */
export interface PumpedWell {
  readonly name: string;
  /** from the pumping test, m²/d */
  readonly transmissivityM2PerDay: number;
  /** T = hρ in Ω·m² or S = h/ρ in siemens of the aquifer there */
  readonly aquifer: number;
}

/** The law that the survey's own wells give: transmissivity = c × T, or c × S. */
export interface TransmissivityCalibration {
  /** Kσ in m²/d per Ω·m² (by T) or K/σ in m²/d per siemens (by S) */
  coefficient: number;
  /** standard deviation of ln(transmissivity/aquifer) over the wells */
  scatter: number;
  /** 68 % factor of one well about the law, exp(scatter) */
  scatterFactor: number;
  wells: { name: string; ratioToLaw: number }[];
  /** aquifer values between which wells stand */
  calibrated: [number, number];
  formula: string;
  source: string;
  cautions: string[];
}

export const FEWEST_WELLS = 3;

const LAWS = {
  resistance: 'Tr = (Kσ)·T, T = hρ',
  conductance: 'Tr = (K/σ)·S, S = h/ρ',
} as const;

const WATER_CAUTION =
  'The law holds only where all wells and the sounding share one aquifer material and one conductivity of the water (Huntley 1986).';

/** Σ value². */
const squares = (values: readonly number[]) => values.reduce((sum, value) => sum + value * value, 0);

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** The wells' own slope on ln–ln axes, where its 95 % range leaves out the 1 of the law. */
function slopeDoubt(x: readonly number[], y: readonly number[]): string[] {
  const n = x.length;
  const [mx, my] = [mean(x), mean(y)];
  const sxx = squares(x.map((value) => value - mx));
  if (Math.max(...x) === Math.min(...x))
    return ['All wells stand over the same aquifer value, so they cannot test the law of proportion.'];
  const slope = x.reduce((sum, value, i) => sum + (value - mx) * (y[i]! - my), 0) / sxx;
  const rest = squares(x.map((value, i) => y[i]! - my - slope * (value - mx)));
  const reach = studentPoint(0.975, n - 2) * Math.sqrt(rest / (n - 2) / sxx);
  if (Math.abs(slope - 1) <= reach) return [];
  return [
    `The wells do not follow a law of proportion: on log axes their slope is ${slope.toFixed(2)} ± ${reach.toFixed(2)} (95 %), where the law has 1.`,
  ];
}

/**
 * The survey's calibration by pumped wells: ln c is the mean of ln(transmissivity/aquifer), so one well counts like another
 * by ratio. Throws `InversionError` ('calibration') for fewer than 3 wells: two cannot show a scatter worth the name.
 * Source: Niwas & Singhal 1981, Journal of Hydrology 50, 393–399 (from memory).
 */
export function calibrateTransmissivity(
  by: keyof typeof LAWS,
  wells: readonly PumpedWell[],
): TransmissivityCalibration {
  if (wells.length < FEWEST_WELLS)
    throw new InversionError(
      'calibration',
      `the survey has ${wells.length} pumped ${wells.length === 1 ? 'well' : 'wells'} with an aquifer value; a calibration needs at least ${FEWEST_WELLS}`,
      ['wells'],
    );
  wells.forEach((well) => {
    requireValue(well.transmissivityM2PerDay, 'transmissivityM2PerDay', 'm²/d');
    requireValue(well.aquifer, 'aquifer', by === 'resistance' ? 'Ω·m²' : 'S');
  });
  const x = wells.map((well) => log(well.aquifer));
  const y = wells.map((well) => log(well.transmissivityM2PerDay));
  const ratios = y.map((value, i) => value - x[i]!);
  const logLaw = mean(ratios);
  const scatter = Math.sqrt(squares(ratios.map((value) => value - logLaw)) / (ratios.length - 1));
  const aquifers = wells.map((well) => well.aquifer);
  return {
    coefficient: exp(logLaw),
    scatter,
    scatterFactor: exp(scatter),
    wells: wells.map(({ name }, i) => ({ name, ratioToLaw: exp(ratios[i]! - logLaw) })),
    calibrated: [Math.min(...aquifers), Math.max(...aquifers)],
    formula: LAWS[by],
    source: 'Niwas & Singhal 1981, Journal of Hydrology 50, 393–399',
    cautions: [WATER_CAUTION, ...slopeDoubt(x, y)],
  };
}

/** Transmissivity at a sounding, m²/d. */
export interface TransmissivityEstimate {
  value: number;
  /** 5, 50 and 95 % of the prediction for one new place */
  prediction: { p5: number; p50: number; p95: number };
  cautions: string[];
}

/**
 * Transmissivity in m²/d from the aquifer's T or S by the survey's calibration, with the range of one new place.
 *
 * About each aquifer value X, ln Tr − ln cX over s√(1 + 1/n) follows Student's t with n − 1 degrees of freedom (s the scatter
 * of n wells); the range is that of the even mixture over `members`, an ensemble of X, or about `aquifer` alone without one.
 */
export function transmissivity(
  calibration: TransmissivityCalibration,
  aquifer: number,
  members: readonly number[] = [],
): TransmissivityEstimate {
  const { coefficient, scatter, calibrated } = calibration;
  const n = calibration.wells.length;
  const all = members.length === 0 ? [aquifer] : members;
  [aquifer, ...all].forEach((value) => requireValue(value, 'aquifer', ''));
  const centres = all.map((value) => log(coefficient * value)).sort((a, b) => a - b);
  const width = scatter * Math.sqrt(1 + 1 / n);
  const chanceBelow = (y: number) =>
    centres.reduce((sum, centre) => sum + stepOrStudent(y - centre, width, n - 1), 0) / centres.length;
  const reach = width * studentPoint(0.999, n - 1);
  const point = (chance: number) => {
    let low = centres[0]! - reach;
    let high = centres.at(-1)! + reach;
    for (let i = 0; i < 60; i++) {
      const middle = (low + high) / 2;
      if (chanceBelow(middle) < chance) low = middle;
      else high = middle;
    }
    return exp(high);
  };
  const beyond = aquifer < calibrated[0] || aquifer > calibrated[1];
  return {
    value: coefficient * aquifer,
    prediction: { p5: point(0.05), p50: point(0.5), p95: point(0.95) },
    cautions: [
      ...calibration.cautions,
      ...(beyond
        ? [
            `The aquifer value ${threeDigits(aquifer)} lies outside of what the wells calibrate (${calibrated.map(threeDigits).join(' to ')}).`,
          ]
        : []),
    ],
  };
}

function stepOrStudent(distance: number, width: number, degrees: number): number {
  if (width === 0) return distance >= 0 ? 1 : 0;
  return studentChance(distance / width, degrees);
}
