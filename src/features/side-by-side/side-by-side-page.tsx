import { useQueries, useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { Sounding } from '../../../server/contract/soundings';
import { runListQuery, runQuery } from '../../api/run-queries';
import { addressOf } from '../../app/addresses';
import { PageWait, SoundingPage } from '../../soundings/sounding-page';
import { isShowable } from '../../runs/run-standing';
import { FEWEST_RUNS, useTickedRuns } from '../../runs/ticked-runs';
import { ButtonLink } from '../../ui/button';
import { PageHeader } from '../../ui/page-header';
import { EmptyState } from '../../ui/view-states';
import { baseOf, chosenRuns, searchOf, type ChosenRuns } from './chosen-runs';
import { Comparison } from './comparison';
import { isFinished } from './run-facts-table';
import { RunPicker } from './run-picker';

export function SideBySidePage() {
  return (
    <SoundingPage section="Side by side">
      {(sounding) => <SideBySide key={sounding.id} sounding={sounding} />}
    </SoundingPage>
  );
}

function SideBySide({ sounding }: { sounding: Sounding }) {
  const [search, setSearch] = useSearchParams();
  const list = useQuery(runListQuery(sounding.id));
  const finished = (list.data?.items ?? []).filter(isShowable);
  const newest = finished.toSorted((a, b) => b.number - a.number);
  const chosen = chosenRuns(
    search,
    newest.map((run) => run.id),
  );
  const runs = useQueries({ queries: chosen.runIds.map((id) => runQuery(id)) });
  const tick = useTickedRuns((store) => store.tick);
  const choose = (next: ChosenRuns) => {
    tick(sounding.id, next.runIds);
    setSearch(searchOf(next), { replace: true });
  };
  if (!list.data)
    return <PageWait error={list.error} label="Loading the runs" onRetry={() => void list.refetch()} />;
  if (finished.length < FEWEST_RUNS) return <TooFewRuns sounding={sounding} count={finished.length} />;
  const failed = runs.find((run) => run.error !== null);
  const loaded = runs.flatMap((run) => (run.data && isFinished(run.data) ? [run.data] : []));
  return (
    <>
      <PageHeader
        title="Side by side"
        note={`Runs of ${sounding.name} on the same axes, and what sets them apart.`}
      />
      <RunPicker runs={finished} chosen={chosen} onChoose={choose} />
      {chosen.runIds.length < FEWEST_RUNS ? (
        <p className="mt-6 text-muted">Choose two to six runs above to see them on the same axes.</p>
      ) : loaded.length < chosen.runIds.length ? (
        <PageWait
          error={failed?.error ?? null}
          label="Loading the runs"
          onRetry={() => runs.forEach((run) => void run.refetch())}
        />
      ) : (
        <Comparison
          sounding={sounding}
          runs={loaded}
          baseId={baseOf(chosen, finished)}
          onBase={(baseId) => choose({ ...chosen, baseId })}
        />
      )}
    </>
  );
}

function TooFewRuns({ sounding, count }: { sounding: Sounding; count: number }) {
  return (
    <EmptyState
      title={count === 0 ? 'No finished run yet' : 'One finished run so far'}
      actions={
        <ButtonLink kind="main" to={addressOf('bench', { soundingId: sounding.id })}>
          To the Bench
        </ButtonLink>
      }
    >
      Side by side compares two to six runs of one sounding. Runs are made on the Bench.
    </EmptyState>
  );
}
