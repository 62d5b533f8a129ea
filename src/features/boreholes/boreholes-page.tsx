import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Borehole, Survey } from '../../../server/contract/surveys';
import { boreholeListQuery } from '../../api/survey-queries';
import { QueryView } from '../../app/query-view';
import { SurveyFrame } from '../../app/survey-frame';
import { Button } from '../../ui/button';
import { formatCount } from '../../ui/format';
import { PageHeader } from '../../ui/page-header';
import { EmptyState } from '../../ui/view-states';
import { BoreholeCard } from './borehole-card';
import { BoreholeDialog } from './borehole-dialog';

export function BoreholesPage() {
  return <SurveyFrame section="Boreholes">{(survey) => <Boreholes survey={survey} />}</SurveyFrame>;
}

function Boreholes({ survey }: { survey: Survey }) {
  const boreholes = useQuery(boreholeListQuery(survey.id));
  const [edited, setEdited] = useState<Borehole | 'new' | null>(null);
  const mayEdit = survey.can.editBoreholes;
  const add = mayEdit ? (
    <Button kind="main" onClick={() => setEdited('new')}>
      New borehole
    </Button>
  ) : null;
  const count = boreholes.data?.items.length ?? 0;
  return (
    <>
      <PageHeader
        title="Boreholes"
        note={count > 0 ? formatCount(count, 'borehole') : undefined}
        actions={count > 0 ? add : null}
      />
      <QueryView query={boreholes} loadingLabel="Loading boreholes" loadingLines={8}>
        {({ items }) =>
          items.length === 0 ? (
            <EmptyState title="No boreholes yet" actions={add}>
              {mayEdit
                ? 'A log and its water levels are what a fitted ground is held against.'
                : 'A hydrogeologist of the survey adds boreholes.'}
            </EmptyState>
          ) : (
            <BoreholeCards items={items} {...(mayEdit ? { onEdit: setEdited } : {})} />
          )
        }
      </QueryView>
      {edited === null ? null : (
        <BoreholeDialog
          surveyId={survey.id}
          borehole={edited === 'new' ? null : edited}
          onClose={() => setEdited(null)}
        />
      )}
    </>
  );
}

interface BoreholeCardsProps {
  items: readonly Borehole[];
  onEdit?: (borehole: Borehole) => void;
}

function BoreholeCards({ items, onEdit }: BoreholeCardsProps) {
  const deepest = items.reduce((depth, { depthM }) => Math.max(depth, depthM), 0);
  return (
    <ul className="grid gap-x-10 gap-y-8 sm:grid-cols-2 xl:grid-cols-3 3xl:grid-cols-4">
      {items.map((borehole) => (
        <BoreholeCard
          key={borehole.id}
          borehole={borehole}
          maxDepthM={deepest}
          {...(onEdit ? { onEdit: () => onEdit(borehole) } : {})}
        />
      ))}
    </ul>
  );
}
