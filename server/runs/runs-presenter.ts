import { plottingSpacing } from '../../inversion/index';
import { tryDeriveReading } from '../../inversion/readings/derive-reading';
import type { Reading } from '../contract/readings';
import type { Run, RunSummary } from '../contract/runs';
import type { FullRunRow, RunRow } from './runs-store';

export function presentRunSummary(row: RunRow): RunSummary {
  return {
    id: row.id,
    soundingId: row.sounding_id,
    number: row.number,
    revisionId: row.revision_id,
    revisionNumber: row.revision_number,
    ofOlderReadings: row.revision_id !== row.current_revision_id,
    settings: row.settings,
    engineVersion: row.engine_version,
    computationKey: row.computation_key,
    requestedBy: { id: row.requested_by, name: row.requester_name },
    requestedAt: row.requested_at.toISOString(),
    recomputesRunId: row.recomputes_run_id,
    state: row.state,
    progress: row.progress,
    progressText: row.progress_text,
    startedAt: row.started_at?.toISOString() ?? null,
    endedAt: row.ended_at?.toISOString() ?? null,
    fromCache: row.from_cache,
    durationMs: row.duration_ms,
    errorMessage: row.error_message,
    comparison: row.comparison,
    interpretedAs: row.interpreted_as,
    outcome: presentOutcome(row),
    note: { label: row.label, note: row.note, pinned: row.pinned, version: row.note_version },
  };
}

function presentOutcome(row: RunRow): RunSummary['outcome'] {
  const { earth, fit_status: status, chi2_per_reading: chi2PerReading, rms_percent: rmsPercent } = row;
  if (!earth || !status || chi2PerReading === null || rmsPercent === null) return null;
  return { earth, status, chi2PerReading, rmsPercent, misfitProbability: row.misfit_probability };
}

export function presentRun(row: FullRunRow): Run {
  const numbered = row.revision_readings.map((reading, index) => ({ reading, row: index + 1 }));
  const keptRows = numbered.filter(({ reading }) => reading.excluded === null);
  const floor = frozenFloor(
    keptRows.map(({ reading }) => reading.standardError),
    row.input.readings.map((reading) => reading.relativeError),
  );
  return {
    ...presentRunSummary(row),
    soundingName: row.sounding_name,
    surveyId: row.survey_id,
    spreadType: row.spread_type,
    readings: row.input.readings.map((reading, index) => ({
      ...reading,
      row: keptRows[index]?.row ?? index + 1,
      plottingSpacingM: plottingSpacing(reading.spread),
    })),
    excluded: numbered.flatMap(({ reading, row: at }) => presentExcluded(reading, at, floor)),
    result: row.result,
  };
}

/**
 * The error floor that a run was asked with, found again from what it added to the errors of the kept readings: the
 * survey's may be another one by now. Taken where the own error is least, which leaves the most of its digits.
 */
function frozenFloor(own: readonly (number | null)[], total: readonly number[]): number {
  const least = total.reduce((best, _, i) => ((own[i] ?? 0) < (own[best] ?? 0) ? i : best), 0);
  return Math.sqrt(Math.max(0, (total[least] ?? 0) ** 2 - (own[least] ?? 0) ** 2));
}

/** An excluded reading from which no ρa follows has no place on a curve. */
function presentExcluded(reading: Reading, row: number, floor: number): Run['excluded'] {
  if (reading.excluded === null) return [];
  const { derived } = tryDeriveReading(reading, floor);
  if (!derived) return [];
  return [
    {
      row,
      spread: reading.spread,
      plottingSpacingM: derived.plottingSpacingM,
      apparentResistivity: derived.apparentResistivityOhmM,
      relativeError: derived.relativeError,
      reason: reading.excluded,
    },
  ];
}
