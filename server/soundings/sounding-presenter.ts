import { plottingSpacing } from '../../inversion/index';
import { tryDeriveReading } from '../../inversion/readings/derive-reading';
import { surveyCan } from '../access/policy';
import type { Reading } from '../contract/readings';
import type { Sounding, SoundingRow as SoundingTableRow } from '../contract/soundings';
import type { SoundingPageRow } from './sounding-page-store';
import type { SoundingRow } from './sounding-store';

export const presentSounding = (row: SoundingRow): Sounding => ({
  id: row.id,
  surveyId: row.survey_id,
  surveyName: row.survey_name,
  lineId: row.line_id,
  lineName: row.line_name,
  name: row.name,
  spreadType: row.spread_type,
  xM: row.x_m,
  yM: row.y_m,
  elevationM: row.elevation_m,
  elevationDatum: row.elevation_datum,
  azimuthDeg: row.azimuth_deg,
  measuredOn: row.measured_on,
  crew: row.crew,
  instrument: row.instrument,
  note: row.note,
  state: row.state,
  currentRevisionId: row.current_revision_id,
  version: row.version,
  createdAt: row.created_at.toISOString(),
  updatedAt: row.updated_at.toISOString(),
  errorFloor: row.error_floor,
  can: surveyCan(row.role),
});

export const presentSoundingRow = (row: SoundingPageRow): SoundingTableRow => ({
  id: row.id,
  name: row.name,
  lineName: row.line_name,
  spreadType: row.spread_type,
  xM: row.x_m,
  yM: row.y_m,
  measuredOn: row.measured_on,
  state: row.state,
  revisionNumber: row.revision_number,
  curve: (row.readings ?? []).flatMap(presentPoint),
  latestRun: presentLatestRun(row),
  updatedAt: row.updated_at.toISOString(),
});

function presentPoint(reading: Reading): SoundingTableRow['curve'] {
  const { derived } = tryDeriveReading(reading, 0);
  if (!derived) return [];
  return [
    {
      spacingM: derived.plottingSpacingM,
      apparentResistivityOhmM: derived.apparentResistivityOhmM,
      excluded: reading.excluded !== null,
    },
  ];
}

function presentLatestRun(row: SoundingPageRow): SoundingTableRow['latestRun'] {
  const { run_id: id, run_number: number, layers, predicted } = row;
  const { chi2_per_reading: chi2PerReading, rms_percent: rmsPercent, run_readings: readings } = row;
  if (id === null || number === null || chi2PerReading === null || rmsPercent === null) return null;
  return {
    id,
    number,
    layers,
    chi2PerReading,
    rmsPercent,
    misfitProbability: row.misfit_probability,
    predicted: (readings ?? []).flatMap(({ spread }, i) => {
      const value = predicted?.[i];
      return value === undefined
        ? []
        : [{ spacingM: plottingSpacing(spread), apparentResistivityOhmM: value }];
    }),
    ofOlderReadings: row.run_revision_id !== row.current_revision_id,
  };
}
