import type { ExcludedReading } from '../../runs/curve-of-run';
import { spacingLabel } from '../../soundings/spread-words';
import { formatResistivity, withUnit } from '../../ui/format';

/** Readings that were left out, each with its reason; they are drawn hollow. */
export function ExcludedList({ excluded }: { excluded: readonly ExcludedReading[] }) {
  if (excluded.length === 0) return null;
  return (
    <p className="text-sm text-muted">
      Left out:{' '}
      {excluded
        .map(
          (reading) =>
            `${spacingLabel(reading.spread)}, ${withUnit(formatResistivity(reading.apparentResistivity), 'Ω·m')} (row ${reading.row}): ${reading.reason}`,
        )
        .join('; ')}
    </p>
  );
}
