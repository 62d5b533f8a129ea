import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { boreholeListQuery } from '../../api/survey-queries';
import { boreholeLog } from '../../boreholes/borehole-log';
import { BESIDE_M, nearestBoreholes } from '../../boreholes/nearest-boreholes';
import type { BoreholeLog } from '../../charts/chart-data';
import { DepthColumn } from '../../charts/depth-column';
import { columnOfRun } from '../../runs/curve-of-run';
import { letterOfRun } from '../../runs/run-title';
import { useMediaQuery } from '../../ui/use-media-query';

export interface InterpretationGroundProps {
  run: Run;
  sounding: Sounding;
  /** The ground in words, one a bed, empty where none is given. */
  grounds: readonly string[];
  waterLevelDepthM: number | null;
}

/** The column of the run with the ground in words beside its beds, and the log of a hole beside it where there is room. */
export function InterpretationGround(props: InterpretationGroundProps) {
  const { run, sounding, grounds, waterLevelDepthM } = props;
  const borehole = useLogBeside(sounding);
  const column = useMemo(
    () =>
      columnOfRun(
        run,
        grounds.map((ground) => (ground === '' ? null : ground)),
      ),
    [run, grounds],
  );
  if (!column) return null;
  return (
    <DepthColumn
      column={{ ...column, letter: '' }}
      title={`Ground of run ${letterOfRun(run)}`}
      subject={sounding.name}
      borehole={borehole}
      height={440}
      waterLevel={waterLevelDepthM}
      className="lg:sticky lg:top-4 lg:self-start"
    />
  );
}

/** Two names of a hole's beds and the ground's own words do not fit on a narrower screen. */
const ROOM_FOR_A_LOG = '(min-width: 96rem)';

function useLogBeside(sounding: Sounding): BoreholeLog | null {
  const hasRoom = useMediaQuery(ROOM_FOR_A_LOG);
  const { data } = useQuery(boreholeListQuery(sounding.surveyId));
  return useMemo(() => {
    const [nearest] = nearestBoreholes(sounding, data?.items ?? [], 1);
    return hasRoom && nearest && nearest.distanceM <= BESIDE_M ? boreholeLog(nearest.borehole) : null;
  }, [hasRoom, sounding, data]);
}
