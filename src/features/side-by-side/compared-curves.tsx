import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { SoundingCurve } from '../../charts/sounding-curve';
import { chartReadings, curveDataOfRun } from '../../runs/curve-of-run';
import { isRejected } from '../../runs/rejected-fit';
import { RejectedMark } from '../../runs/rejected-mark';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { useRunLines } from '../../runs/use-run-lines';
import { SPACING_AXIS } from '../../soundings/spread-words';
import { classNames } from '../../ui/class-names';
import { Segmented } from '../../ui/segmented';

export interface ComparedCurvesProps {
  sounding: Sounding;
  /** The base first. */
  runs: readonly Run[];
  base: Run;
}

const VIEWS = [
  { value: 'overlaid', label: 'Overlaid' },
  { value: 'apart', label: 'Apart' },
] as const;
type View = (typeof VIEWS)[number]['value'];

/** The curves on the same axes, over one another with the base's residuals, or each with its own. */
export function ComparedCurves({ sounding, runs, base }: ComparedCurvesProps) {
  const [search, setSearch] = useSearchParams();
  const view: View = search.get('curves') === 'apart' ? 'apart' : 'overlaid';
  const choose = (next: View) =>
    setSearch(
      (before) => {
        const { curves: _before, ...rest } = Object.fromEntries(before);
        return next === 'apart' ? { ...rest, curves: next } : rest;
      },
      { replace: true },
    );
  return (
    <section aria-label="Curves" className="flex flex-col gap-3">
      <div className="print:hidden">
        <Segmented label="Curves" value={view} options={VIEWS} onChange={choose} />
      </div>
      {view === 'overlaid' ? (
        <OverlaidCurves sounding={sounding} runs={runs} base={base} />
      ) : (
        <CurvesApart sounding={sounding} runs={runs} />
      )}
    </section>
  );
}

function OverlaidCurves({ sounding, runs, base }: ComparedCurvesProps) {
  const readings = useMemo(() => chartReadings(curveDataOfRun(base)), [base]);
  const whole = useRunLines(runs);
  const lines = useMemo(
    () =>
      whole.map((line) => {
        // Where the readings differ, another run's residuals do not belong to the readings drawn.
        const isOfBase = runs.some((run) => run.id === line.id && run.revisionId === base.revisionId);
        const { residuals: _residuals, predicted: _predicted, ...bare } = line;
        return isOfBase ? line : bare;
      }),
    [whole, runs, base],
  );
  return (
    <SoundingCurve
      readings={readings}
      lines={lines}
      chosenLine={base.id}
      spacingName={SPACING_AXIS[sounding.spreadType]}
      note={`Ω·m, residuals of run ${letterOfRun(base)}`}
      subject={sounding.name}
    />
  );
}

function CurvesApart({ sounding, runs }: Omit<ComparedCurvesProps, 'base'>) {
  const lines = useRunLines(runs);
  const readings = useMemo(() => runs.map((run) => chartReadings(curveDataOfRun(run))), [runs]);
  // Where one run has the line, all have its room, so that the drawings stay level.
  const hasRejected = runs.some((run) => isRejected(run.result));
  const axesOf = useMemo(() => ({ readings: readings.flat(), lines }), [readings, lines]);
  return (
    <div className={classNames('grid gap-x-8 gap-y-8 md:grid-cols-2', runs.length > 2 && '2xl:grid-cols-3')}>
      {runs.map((run, i) => (
        <div key={run.id} className="min-w-0">
          {hasRejected ? (
            <p className="min-h-5">
              <RejectedMark fit={run.result} />
            </p>
          ) : null}
          <SoundingCurve
            readings={readings[i] ?? []}
            lines={lines.filter((line) => line.id === run.id)}
            axesOf={axesOf}
            chosenLine={run.id}
            spacingName={SPACING_AXIS[sounding.spreadType]}
            title={`Run ${letterOfRun(run)}`}
            note={titleOfRun(run)}
            subject={sounding.name}
            maxHeight={380}
          />
        </div>
      ))}
    </div>
  );
}
