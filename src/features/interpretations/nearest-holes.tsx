import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Sounding } from '../../../server/contract/soundings';
import { boreholeListQuery } from '../../api/survey-queries';
import { addressOf } from '../../app/addresses';
import { groundHeightWords } from '../../boreholes/ground-height-words';
import { latestWaterLevel } from '../../boreholes/latest-water-level';
import { LogTable } from '../../boreholes/log-table';
import { nearestBoreholes, type NearBorehole } from '../../boreholes/nearest-boreholes';
import { formatDay, formatGiven, withUnit } from '../../ui/format';
import { waterLevelWords } from '../../ui/water-level-words';

const MOST_SHOWN = 2;

/** What was drilled nearest to the sounding, in numbers: an interpretation is held against it. */
export function NearestHoles({ sounding }: { sounding: Sounding }) {
  const boreholes = useQuery(boreholeListQuery(sounding.surveyId));
  if (!boreholes.data) return null;
  const near = nearestBoreholes(sounding, boreholes.data.items, MOST_SHOWN);
  return (
    <section aria-labelledby="nearest-holes-title" className="flex flex-col gap-3">
      <h2 id="nearest-holes-title" className="font-semibold">
        Nearest boreholes
      </h2>
      {near.length === 0 ? <p className="text-muted">None with a position beside this sounding’s.</p> : null}
      {near.map((one) => (
        <NearHole key={one.borehole.id} {...one} hereM={sounding.elevationM} />
      ))}
    </section>
  );
}

function NearHole({ borehole, distanceM, hereM }: NearBorehole & { hereM: number | null }) {
  const height = groundHeightWords(borehole.elevationM, hereM);
  const level = latestWaterLevel(borehole);
  const to = `${addressOf('surveyBoreholes', { surveyId: borehole.surveyId })}#${borehole.id}`;
  return (
    <div>
      <h3>
        <Link to={to} className="font-semibold">
          {borehole.name}
        </Link>
        , <span className="whitespace-nowrap">{withUnit(formatGiven(Math.round(distanceM)), 'm away')}</span>
      </h3>
      <LogTable borehole={borehole} />
      <p className="border-t border-rule py-1">
        {level === null
          ? 'No water level'
          : `Water ${waterLevelWords(level.depthM)} on ${formatDay(level.measuredOn)}`}
        {height === null ? null : <span className="text-muted">; {height}</span>}
      </p>
    </div>
  );
}
