import { useMemo } from 'react';
import type { Run } from '../../../server/contract/runs';
import { DepthColumn } from '../../charts/depth-column';
import { columnOfRun } from '../../runs/curve-of-run';
import { letterOfRun } from '../../runs/run-title';

export interface InterpretationGroundProps {
  run: Run;
  soundingName: string;
  /** The ground in words, one a bed, empty where none is given. */
  grounds: readonly string[];
  waterLevelDepthM: number | null;
}

/** The column of the run with the ground in words beside its beds. */
export function InterpretationGround(props: InterpretationGroundProps) {
  const { run, soundingName, grounds, waterLevelDepthM } = props;
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
      subject={soundingName}
      height={440}
      waterLevel={waterLevelDepthM}
      className="lg:sticky lg:top-4 lg:self-start"
    />
  );
}
