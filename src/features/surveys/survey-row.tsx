import { Link } from 'react-router-dom';
import { ROLE_NAMES } from '../../../server/contract/roles';
import type { Survey } from '../../../server/contract/surveys';
import { addressOf } from '../../app/addresses';
import { Badge } from '../../ui/badge';
import { SurveyProgress } from './survey-progress';

export function SurveyRow({ survey }: { survey: Survey }) {
  const { inReview } = survey.progress;
  return (
    <li className="grid gap-x-8 gap-y-3 border-b border-rule py-5 md:grid-cols-[minmax(0,1fr)_minmax(22rem,28rem)]">
      <div className="min-w-0">
        <h2 className="text-lg font-semibold">
          <Link to={addressOf('survey', { surveyId: survey.id })} className="no-underline hover:underline">
            {survey.name}
          </Link>
        </h2>
        <p className="mt-0.5 flex flex-wrap items-center gap-x-3 gap-y-1 text-muted">
          <span>Your role: {ROLE_NAMES[survey.role]}</span>
          <Link to={addressOf('surveySoundings', { surveyId: survey.id })}>Soundings</Link>
          {inReview > 0 ? <Badge tone="copper">{inReview} in review</Badge> : null}
        </p>
        {survey.description === '' ? null : (
          <p className="mt-2 line-clamp-4 max-w-prose">{survey.description}</p>
        )}
      </div>
      <SurveyProgress progress={survey.progress} />
    </li>
  );
}
