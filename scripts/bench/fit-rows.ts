import { compiledKernel, createOperatorCache, fitLayered } from '../../inversion';
import { MOST_LAYERS } from '../../inversion/fit/check-fit-input';
import { referenceJobs, type FitJob } from './cases';
import { interleaved, secondsOf, skipped, type Row } from './table';
import { missingPython, runPython } from './yardsticks';

interface ScipyAnswer {
  readonly secondsPerFit: number;
  readonly chi2PerReading: number[];
}

const scipySeconds = (jobs: readonly FitJob[]): number => {
  const [answer] = runPython<ScipyAnswer>('scipy_fit.py', jobs);
  return answer!.secondsPerFit * jobs.length;
};

/** One a process, as its hosts have it. */
const kernel = compiledKernel();

/** Least misfits, one a curve, with the operators of a survey kept from curve to curve as the command line does. */
function fitAll(jobs: readonly FitJob[], layers?: 'auto'): number[] {
  const operators = createOperatorCache({ kernel });
  return jobs.map(({ readings, settings }) => {
    const asked = layers ? { ...settings, layers } : settings;
    return fitLayered(readings, asked, { operators }).chi2PerReading;
  });
}

function ratioRow(what: string, fits: number, [ours, theirs]: [number, number], atLeast: number): Row {
  const each = (seconds: number) => `${((seconds / fits) * 1000).toFixed(1)} ms`;
  const ratio = theirs / ours;
  return {
    what,
    found: `${each(ours)} against ${each(theirs)}: ${ratio.toFixed(1)} × as fast`,
    wanted: `≥ ${atLeast} ×`,
    reached: ratio >= atLeast,
  };
}

export async function fitRows(): Promise<Row[]> {
  const jobs = referenceJobs();
  const missing = missingPython('scipy');
  const misfits = fitAll(jobs);
  const close = misfits.filter((chi2, i) => chi2 <= 1.01 * jobs[i]!.best).length;
  const quality: Row = {
    what: 'misfit within 1 % of the least that is known',
    found: `${close} of ${jobs.length} curves`,
    wanted: '≥ 99 %',
    reached: close >= 0.99 * jobs.length,
  };
  const whole = `layered fit with its intervals, ${jobs.length} curves, against scipy`;
  const auto = 'automatic choice among 1 … 8 layers, against scipy';
  if (missing) return [quality, skipped(whole, missing), skipped(auto, missing)];
  const wholeTimes = await interleaved(
    5,
    () => secondsOf(() => fitAll(jobs)),
    () => scipySeconds(jobs),
  );
  const some = jobs.filter((_, i) => i % 12 === 3);
  const everyCount = some.flatMap((job) =>
    Array.from({ length: MOST_LAYERS }, (_, i) => ({
      ...job,
      settings: { ...job.settings, layers: i + 1 },
    })).filter(({ settings, readings }) => 2 * settings.layers - 1 <= readings.length),
  );
  const autoTimes = await interleaved(
    3,
    () => secondsOf(() => fitAll(some, 'auto')),
    () => scipySeconds(everyCount),
  );
  return [quality, ratioRow(whole, jobs.length, wholeTimes, 15), ratioRow(auto, some.length, autoTimes, 20)];
}
