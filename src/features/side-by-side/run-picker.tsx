import { useChartPalette } from '../../charts/chart-palette';
import { runStyle } from '../../charts/run-style';
import type { RunSummary } from '../../../server/contract/runs';
import { MISFIT_LABEL, MISFIT_TITLE } from '../../runs/misfit-words';
import { RejectedMark } from '../../runs/rejected-mark';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { MOST_RUNS } from '../../runs/ticked-runs';
import { Checkbox } from '../../ui/checkbox';
import { formatMisfit, formatMoment } from '../../ui/format';
import { withRun, type ChosenRuns } from './chosen-runs';

export interface RunPickerProps {
  /** Finished runs, newest first. */
  runs: readonly RunSummary[];
  chosen: ChosenRuns;
  onChoose: (chosen: ChosenRuns) => void;
}

/** The finished runs of the Ledger, to be ticked. */
export function RunPicker({ runs, chosen, onChoose }: RunPickerProps) {
  const palette = useChartPalette();
  const isFull = chosen.runIds.length >= MOST_RUNS;
  return (
    <fieldset className="print:hidden">
      <legend className="mb-1 text-sm font-semibold">
        Runs{' '}
        <span className="font-normal text-muted">
          {isFull ? `${MOST_RUNS} chosen, as many as fit` : `${chosen.runIds.length} chosen`}
        </span>
      </legend>
      <div className="flex max-h-44 flex-wrap gap-x-6 gap-y-1 overflow-y-auto border-y border-rule py-2">
        {runs.map((run) => {
          const isChosen = chosen.runIds.includes(run.id);
          return (
            <Checkbox
              key={run.id}
              checked={isChosen}
              disabled={isFull && !isChosen}
              onChange={(event) => onChoose(withRun(chosen, run.id, event.target.checked))}
              label={
                <>
                  <span
                    className="figure font-semibold"
                    style={{ color: runStyle(letterOfRun(run), palette).color }}
                  >
                    {letterOfRun(run)}
                  </span>{' '}
                  {titleOfRun(run)}
                </>
              }
              hint={
                <>
                  <span title={MISFIT_TITLE}>{MISFIT_LABEL}</span>
                  {'\u00a0'}
                  <span className="figure">
                    {run.outcome ? formatMisfit(run.outcome.chi2PerReading) : '–'}
                  </span>
                  , {formatMoment(run.requestedAt)}
                  <span className="block">
                    <RejectedMark fit={run.outcome} />
                  </span>
                </>
              }
            />
          );
        })}
      </div>
    </fieldset>
  );
}
