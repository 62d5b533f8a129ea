import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import type { Sounding } from '../../server/contract/soundings';
import { soundingQuery } from '../api/sounding-queries';
import type { Crumb } from '../ui/breadcrumb';
import { addressOf } from './addresses';
import { PageFrame, type PageFrameProps } from './page-frame';
import { QueryView } from './query-view';
import { soundingSections } from './section-links';

interface SoundingFrameProps extends Pick<PageFrameProps, 'status' | 'keys' | 'layout'> {
  /** The section, as "Bench"; stands in the document's title after the sounding's name. */
  section: string;
  children: (sounding: Sounding) => ReactNode;
}

/** The frame of every page of a sounding: it fetches the sounding that the address names. */
export function SoundingFrame({ section, children, ...frame }: SoundingFrameProps) {
  const { soundingId = '' } = useParams();
  const sounding = useQuery(soundingQuery(soundingId));
  const name = sounding.data?.name;
  return (
    <PageFrame
      {...frame}
      title={name === undefined ? section : `${name}, ${section}`}
      crumbs={sounding.data ? crumbsOf(sounding.data) : []}
      nav={sounding.data ? soundingSections(soundingId) : []}
      navLabel="Sections of the sounding"
    >
      <QueryView query={sounding} loadingLabel="Loading the sounding" what="This sounding">
        {(data) => children(data)}
      </QueryView>
    </PageFrame>
  );
}

function crumbsOf(sounding: Sounding): Crumb[] {
  const { surveyId } = sounding;
  const soundings = addressOf('surveySoundings', { surveyId });
  const line =
    sounding.lineId === null || sounding.lineName === null
      ? []
      : [{ label: sounding.lineName, to: `${soundings}?line=${sounding.lineId}` }];
  return [
    { label: sounding.surveyName, to: addressOf('survey', { surveyId }) },
    ...line,
    { label: sounding.name },
  ];
}
