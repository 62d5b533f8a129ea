import { z } from 'zod';
import { idSchema, listOf, personSchema, timestampSchema, versionSchema } from './common';
import { fitResultSchema } from './fit-result';
import { fitReadingSchema, fitSettingsSchema } from './fit-settings';
import { standingStateSchema } from './interpretations';
import { spreadSchema, spreadTypeSchema } from './spread';

export const runStateNameSchema = z.enum(['queued', 'running', 'finished', 'failed', 'cancelled']);

/** Readings as the fit sees them, with where each stands in its revision, and the settings with their seed. */
export const runInputSchema = z
  .strictObject({ readings: z.array(fitReadingSchema), settings: fitSettingsSchema })
  .meta({ id: 'RunInput' });
export type RunInput = z.infer<typeof runInputSchema>;

export const runComparisonSchema = z
  .strictObject({
    againstRunId: idSchema,
    verdict: z.enum(['identical', 'differs']),
    differences: z.array(z.strictObject({ path: z.string(), before: z.string(), after: z.string() })),
  })
  .meta({ id: 'RunComparison' });

export const runSummarySchema = z
  .strictObject({
    id: idSchema,
    soundingId: idSchema,
    number: z.number().int().describe('shown as a letter: 1 is A'),
    revisionId: idSchema,
    revisionNumber: z.number().int(),
    ofOlderReadings: z.boolean(),
    settings: fitSettingsSchema,
    engineVersion: z.string(),
    computationKey: z.string().describe('SHA-256 of engine version, readings, settings and seed'),
    requestedBy: personSchema,
    requestedAt: timestampSchema,
    recomputesRunId: idSchema.nullable(),
    state: runStateNameSchema,
    progress: z.number().min(0).max(1),
    progressText: z.string(),
    startedAt: timestampSchema.nullable(),
    endedAt: timestampSchema.nullable(),
    fromCache: z.boolean().describe('answered by an earlier computation of the same request'),
    durationMs: z.number().nullable().describe('of the computation itself'),
    errorMessage: z.string().nullable(),
    comparison: runComparisonSchema.nullable(),
    interpretedAs: standingStateSchema
      .nullable()
      .describe(
        'weightiest state of the interpretations that stand on the run; null = none, or only replaced ones',
      ),
    outcome: z
      .strictObject({
        earth: fitResultSchema.shape.earth,
        status: fitResultSchema.shape.status,
        chi2PerReading: z.number(),
        rmsPercent: z.number(),
        misfitProbability: fitResultSchema.shape.misfitProbability,
      })
      .nullable(),
    note: z.strictObject({
      label: z.string(),
      note: z.string(),
      pinned: z.boolean(),
      version: versionSchema,
    }),
  })
  .meta({ id: 'RunSummary' });
export type RunSummary = z.infer<typeof runSummarySchema>;
export const runListSchema = listOf(runSummarySchema);

export const runSchema = runSummarySchema
  .extend({
    soundingName: z.string(),
    surveyId: idSchema,
    spreadType: spreadTypeSchema,
    readings: z
      .array(
        fitReadingSchema.extend({
          row: z.number().int().describe('position in the revision, from 1'),
          plottingSpacingM: z.number(),
        }),
      )
      .describe('the kept readings, as the fit saw them'),
    excluded: z
      .array(
        z.strictObject({
          row: z.number().int(),
          spread: spreadSchema,
          plottingSpacingM: z.number(),
          apparentResistivity: z.number(),
          relativeError: z.number().describe('own error and the survey’s floor in quadrature'),
          reason: z.string(),
        }),
      )
      .describe('readings of the revision that were left out'),
    result: fitResultSchema.nullable(),
  })
  .meta({ id: 'Run' });
export type Run = z.infer<typeof runSchema>;

export const createRunSchema = z
  .strictObject({
    revisionId: idSchema.optional().describe('the sounding’s current revision when absent'),
    settings: fitSettingsSchema,
  })
  .meta({ id: 'CreateRun' });
export const updateRunNoteSchema = z
  .strictObject({
    label: z.string().trim().max(80).optional(),
    note: z.string().trim().max(5000).optional(),
    pinned: z.boolean().optional(),
  })
  .meta({ id: 'UpdateRunNote' });
