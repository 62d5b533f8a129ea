import { useMemo } from 'react';
import type { Sounding } from '../../../server/contract/soundings';
import type { CurveReading } from '../../charts/chart-data';
import { SoundingCurve } from '../../charts/sounding-curve';
import { SPACING_AXIS, SPREAD_NAMES, halfMNOf, spacingLabel } from '../../soundings/spread-words';
import { formatCount } from '../../ui/format';
import type { SheetReading } from './sheet-reader';
import { thinReadings } from './thin-readings';

const NO_LINES = [] as const;

interface SheetCurveProps {
  sounding: Sounding;
  readings: readonly SheetReading[];
  onFocusRow: (row: number) => void;
}

/** The curve of what stands on the sheet now. */
export function SheetCurve({ sounding, readings, onFocusRow }: SheetCurveProps) {
  const { points, every } = useMemo(() => {
    const thinned = thinReadings(readings);
    return { points: thinned.drawn.map(curveReading), every: thinned.every };
  }, [readings]);
  const left = readings.filter(({ reading }) => reading.excluded !== null).length;
  const note = [
    'Ω·m',
    SPREAD_NAMES[sounding.spreadType],
    formatCount(readings.length, 'reading'),
    ...(every > 1 ? [`one in ${every} drawn`] : []),
    ...(left > 0 ? [`${left} left out`] : []),
  ].join(', ');
  return (
    <SoundingCurve
      readings={points}
      lines={NO_LINES}
      spacingName={SPACING_AXIS[sounding.spreadType]}
      note={note}
      subject={sounding.name}
      maxHeight={420}
      onFocusReading={(index) => {
        const point = index === null ? undefined : points[index];
        if (point) onFocusRow(Number(point.id) - 1);
      }}
    />
  );
}

const curveReading = ({ row, reading, derived }: SheetReading): CurveReading => ({
  id: String(row),
  spacing: derived.plottingSpacingM,
  label: `Row ${row}, ${spacingLabel(reading.spread)}`,
  halfMN: halfMNOf(reading.spread),
  apparentResistivity: derived.apparentResistivityOhmM,
  relativeError: derived.relativeError,
  excluded: reading.excluded !== null,
  ...(reading.excluded === null ? {} : { reason: reading.excluded }),
});
