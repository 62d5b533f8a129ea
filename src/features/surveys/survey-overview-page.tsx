import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ROLE_NAMES } from '../../../server/contract/roles';
import type { Survey } from '../../../server/contract/surveys';
import { addressOf } from '../../app/addresses';
import { SurveyFrame } from '../../app/survey-frame';
import { isRejected, REJECTED_WORDS } from '../../runs/rejected-fit';
import { Button, ButtonLink } from '../../ui/button';
import { formatDay, formatRelativeError } from '../../ui/format';
import { PageHeader } from '../../ui/page-header';
import { allSoundingsQuery } from './all-soundings-query';
import { SurveyMap } from './survey-map';
import { SurveyProgress } from './survey-progress';
import { SurveySettingsDialog } from './survey-settings-dialog';

export function SurveyOverviewPage() {
  return <SurveyFrame section="Overview">{(survey) => <Overview survey={survey} />}</SurveyFrame>;
}

function Overview({ survey }: { survey: Survey }) {
  const [editing, setEditing] = useState(false);
  return (
    <>
      <PageHeader
        title={survey.name}
        note={`Your role: ${ROLE_NAMES[survey.role]} · begun ${formatDay(survey.createdAt)}`}
        actions={
          <>
            {survey.can.editSurvey ? <Button onClick={() => setEditing(true)}>Settings</Button> : null}
            <ButtonLink kind="main" to={addressOf('surveySoundings', { surveyId: survey.id })}>
              Soundings
            </ButtonLink>
          </>
        }
      />
      <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <SurveyMap survey={survey} />
        <aside className="flex flex-col gap-6 border-t border-rule pt-4">
          <div>
            <SurveyProgress progress={survey.progress} />
            <ProgressNote surveyId={survey.id} />
          </div>
          {survey.description === '' ? null : (
            <p className="max-w-prose whitespace-pre-wrap">{survey.description}</p>
          )}
          <Facts survey={survey} />
        </aside>
      </div>
      {editing ? <SurveySettingsDialog survey={survey} onClose={() => setEditing(false)} /> : null}
    </>
  );
}

function ProgressNote({ surveyId }: { surveyId: string }) {
  const { data } = useQuery(allSoundingsQuery(surveyId));
  const rejected = data?.items.filter(({ latestRun }) => isRejected(latestRun)).length ?? 0;
  return (
    <p className="mt-1 text-sm text-muted">
      Each step counts the soundings that went further, too.
      {rejected > 0
        ? ` Of those with a fit, ${rejected} ${rejected === 1 ? 'has' : 'have'} one that ${REJECTED_WORDS}.`
        : ''}
    </p>
  );
}

function Facts({ survey }: { survey: Survey }) {
  const facts: [string, string][] = [
    ['In review', String(survey.progress.inReview)],
    ['Error floor', formatRelativeError(survey.errorFloor)],
    ['Grid', survey.grid === '' ? 'not stated' : survey.grid],
    ['EPSG code', survey.epsgCode === null ? 'none' : String(survey.epsgCode)],
  ];
  return (
    <dl className="border-t border-rule">
      {facts.map(([label, value]) => (
        <div key={label} className="flex justify-between gap-4 border-b border-rule py-1.5">
          <dt className="text-muted">{label}</dt>
          <dd className={/^\d/.test(value) ? 'figure text-right' : 'text-right'}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
