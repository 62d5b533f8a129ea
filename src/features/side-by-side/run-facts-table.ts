import type { Run } from '../../../server/contract/runs';
import { boundaryDepths } from '../../charts/chart-data';
import { MISFIT_LABEL } from '../../runs/misfit-words';
import { settingsWords } from '../../runs/run-settings-words';
import { hasBeds } from '../../runs/run-standing';
import {
  formatLength,
  formatMisfit,
  formatMoment,
  formatPercent,
  formatSignificant,
  withUnit,
} from '../../ui/format';

export interface FactRow {
  label: string;
  /** One a run; empty where the run has no such fact. */
  values: string[];
  differs: boolean;
}

type FinishedRun = Run & { result: NonNullable<Run['result']> };
export const isFinished = (run: Run): run is FinishedRun => run.result !== null;

const DOES_NOT_APPLY = 'does not apply';
const NO_SUM = '–, cells';
const NOT_HAD = [DOES_NOT_APPLY, NO_SUM];

const row = (label: string, values: string[]): FactRow => ({
  label,
  values,
  // What a kind of ground cannot have differs from nothing; the kind itself does.
  differs: new Set(values.filter((value) => !NOT_HAD.includes(value))).size > 1,
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
      runs.map((run) => sumOf(run, run.result.darZarrouk.totalConductanceS, 'S')),
    ),
    row(
      'T = Σhρ',
      runs.map((run) => sumOf(run, run.result.darZarrouk.totalResistanceOhmM2, 'Ω·m²')),
    ),
  ];
}

/**
 * Of the beds above the lowest, with the depth they reach to; one bed alone reaches to any depth and sums to nothing. The
 * grid of cells ends where it will, so their sum is set against none.
 */
function sumOf(run: FinishedRun, sum: number, unit: string): string {
  if (!hasBeds(run)) return NO_SUM;
  const depth = boundaryDepths(run.result.earth).at(-1);
  return depth === undefined
    ? 'none'
    : `${withUnit(formatSignificant(sum), unit)} down to ${withUnit(formatLength(depth), 'm')}`;
}

/** Facts that only a ground of beds, or only one of cells, is asked for. */
const OF_BEDS = ['Beds', 'Start', 'Held', 'Known beforehand', 'Thickness within'];
const OF_CELLS = ['Target'];

/** What stands where a fit was asked for nothing of its own. */
const USUAL: Record<string, string> = {
  Held: 'none',
  'Known beforehand': 'nothing',
  Branches: 'not shifted',
  Outliers: 'count in full',
};

function settingOf(run: FinishedRun, label: string): string {
  const isOfBeds = hasBeds(run);
  if ((isOfBeds ? OF_CELLS : OF_BEDS).includes(label)) return DOES_NOT_APPLY;
  const fact = settingsWords(run.settings).find((one) => one.label === label);
  if (fact) return fact.value;
  return label === 'Ground' && isOfBeds ? 'beds' : (USUAL[label] ?? 'as usual');
}

/** What each run was asked for, fact by fact in one order. */
export function settingRows(runs: readonly FinishedRun[]): FactRow[] {
  const labels = [
    ...new Set(runs.flatMap((run) => settingsWords(run.settings).map((fact) => fact.label))),
  ].toSorted((a, b) => Number(b === 'Ground') - Number(a === 'Ground'));
  return [
    row(
      'Readings',
      runs.map((run) => `revision ${run.revisionNumber}, ${run.readings.length} used`),
    ),
    ...labels.map((label) =>
      row(
        label,
        runs.map((run) => settingOf(run, label)),
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
