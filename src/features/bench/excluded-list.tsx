import type { Run } from '../../../server/contract/runs';
import { formatLength, formatResistivity, withUnit } from '../../ui/format';

/** Readings that were left out, each with its reason; they are drawn hollow. */
export function ExcludedList({ excluded }: { excluded: Run['excluded'] }) {
  if (excluded.length === 0) return null;
  return (
    <p className="text-sm text-muted">
      Left out:{' '}
      {excluded
        .map(
          (reading) =>
            `${withUnit(formatLength(reading.plottingSpacingM), 'm')}, ${withUnit(formatResistivity(reading.apparentResistivity), 'Ω·m')} (row ${reading.row}): ${reading.reason}`,
        )
        .join('; ')}
    </p>
  );
}
