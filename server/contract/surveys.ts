import { z } from 'zod';
import {
  dateSchema,
  emailSchema,
  idSchema,
  listOf,
  nameSchema,
  personSchema,
  remarkSchema,
  timestampSchema,
  versionSchema,
} from './common';
import { roleSchema, surveyCanSchema } from './roles';

export const surveyProgressSchema = z.strictObject({
  soundings: z.number().int(),
  measured: z.number().int().describe('soundings with saved readings'),
  fitted: z.number().int().describe('soundings with a finished run'),
  interpreted: z.number().int().describe('soundings with an interpretation, in whatever state'),
  inReview: z.number().int().describe('interpretations waiting for a decision'),
  accepted: z.number().int().describe('soundings with an accepted interpretation'),
});

export const surveySchema = z
  .strictObject({
    id: idSchema,
    name: z.string(),
    description: z.string(),
    grid: z.string().describe('name of the grid that x and y are in'),
    epsgCode: z.number().int().nullable(),
    errorFloor: z.number().describe('relative, added in quadrature to each reading’s own error'),
    version: versionSchema,
    createdAt: timestampSchema,
    role: roleSchema,
    progress: surveyProgressSchema,
    can: surveyCanSchema,
  })
  .meta({ id: 'Survey' });
export type Survey = z.infer<typeof surveySchema>;
export const surveyListSchema = listOf(surveySchema);

const surveyFields = {
  name: nameSchema,
  description: remarkSchema,
  grid: z.string().trim().max(120),
  epsgCode: z.number().int().min(1024).max(32767).nullable(),
  errorFloor: z.number().min(0.001).max(0.5).describe('relative, 0.001 to 0.5'),
};
export const createSurveySchema = z
  .strictObject({
    ...surveyFields,
    description: surveyFields.description.default(''),
    grid: surveyFields.grid.default(''),
    epsgCode: surveyFields.epsgCode.default(null),
    errorFloor: surveyFields.errorFloor.default(0.03),
  })
  .meta({ id: 'CreateSurvey' });
export const updateSurveySchema = z.strictObject(surveyFields).partial().meta({ id: 'UpdateSurvey' });

export const memberSchema = z
  .strictObject({
    user: personSchema.extend({ email: z.string() }),
    role: roleSchema,
    joinedAt: timestampSchema,
  })
  .meta({ id: 'Member' });
export const memberListSchema = listOf(memberSchema);
export const setMemberRoleSchema = z.strictObject({ role: roleSchema }).meta({ id: 'SetMemberRole' });

export const invitationSchema = z
  .strictObject({
    id: idSchema,
    email: z.string(),
    role: roleSchema,
    invitedBy: personSchema,
    createdAt: timestampSchema,
    expiresAt: timestampSchema,
    state: z.enum(['open', 'accepted', 'revoked', 'expired']),
  })
  .meta({ id: 'Invitation' });
export const invitationListSchema = listOf(invitationSchema);
export const createInvitationSchema = z
  .strictObject({ email: emailSchema, role: roleSchema })
  .meta({ id: 'CreateInvitation' });

export const lineSchema = z
  .strictObject({
    id: idSchema,
    surveyId: idSchema,
    name: z.string(),
    soundings: z.number().int(),
    version: versionSchema,
  })
  .meta({ id: 'Line' });
export const lineListSchema = listOf(lineSchema);
export const createLineSchema = z.strictObject({ name: nameSchema }).meta({ id: 'CreateLine' });

const boreholeIntervalSchema = z
  .strictObject({
    topM: z.number().min(0).max(5000),
    baseM: z.number().gt(0).max(5000),
    description: z.string().trim().min(1).max(500),
  })
  .refine((interval) => interval.baseM > interval.topM, {
    path: ['baseM'],
    message: 'must lie below the top of the interval',
  });
const waterLevelSchema = z.strictObject({
  measuredOn: dateSchema,
  depthM: z.number().min(-200).max(5000).describe('below ground, m; negative = above ground'),
});
const boreholeFields = {
  name: nameSchema,
  xM: z.number().min(-1e8).max(1e8).nullable(),
  yM: z.number().min(-1e8).max(1e8).nullable(),
  elevationM: z.number().min(-500).max(9000).nullable(),
  depthM: z.number().gt(0).max(5000),
  drilledOn: dateSchema.nullable(),
  note: remarkSchema,
  intervals: z.array(boreholeIntervalSchema).max(500),
  waterLevels: z.array(waterLevelSchema).max(1000),
};
export const boreholeSchema = z
  .strictObject({ id: idSchema, surveyId: idSchema, ...boreholeFields, version: versionSchema })
  .meta({ id: 'Borehole' });
export type Borehole = z.infer<typeof boreholeSchema>;
export const boreholeListSchema = listOf(boreholeSchema);

const logFaults = (
  log: {
    depthM: number;
    intervals: { topM: number; baseM: number }[];
    waterLevels: { measuredOn: string; depthM: number }[];
  },
  context: z.RefinementCtx,
): void => {
  log.waterLevels.forEach((level, i) => {
    if (log.waterLevels.findIndex((other) => other.measuredOn === level.measuredOn) < i)
      context.addIssue({
        code: 'custom',
        path: ['waterLevels', i, 'measuredOn'],
        message: 'must not be a day that another level has',
      });
    if (level.depthM > log.depthM)
      context.addIssue({
        code: 'custom',
        path: ['waterLevels', i, 'depthM'],
        message: `must not lie below the end of the hole: ${level.depthM} m, where the hole ends at ${log.depthM} m`,
      });
  });
  log.intervals.forEach((interval, i) => {
    const above = log.intervals[i - 1];
    if (above && interval.topM < above.baseM)
      context.addIssue({
        code: 'custom',
        path: ['intervals', i, 'topM'],
        message: `must not lie above ${above.baseM} m, the base of the interval before`,
      });
    if (interval.baseM > log.depthM)
      context.addIssue({
        code: 'custom',
        path: ['intervals', i, 'baseM'],
        message: `must not lie below the end of the hole at ${log.depthM} m`,
      });
  });
};
export const writeBoreholeSchema = z
  .strictObject({
    ...boreholeFields,
    note: boreholeFields.note.default(''),
    drilledOn: boreholeFields.drilledOn.default(null),
    intervals: boreholeFields.intervals.default([]),
    waterLevels: boreholeFields.waterLevels.default([]),
  })
  .superRefine(logFaults)
  .meta({ id: 'WriteBorehole' });
