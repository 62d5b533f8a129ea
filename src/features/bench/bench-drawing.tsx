import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { addressOf } from '../../app/addresses';
import { SoundingCurve } from '../../charts/sounding-curve';
import { chartReadings, type CurveData } from '../../runs/curve-of-run';
import { letterOfRun } from '../../runs/run-title';
import { SPACING_AXIS, SPREAD_NAMES } from '../../soundings/spread-words';
import { formatCount } from '../../ui/format';
import { Notice } from '../../ui/notice';
import { ExcludedList } from './excluded-list';
import type { BenchCurve } from './use-bench-curve';

export interface BenchDrawingProps {
  sounding: Sounding;
  data: CurveData;
  run: Run | null;
  curve: BenchCurve;
}

/** The curve with its residuals, and what is not on it. */
export function BenchDrawing({ sounding, data, run, curve }: BenchDrawingProps) {
  const readings = useMemo(() => chartReadings(data), [data]);
  return (
    <div className="flex flex-col gap-2">
      {run?.ofOlderReadings ? (
        <Notice tone="caution">
          Run {letterOfRun(run)} was fitted to readings revision {run.revisionNumber}, and its readings are
          the ones drawn. The <Link to={addressOf('readings', { soundingId: sounding.id })}>Field sheet</Link>{' '}
          has changed since; a new fit takes the readings as they are now.
        </Notice>
      ) : null}
      <SoundingCurve
        readings={readings}
        lines={curve.lines}
        chosenLine={curve.chosenLine}
        spacingName={SPACING_AXIS[sounding.spreadType]}
        note={`Ω·m, ${SPREAD_NAMES[sounding.spreadType]}, ${formatCount(data.kept.length, 'reading')}`}
        subject={sounding.name}
      />
      <ExcludedList excluded={data.excluded} />
      {curve.fault === null ? null : (
        <Notice tone="fault" title="The curve of this model could not be computed">
          {curve.fault}
        </Notice>
      )}
    </div>
  );
}
