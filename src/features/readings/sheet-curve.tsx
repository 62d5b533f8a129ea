import { useDeferredValue, useMemo } from 'react';
import type { Sounding } from '../../../server/contract/soundings';
import type { CurveReading } from '../../charts/chart-data';
import { SoundingCurve } from '../../charts/sounding-curve';
import { SPACING_AXIS, SPREAD_NAMES, spacingLabel } from '../../runs/spread-words';
import { formatCount } from '../../ui/format';
import type { SheetReading } from './sheet-reader';

const NO_LINES = [] as const;

interface SheetCurveProps {
  sounding: Sounding;
  readings: readonly SheetReading[];
  onFocusRow: (row: number) => void;
}

/** The curve of what stands on the sheet now; it may lag a moment behind fast typing, never the other way. */
export function SheetCurve({ sounding, readings, onFocusRow }: SheetCurveProps) {
  const settled = useDeferredValue(readings);
  const points = useMemo(() => settled.map(curveReading), [settled]);
  const left = points.filter((point) => point.excluded).length;
  const note = [
    'Ω·m',
    SPREAD_NAMES[sounding.spreadType],
    formatCount(points.length, 'reading'),
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
        const row = index === null ? undefined : settled[index]?.row;
        if (row !== undefined) onFocusRow(row - 1);
      }}
    />
  );
}

const curveReading = ({ row, reading, derived }: SheetReading): CurveReading => ({
  id: String(row),
  spacing: derived.plottingSpacingM,
  label: `Row ${row}, ${spacingLabel(reading.spread)}`,
  apparentResistivity: derived.apparentResistivityOhmM,
  relativeError: derived.relativeError,
  excluded: reading.excluded !== null,
  ...(reading.excluded === null ? {} : { reason: reading.excluded }),
});
