import type { Borehole } from '../contract/surveys';
import type { BoreholeRow } from './borehole-store';

export const presentBorehole = (row: BoreholeRow): Borehole => ({
  id: row.id,
  surveyId: row.survey_id,
  name: row.name,
  xM: row.x_m,
  yM: row.y_m,
  elevationM: row.elevation_m,
  depthM: row.depth_m,
  drilledOn: row.drilled_on,
  note: row.note,
  intervals: row.intervals,
  waterLevels: row.water_levels,
  version: row.version,
});
