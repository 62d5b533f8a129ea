import { z } from 'zod';

export const roleSchema = z.enum(['lead', 'geophysicist', 'hydrogeologist', 'analyst', 'guest']);
export type Role = z.infer<typeof roleSchema>;

/** What the server says the signed-in person may do in a survey; the client shows exactly these actions. */
export const surveyCanSchema = z
  .strictObject({
    editSurvey: z.boolean(),
    manageMembers: z.boolean(),
    editSoundings: z.boolean(),
    editReadings: z.boolean(),
    run: z.boolean(),
    recompute: z.boolean(),
    annotateRuns: z.boolean(),
    interpret: z.boolean(),
    submit: z.boolean(),
    decide: z.boolean(),
    comment: z.boolean(),
    editBoreholes: z.boolean(),
  })
  .meta({ id: 'SurveyCan' });
export type SurveyCan = z.infer<typeof surveyCanSchema>;
