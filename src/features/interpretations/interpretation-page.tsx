import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import type { Interpretation } from '../../../server/contract/interpretations';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { hasCode } from '../../api/api-error';
import { runQuery } from '../../api/run-queries';
import { addressOf } from '../../app/addresses';
import { PageWait, SoundingPage } from '../../soundings/sounding-page';
import { ButtonLink } from '../../ui/button';
import { EmptyState } from '../../ui/view-states';
import { InterpretationEditor } from './interpretation-editor';
import { InterpretationReading } from './interpretation-reading';
import { InterpretationStateMark } from '../../runs/interpretation-state-mark';
import { interpretationQuery } from './interpretation-queries';
import { NearestHoles } from './nearest-holes';
import { OtherModels } from './other-models';
import { ReviewHistory } from './review-history';
import { ReviewPanel } from './review-panel';
import { RunBasis } from './run-basis';
import { RunGivens } from './run-givens';

export function InterpretationPage() {
  const { interpretationId = '' } = useParams();
  return (
    <SoundingPage section="Interpretation" layout="fill">
      {(sounding) => (
        <InterpretationOf key={interpretationId} sounding={sounding} interpretationId={interpretationId} />
      )}
    </SoundingPage>
  );
}

function InterpretationOf({ sounding, interpretationId }: { sounding: Sounding; interpretationId: string }) {
  const interpretation = useQuery(interpretationQuery(interpretationId));
  const run = useQuery({
    ...runQuery(interpretation.data?.runId ?? ''),
    enabled: interpretation.data !== undefined,
  });
  if (hasCode(interpretation.error, 'not-found') || hasCode(interpretation.error, 'bad-request'))
    return (
      <EmptyState
        title="This interpretation was not found"
        actions={
          <ButtonLink to={addressOf('interpretations', { soundingId: sounding.id })}>
            All interpretations of {sounding.name}
          </ButtonLink>
        }
      />
    );
  if (!interpretation.data || !run.data)
    return (
      <PageWait
        error={interpretation.error ?? run.error}
        label="Loading the interpretation"
        onRetry={() => void Promise.all([interpretation.refetch(), run.refetch()])}
      />
    );
  return <InterpretationDesk sounding={sounding} interpretation={interpretation.data} run={run.data} />;
}

interface InterpretationDeskProps {
  sounding: Sounding;
  interpretation: Interpretation;
  run: Run;
}

function InterpretationDesk({ sounding, interpretation, run }: InterpretationDeskProps) {
  const [isDirty, setIsDirty] = useState(false);
  return (
    <div className="grid flex-1 grid-cols-1 xl:grid-cols-[minmax(0,1fr)_minmax(20rem,25rem)]">
      <div className="flex min-w-0 flex-col px-4 py-5 sm:px-7">
        <p className="mb-1 flex flex-wrap items-center gap-x-4 text-sm text-muted">
          <InterpretationStateMark state={interpretation.state} />
          <span className="hidden print:inline">
            {sounding.surveyName}, {sounding.lineName ?? 'no line'}, sounding {sounding.name}
          </span>
        </p>
        {interpretation.can.edit ? (
          <InterpretationEditor
            sounding={sounding}
            interpretation={interpretation}
            run={run}
            onDirtyChange={setIsDirty}
          />
        ) : (
          <InterpretationReading sounding={sounding} interpretation={interpretation} run={run} />
        )}
      </div>
      <aside
        aria-label="Review and basis"
        className="flex min-w-0 flex-col gap-7 border-t border-rule px-4 py-5 sm:px-7 xl:border-t-0 xl:border-l"
      >
        <ReviewPanel interpretation={interpretation} isDirty={interpretation.can.edit && isDirty} />
        <RunBasis run={run} />
        <RunGivens run={run} />
        <OtherModels run={run} />
        <NearestHoles sounding={sounding} />
        <ReviewHistory interpretation={interpretation} />
      </aside>
    </div>
  );
}
