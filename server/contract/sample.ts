import { z } from 'zod';
import type { EnsembleResult, SampleSettings as EngineSettings } from '../../inversion';
import { fitBoundsSchema, fitReadingSchema, gaussianPriorSchema, layeredEarthSchema } from './fit-settings';
import { lineId } from './line-id';

/** Ranges that are uniform in ln: ρ of every layer, and thicknesses (stated count) or depths of boundaries (unknown count). */
export const ensemblePriorSchema = fitBoundsSchema;

export const targetBedSchema = z.strictObject({
  resistivity: fitBoundsSchema.shape.resistivity,
  minThickness: z
    .number()
    .min(0)
    .max(1e6)
    .describe('m; adjoining layers in range are one bed, the half-space is endless'),
  topAbove: z.number().min(0).max(1e6).describe('m; the top of the bed lies at this depth or above it'),
});

export const sampleSettingsSchema = z
  .strictObject({
    layers: z.union([z.number().int().min(1).max(8), z.literal('unknown')]),
    prior: ensemblePriorSchema,
    priors: z.array(gaussianPriorSchema).max(30).default([]),
    draws: z.number().int().min(1).max(1_000_000).default(20_000).describe('kept samples'),
    seed: z.number().int().min(0).max(4294967295).default(1),
    target: targetBedSchema.optional(),
    narrow: ensemblePriorSchema
      .optional()
      .describe('prior to try the target under; absent = from the readings'),
    wide: ensemblePriorSchema
      .optional()
      .describe(
        'prior to try the target under; absent = a decade of ρ and a factor 3 of thickness wider each way',
      ),
  })
  .refine(({ layers, priors }) => layers !== 'unknown' || priors.length === 0, {
    path: ['priors'],
    message: 'need a stated layer count',
  })
  .meta({ id: 'SampleSettings' });

export const ensembleStatusSchema = z.enum(['finished', 'chain-too-short']);

const chance = z.number().min(0).max(1);
const quantilesSchema = z.strictObject({
  p5: z.number(),
  p16: z.number(),
  p50: z.number(),
  p84: z.number(),
  p95: z.number(),
});
const targetChanceSchema = z.strictObject({
  probability: chance,
  standardError: z.number().describe('Monte-Carlo error of the probability'),
  before: chance.describe('probability before the readings'),
  prior: z.strictObject({
    resistivity: z.tuple([z.number(), z.number()]),
    thickness: z.tuple([z.number(), z.number()]),
  }),
});

export const sampleResultSchema = z
  .strictObject({
    status: ensembleStatusSchema,
    message: z.string().describe('the status in a sentence'),
    acceptance: chance,
    acceptanceByMove: z.array(
      z.strictObject({
        move: z.enum([
          'difference',
          'mixture',
          'birth',
          'death',
          'relocation',
          'boundary',
          'resistivity',
          'equivalence',
        ]),
        tried: z.number().int(),
        acceptance: chance,
      }),
    ),
    rHat: z.number().describe('worst rank-normalised split R-hat (Vehtari et al. 2021)'),
    effectiveSampleSize: z.number().describe('least of the watched quantities (Geyer 1992)'),
    draws: z.number().int(),
    thinning: z.number().int(),
    quantiles: z
      .strictObject({
        resistivity: z.array(quantilesSchema).describe('Ω·m'),
        thickness: z.array(quantilesSchema).describe('m'),
        depth: z.array(quantilesSchema).describe('base of layer i, m'),
      })
      .nullable()
      .describe('null where the count is unknown'),
    layerCountProbability: z
      .array(chance)
      .nullable()
      .describe('of 1, 2, … 8 layers; null where it is stated'),
    depths: z.array(z.number()).describe('m, centres of cells even in ln'),
    resistivityAtDepth: z.array(quantilesSchema).describe('Ω·m, one a depth'),
    interfaceDensity: z.array(z.number()).describe('boundaries a unit of ln depth, one a depth'),
    interfaceChance: z.array(chance).describe('of at least one boundary in the cell of each depth'),
    density: z.strictObject({
      depths: z.array(z.number()),
      resistivityEdges: z.array(z.number()).describe('Ω·m, even in ln'),
      share: z.array(z.array(chance)).describe('one row a depth'),
    }),
    earths: z.array(layeredEarthSchema).describe('samples, thinned to 500 at most'),
    target: z
      .strictObject({
        ...targetChanceSchema.shape,
        narrow: targetChanceSchema,
        wide: targetChanceSchema,
        priorDecides: z.boolean().describe('the answers under the three priors lie more than 0.1 apart'),
        words: z.string(),
      })
      .nullable(),
    engine: z.string().describe('semantic version'),
  })
  .meta({ id: 'SampleResult' });

export const sampleRequestSchema = z.strictObject({
  id: lineId,
  readings: z.array(fitReadingSchema).min(1).max(2000),
  settings: sampleSettingsSchema,
});

export const sampleAnswerSchema = z.strictObject({ id: lineId, ...sampleResultSchema.shape });

export type SampleSettings = z.infer<typeof sampleSettingsSchema>;
export type SampleResult = z.infer<typeof sampleResultSchema>;

type Accepts<Target, Source extends Target> = Source;

/** Fails to compile when these shapes and the engine's drift apart. */
export type SampleAgreement = [
  Accepts<SampleResult, EnsembleResult>,
  Accepts<EnsembleResult, SampleResult>,
  Accepts<EngineSettings, SampleSettings>,
];
