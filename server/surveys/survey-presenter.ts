import { surveyCan } from '../access/policy';
import type { Survey } from '../contract/surveys';
import type { SurveyRow } from './survey-store';

export const presentSurvey = (row: SurveyRow): Survey => ({
  id: row.id,
  name: row.name,
  description: row.description,
  grid: row.grid,
  epsgCode: row.epsg_code,
  errorFloor: row.error_floor,
  version: row.version,
  createdAt: row.created_at.toISOString(),
  role: row.role,
  progress: {
    soundings: row.soundings,
    measured: row.measured,
    fitted: row.fitted,
    interpreted: row.interpreted,
    inReview: row.in_review,
    accepted: row.accepted,
  },
  can: surveyCan(row.role),
});
