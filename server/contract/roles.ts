import { z } from 'zod';

export const roleSchema = z.enum(['lead', 'geophysicist', 'hydrogeologist', 'analyst', 'guest']);
export type Role = z.infer<typeof roleSchema>;

/** Each role within a sentence, the same on screen, in mail and in answers. */
export const ROLE_NAMES: Record<Role, string> = {
  lead: 'lead',
  geophysicist: 'geophysicist',
  hydrogeologist: 'hydrogeologist',
  analyst: 'archive analyst',
  guest: 'guest',
};

export const KEEP_A_LEAD = 'A survey keeps at least one lead. Make someone else a lead first.';

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
