import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { Sounding } from '../../../server/contract/soundings';
import { runListQuery } from '../../api/run-queries';
import { addressOf } from '../../app/addresses';
import { PageWait, SoundingPage } from '../../soundings/sounding-page';
import { isShowable } from '../../runs/run-standing';
import { Button, ButtonLink } from '../../ui/button';
import { PageHeader } from '../../ui/page-header';
import { WHO_ASKS_FOR_RUNS, WHO_BEGINS_INTERPRETATIONS } from '../../ui/role-words';
import { EmptyState } from '../../ui/view-states';
import { InterpretationTable } from './interpretation-table';
import { interpretationListQuery } from './interpretation-queries';
import { StartInterpretationDialog } from './start-interpretation-dialog';

export function InterpretationsPage() {
  return (
    <SoundingPage section="Interpretations">
      {(sounding) => <Interpretations key={sounding.id} sounding={sounding} />}
    </SoundingPage>
  );
}

function Interpretations({ sounding }: { sounding: Sounding }) {
  const [search, setSearch] = useSearchParams();
  const list = useQuery(interpretationListQuery(sounding.id));
  const runs = useQuery(runListQuery(sounding.id));
  if (!list.data || !runs.data)
    return (
      <PageWait
        error={list.error ?? runs.error}
        label="Loading the interpretations"
        onRetry={() => void Promise.all([list.refetch(), runs.refetch()])}
      />
    );
  const finished = runs.data.items.filter(isShowable);
  const start = search.get('start');
  const mayStart = sounding.can.interpret && finished.length > 0;
  const begin = mayStart ? (
    <Button kind="main" onClick={() => setSearch({ start: 'choose' })}>
      Interpret a run
    </Button>
  ) : null;
  return (
    <>
      {list.data.items.length === 0 ? (
        <EmptyState
          title="No interpretation yet"
          actions={
            begin ?? (
              <ButtonLink to={addressOf('bench', { soundingId: sounding.id })}>To the Bench</ButtonLink>
            )
          }
        >
          {wordsWithout(sounding, finished.length)}
        </EmptyState>
      ) : (
        <>
          <PageHeader
            title="Interpretations"
            note={`What the beds of ${sounding.name} may be, and how far this has been reviewed.`}
            actions={begin}
          />
          <InterpretationTable soundingId={sounding.id} interpretations={list.data.items} />
        </>
      )}
      {mayStart && start !== null ? (
        <StartInterpretationDialog
          sounding={sounding}
          runs={finished}
          runId={start}
          onClose={() => setSearch({}, { replace: true })}
        />
      ) : null}
    </>
  );
}

function wordsWithout(sounding: Sounding, finishedRuns: number): string {
  if (finishedRuns === 0)
    return (
      'An interpretation says what the beds of one run may be. There is no finished run of this sounding yet; ' +
      `${WHO_ASKS_FOR_RUNS} asks for one on the Bench.`
    );
  return sounding.can.interpret
    ? 'An interpretation says what the beds of one run may be, with its doubts, and goes to a hydrogeologist for review.'
    : `An interpretation says what the beds of one run may be; ${WHO_BEGINS_INTERPRETATIONS} of the survey begins one.`;
}
