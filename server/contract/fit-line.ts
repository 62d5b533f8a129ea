import { z } from 'zod';
import { fitResultSchema, fitStatusSchema } from './fit-result';
import { fitReadingSchema, fitSettingsSchema } from './fit-settings';
import { lineId } from './line-id';

const placeM = z.number().min(-1e9).max(1e9).describe('place along the line, m');

const scale = (of: string) =>
  z
    .number()
    .min(1e-3)
    .max(100)
    .default(0.2)
    .describe(`standard deviation of the change of ${of} over 100 m; it grows as the root of the distance`);

export const lateralScalesSchema = z.strictObject({
  resistivity: scale('ln ρ of a bed'),
  depth: scale('ln of the depth of the base of a bed'),
});

/** Depths that a borehole on the line met; they hold at its place, and less with distance from it. */
export const lineBoreholeSchema = z.strictObject({
  x: placeM,
  contacts: z
    .array(
      z.strictObject({
        boundary: z.number().int().min(0).max(6).describe('layer whose base was met, from 0 at the surface'),
        depth: z.number().gt(0).max(1e6).describe('m'),
        sigma: z.number().gt(0).max(1e6).describe('standard deviation of the depth, m'),
      }),
    )
    .min(1)
    .max(7),
});

export const fitLineSettingsSchema = fitSettingsSchema
  .safeExtend({
    kind: z.literal('layered'),
    lateral: lateralScalesSchema.prefault({}),
    boreholes: z.array(lineBoreholeSchema).max(500).default([]),
  })
  .meta({ id: 'FitLineSettings' });

export const fitLineRequestSchema = z.strictObject({
  id: lineId,
  soundings: z
    .array(
      z.strictObject({
        id: lineId,
        x: placeM,
        readings: z.array(fitReadingSchema).min(1).max(2000),
      }),
    )
    .min(1)
    .max(2000)
    .describe('in any order of x; soundings at one x are tied as if 1 m apart'),
  settings: fitLineSettingsSchema,
});

export const fitLineAnswerSchema = z.strictObject({
  id: lineId,
  status: fitStatusSchema,
  layers: z.number().int().describe('the same for every sounding'),
  chi2PerReading: z.number().describe('over all readings of the line'),
  effectiveParameters: z.number().describe('how many parameters the readings settle beside the ties'),
  misfitProbability: z.number().nullable(),
  soundings: z
    .array(z.strictObject({ id: lineId, ...fitResultSchema.shape }))
    .describe('in the order of the request'),
  layerCounts: z
    .array(
      z.strictObject({
        layers: z.number().int(),
        status: fitStatusSchema,
        chi2PerReading: z.number(),
        effectiveParameters: z.number(),
        bic: z.number(),
        withinNoise: z.boolean().nullable(),
        chosen: z.boolean(),
      }),
    )
    .nullable()
    .describe('counts tried over the whole line when layers is "auto", up to the first within the noise'),
  warnings: z.array(z.string()),
  iterations: z.number().int(),
  engine: z.string().describe('semantic version of the engine'),
});

export type FitLineAnswer = z.infer<typeof fitLineAnswerSchema>;
