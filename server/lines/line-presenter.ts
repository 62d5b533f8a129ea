import type { z } from 'zod';
import type { lineSchema } from '../contract/surveys';
import type { LineRow } from './line-store';

export const presentLine = (row: LineRow): z.infer<typeof lineSchema> => ({
  id: row.id,
  surveyId: row.survey_id,
  name: row.name,
  soundings: row.soundings,
  version: row.version,
});
