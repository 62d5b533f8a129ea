import { useCallback, useMemo, useRef, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { hasCells } from '../../../inversion';
import type { FitSettingsInput } from '../../../server/contract/fit-settings';
import type { Sounding } from '../../../server/contract/soundings';
import type { Revision } from '../../../server/contract/readings';
import type { Run, RunSummary } from '../../../server/contract/runs';
import { formFaults } from '../../api/form-faults';
import { curveDataOfRevision, curveDataOfRun } from '../../runs/curve-of-run';
import { DoubtList } from '../../runs/doubt-list';
import { letterOfRun } from '../../runs/run-title';
import { BenchDrawing } from './bench-drawing';
import { BenchGround } from './bench-ground';
import { useRequestRun } from './bench-mutations';
import { ChecksNote } from './checks-note';
import { DrawingRegion } from './drawing-region';
import { FiguresOfModel } from './figures-of-model';
import { FitControls, type FitCommands } from './fit-controls';
import { HandDoubt } from './hand-doubt';
import { modelFromCurve } from './hand-model';
import { verdictOf } from './hand-verdict';
import { LayerLadder } from './layer-ladder';
import { Ledger } from './ledger';
import { NoRunsNote } from './no-runs-note';
import { RunFacts } from './run-facts';
import { useAwaitedRuns } from './use-awaited-runs';
import { useBenchCurve } from './use-bench-curve';
import { useModel } from './use-model';

export interface BenchWorkspaceProps {
  sounding: Sounding;
  revision: Revision;
  runs: readonly RunSummary[];
  /** The run that is shown; null while there is none. */
  run: Run | null;
}

const NONE: readonly string[] = [];

/** Ground, curve and Ledger at one table. */
export function BenchWorkspace({ sounding, revision, runs, run }: BenchWorkspaceProps) {
  const { can } = sounding;
  const [, setSearch] = useSearchParams();
  const [selectedBed, setSelectedBed] = useState<number | null>(null);
  const commands = useRef<FitCommands | null>(null);
  const request = useRequestRun(sounding.id);
  const data = useMemo(() => (run ? curveDataOfRun(run) : curveDataOfRevision(revision)), [run, revision]);
  const fallback = useMemo(
    () => modelFromCurve(data.kept.map((reading) => ({ ...reading, spacing: reading.plottingSpacingM }))),
    [data],
  );
  const model = useModel(sounding.id, run, fallback);
  const curve = useBenchCurve(data, run, model);
  const { takeUpRun } = model;
  const open = useCallback(
    (opened: Pick<RunSummary, 'id'>) => {
      takeUpRun();
      setSearch((search) => new URLSearchParams({ ...Object.fromEntries(search), run: opened.id }), {
        replace: true,
      });
    },
    [setSearch, takeUpRun],
  );
  const awaitRun = useAwaitedRuns(runs, open);
  const fit = (settings: FitSettingsInput) =>
    request.mutate(settings, { onSuccess: (asked) => awaitRun(asked.id) });
  const result = model.hand ? null : (run?.result ?? null);
  const isCells = result !== null && hasCells(result);
  return (
    <div className="grid flex-1 grid-cols-1 lg:grid-cols-[18rem_minmax(0,1fr)] xl:grid-cols-[19rem_minmax(0,1fr)_22rem] 2xl:grid-cols-[21rem_minmax(0,1fr)_24rem]">
      <DrawingRegion
        onFit={can.run ? () => commands.current?.fit() : null}
        onUndo={model.undo}
        onRedo={model.redo}
        className="grid min-w-0 grid-cols-1 content-start lg:col-span-2 lg:grid-cols-subgrid lg:content-stretch"
      >
        <div className="flex min-w-0 flex-col gap-6 px-4 py-5 sm:px-7 lg:order-2 lg:border-l lg:border-rule">
          <BenchDrawing sounding={sounding} data={data} run={run} curve={curve} />
          {can.run ? (
            <FitControls
              model={isCells ? null : model.earth}
              isByHand={model.hand !== null}
              held={isCells ? NONE : model.held}
              onRelease={model.releaseAll}
              onFit={fit}
              isAsking={request.isPending}
              faults={formFaults(request.error)}
              onReady={(ready) => {
                commands.current = ready;
              }}
            />
          ) : (
            <p className="text-muted">You may look and try; no model you change here is kept.</p>
          )}
          <BenchGround
            part="table"
            sounding={sounding}
            run={run}
            model={model}
            selectedBed={selectedBed}
            onSelectBed={setSelectedBed}
          />
          {run?.result?.layerCounts ? (
            <section aria-labelledby="ladder-title">
              <h2 id="ladder-title" className="mb-1 font-semibold">
                How many beds{' '}
                <span className="ml-2 text-sm font-normal text-muted">run {letterOfRun(run)}</span>
              </h2>
              <LayerLadder
                counts={run.result.layerCounts}
                readings={run.readings.length}
                onTakeUp={model.lookAt}
                onAdopt={can.run ? (earth) => commands.current?.fitCount(run.settings, earth) : undefined}
              />
            </section>
          ) : null}
        </div>
        <div className="min-w-0 border-t border-rule px-4 py-5 sm:px-7 lg:order-1 lg:border-t-0">
          <BenchGround
            part="column"
            sounding={sounding}
            run={run}
            model={model}
            selectedBed={selectedBed}
            onSelectBed={setSelectedBed}
          />
        </div>
      </DrawingRegion>
      <div className="flex min-w-0 flex-col gap-6 border-t border-rule px-4 py-5 sm:px-7 lg:order-3 lg:col-span-2 xl:col-span-1 xl:border-t-0 xl:border-l">
        {model.earth ? (
          <FiguresOfModel
            earth={model.earth}
            misfit={curve.misfit}
            fit={result}
            verdict={verdictOf(model, run, curve.misfit, data.kept.length)}
            isCells={isCells}
          />
        ) : null}
        {model.hand ? (
          <HandDoubt
            earth={model.hand}
            ladderSettings={model.isFromLadder && run ? run.settings : null}
            mayFit={can.run}
          />
        ) : null}
        {result && run ? (
          <section aria-labelledby="doubt-title">
            <h2 id="doubt-title" className="mb-2 font-semibold">
              What the data cannot tell
            </h2>
            <DoubtList result={result} run={run} />
          </section>
        ) : null}
        <ChecksNote revision={revision} run={run} />
        {runs.length === 0 ? (
          <NoRunsNote can={can} />
        ) : (
          <Ledger soundingId={sounding.id} runs={runs} shownRunId={run?.id ?? null} can={can} onOpen={open} />
        )}
        {run && !model.hand ? <RunFacts run={run} runs={runs} can={can} /> : null}
      </div>
    </div>
  );
}
