import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useMe } from '../../api/use-me';
import { surveyListQuery } from '../../api/survey-queries';
import { PageFrame } from '../../app/page-frame';
import { QueryView } from '../../app/query-view';
import { Button } from '../../ui/button';
import { formatCount } from '../../ui/format';
import { PageHeader } from '../../ui/page-header';
import { EmptyState } from '../../ui/view-states';
import { CreateSurveyDialog } from './create-survey-dialog';
import { SurveyRow } from './survey-row';
import { WaitingList } from './waiting-list';

export function SurveysPage() {
  const me = useMe();
  const surveys = useQuery(surveyListQuery);
  const [creating, setCreating] = useState(false);
  const create = me.can.createSurveys ? (
    <Button kind="main" onClick={() => setCreating(true)}>
      New survey
    </Button>
  ) : null;
  const count = surveys.data?.items.length;
  return (
    <PageFrame title="Surveys" crumbs={[{ label: 'Surveys' }]}>
      <PageHeader
        title="Surveys"
        note={count ? formatCount(count, 'survey') : undefined}
        actions={count ? create : null}
      />
      <QueryView query={surveys} loadingLabel="Loading surveys" loadingLines={8}>
        {({ items }) =>
          items.length === 0 ? (
            <EmptyState title="No survey yet" actions={create}>
              A survey holds the soundings, boreholes and people of one piece of ground. Start one, or ask a
              lead to invite you to theirs.
            </EmptyState>
          ) : (
            <div className="grid items-start gap-x-12 gap-y-8 xl:grid-cols-[minmax(0,1fr)_22rem]">
              <ul className="border-t border-rule xl:col-start-1 xl:row-start-1">
                {items.map((survey) => (
                  <SurveyRow key={survey.id} survey={survey} />
                ))}
              </ul>
              <div className="row-start-1 xl:col-start-2">
                <WaitingList surveys={items} />
              </div>
            </div>
          )
        }
      </QueryView>
      {creating ? <CreateSurveyDialog onClose={() => setCreating(false)} /> : null}
    </PageFrame>
  );
}
