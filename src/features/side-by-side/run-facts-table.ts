import type { Run } from '../../../server/contract/runs';
import { MISFIT_LABEL } from '../../runs/misfit-words';
import { settingsWords } from '../../runs/run-settings-words';
import { formatMisfit, formatMoment, formatPercent, formatSignificant, withUnit } from '../../ui/format';

export interface FactRow {
  label: string;
  /** One a run; empty where the run has no such fact. */
  values: string[];
  differs: boolean;
}

type FinishedRun = Run & { result: NonNullable<Run['result']> };
export const isFinished = (run: Run): run is FinishedRun => run.result !== null;

const row = (label: string, values: string[]): FactRow => ({
  label,
  values,
  differs: new Set(values).size > 1,
});

/** How each run fits and what it sums to. */
export function outcomeRows(runs: readonly FinishedRun[]): FactRow[] {
  return [
    row(
      MISFIT_LABEL,
      runs.map((run) => formatMisfit(run.result.chi2PerReading)),
    ),
    row(
      'rms misfit',
      runs.map((run) => formatPercent(run.result.rmsPercent)),
    ),
    row(
      'S = Σh/ρ',
      runs.map(({ result }) => sumOf(result, result.darZarrouk.totalConductanceS, 'S')),
    ),
    row(
      'T = Σhρ',
      runs.map(({ result }) => sumOf(result, result.darZarrouk.totalResistanceOhmM2, 'Ω·m²')),
    ),
  ];
}

/** Of the beds above the lowest; one bed alone reaches to any depth and sums to nothing. */
const sumOf = ({ earth }: FinishedRun['result'], sum: number, unit: string): string =>
  earth.thickness.length === 0 ? 'none' : withUnit(formatSignificant(sum), unit);

/** What each run was asked for, fact by fact in one order. */
export function settingRows(runs: readonly FinishedRun[]): FactRow[] {
  const words = runs.map((run) => settingsWords(run.settings));
  const labels = [...new Set(words.flatMap((facts) => facts.map((fact) => fact.label)))];
  return [
    row(
      'Readings',
      runs.map((run) => `revision ${run.revisionNumber}, ${run.readings.length} used`),
    ),
    ...labels.map((label) =>
      row(
        label,
        words.map(
          (facts) =>
            facts.find((fact) => fact.label === label)?.value ?? (label === 'Held' ? 'none' : 'as usual'),
        ),
      ),
    ),
    row(
      'Engine',
      runs.map((run) => run.engineVersion),
    ),
    // Who asked has no part in what comes out.
    {
      label: 'Asked by',
      values: runs.map((run) => `${run.requestedBy.name}, ${formatMoment(run.requestedAt)}`),
      differs: false,
    },
  ];
}
