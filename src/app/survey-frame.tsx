import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import type { Survey } from '../../server/contract/surveys';
import { surveyQuery } from '../api/survey-queries';
import { addressOf } from './addresses';
import { PageFrame, type PageFrameProps } from './page-frame';
import { QueryView } from './query-view';
import { surveySections } from './section-links';

interface SurveyFrameProps extends Pick<PageFrameProps, 'status' | 'keys' | 'layout'> {
  /** The section, as "Soundings"; stands in the document's title before the survey's name. */
  section: string;
  children: (survey: Survey) => ReactNode;
}

/** The frame of every page of a survey: it fetches the survey that the address names. */
export function SurveyFrame({ section, children, ...frame }: SurveyFrameProps) {
  const { surveyId = '' } = useParams();
  const survey = useQuery(surveyQuery(surveyId));
  const name = survey.data?.name;
  return (
    <PageFrame
      {...frame}
      title={name === undefined ? section : `${section}, ${name}`}
      crumbs={[{ label: 'Surveys', to: addressOf('surveys') }, { label: name ?? 'Survey' }]}
      nav={survey.data ? surveySections(surveyId) : []}
      navLabel="Sections of the survey"
    >
      <QueryView query={survey} loadingLabel="Loading the survey" what="This survey">
        {(data) => children(data)}
      </QueryView>
    </PageFrame>
  );
}
