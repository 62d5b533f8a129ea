import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { SoundingCurve } from '../../charts/sounding-curve';
import { chartReadings, curveDataOfRun, lineOfRun } from '../../runs/curve-of-run';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { SPACING_AXIS } from '../../soundings/spread-words';
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
        <div className="grid gap-x-8 gap-y-8 md:grid-cols-2 2xl:grid-cols-3">
          {runs.map((run) => (
            <CurveApart key={run.id} sounding={sounding} run={run} />
          ))}
        </div>
      )}
    </section>
  );
}

function OverlaidCurves({ sounding, runs, base }: ComparedCurvesProps) {
  const readings = useMemo(() => chartReadings(curveDataOfRun(base)), [base]);
  const lines = useMemo(() => {
    // Where the readings differ, another run's residuals do not belong to the readings drawn.
    const bare = (run: Run) => run.revisionId !== base.revisionId;
    return runs.flatMap((run) => {
      const line = lineOfRun(run);
      if (!line) return [];
      const { residuals: _residuals, predicted: _predicted, ...curve } = line;
      return [bare(run) ? curve : line];
    });
  }, [runs, base]);
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

function CurveApart({ sounding, run }: { sounding: Sounding; run: Run }) {
  const readings = useMemo(() => chartReadings(curveDataOfRun(run)), [run]);
  const lines = useMemo(() => [lineOfRun(run)].filter((line) => line !== null), [run]);
  return (
    <SoundingCurve
      readings={readings}
      lines={lines}
      chosenLine={run.id}
      spacingName={SPACING_AXIS[sounding.spreadType]}
      title={`Run ${letterOfRun(run)}`}
      note={`Ω·m, ${titleOfRun(run)}`}
      subject={sounding.name}
      maxHeight={380}
    />
  );
}
