import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { Sounding } from '../../../server/contract/soundings';
import { runListQuery, runQuery } from '../../api/run-queries';
import { fieldSheetQuery } from '../../api/sounding-queries';
import { addressOf } from '../../app/addresses';
import { PageWait, SoundingPage } from '../../soundings/sounding-page';
import { ButtonLink } from '../../ui/button';
import { EmptyState } from '../../ui/view-states';
import { BenchKeys } from './bench-keys';
import { BenchStatus } from './bench-status';
import { BenchWorkspace } from './bench-workspace';
import { chooseRun } from './choose-run';
import { useRunEvents } from './use-run-events';

export function BenchPage() {
  return (
    <SoundingPage
      section="Bench"
      layout="fill"
      keys={(sounding) => <BenchKeys mayFit={sounding.can.run} />}
      status={(sounding) => <BenchStatus soundingId={sounding.id} />}
    >
      {(sounding) => (
        <>
          <h1 className="sr-only">{sounding.name}, Bench</h1>
          <Bench key={sounding.id} sounding={sounding} />
        </>
      )}
    </SoundingPage>
  );
}

function Bench({ sounding }: { sounding: Sounding }) {
  const [search] = useSearchParams();
  const sheet = useQuery(fieldSheetQuery(sounding.id));
  const runs = useQuery(runListQuery(sounding.id));
  useRunEvents(sounding.id);
  const chosen = chooseRun(runs.data?.items ?? [], search.get('run'));
  const run = useQuery({
    ...runQuery(chosen?.id ?? ''),
    enabled: chosen !== null,
    // Going from run to run keeps the drawing in place until the next one is there.
    placeholderData: keepPreviousData,
  });
  if (!sheet.data || !runs.data)
    return (
      <PageWait
        error={sheet.error ?? runs.error}
        label="Loading the readings and runs"
        onRetry={() => void Promise.all([sheet.refetch(), runs.refetch()])}
      />
    );
  if (!sheet.data.revision) return <NoReadings sounding={sounding} />;
  if (chosen && !run.data)
    return <PageWait error={run.error} label="Loading the run" onRetry={() => void run.refetch()} />;
  return (
    <BenchWorkspace
      sounding={sounding}
      revision={sheet.data.revision}
      runs={runs.data.items}
      run={chosen && run.data ? run.data : null}
    />
  );
}

function NoReadings({ sounding }: { sounding: Sounding }) {
  return (
    <EmptyState
      title="No saved readings yet"
      actions={
        <ButtonLink kind="main" to={addressOf('readings', { soundingId: sounding.id })}>
          To the Field sheet
        </ButtonLink>
      }
    >
      The Bench works on saved readings. Type them, paste them or import a file on the Field sheet, then save.
    </EmptyState>
  );
}
