import { z } from 'zod';
import { layeredEarthSchema } from './fit-settings';

/** Why a fit stopped. `converged-*` are good ends; the model is the best found in every case. */
export const fitStatusSchema = z.enum([
  'converged-gradient',
  'converged-step',
  'converged-decrease',
  'iteration-limit',
  'no-descent',
  'target-reached',
  'target-out-of-reach',
]);

const intervalSchema = z.tuple([z.number().nullable(), z.number().nullable()]);
const factorSchema = z
  .number()
  .nullable()
  .describe(
    'value × and ÷ this at one standard deviation: the larger of the 68 % reach and the 95 % reach to the power 1/1.96; null = not determined',
  );

export const fitResultSchema = z
  .strictObject({
    status: fitStatusSchema,
    earth: layeredEarthSchema,
    chi2PerReading: z.number(),
    rmsPercent: z.number(),
    predicted: z.array(z.number()).describe('Ω·m, one a reading, in order'),
    residuals: z.array(z.number()).describe('(ln predicted − ln observed)/σ'),
    geometricFactor: z.array(z.number().nullable()).describe('K, m; null where MN was not recorded'),
    intervals: z
      .strictObject({
        resistivity: z.array(intervalSchema),
        thickness: z.array(intervalSchema),
        depth: z.array(intervalSchema).describe('depth of the base of layer i, m'),
      })
      .describe('95 %; null = the bounds of the fit end it, not the readings'),
    factors: z
      .strictObject({
        resistivity: z.array(factorSchema),
        thickness: z.array(factorSchema),
        depth: z.array(factorSchema),
      })
      .describe('factors of one standard deviation; null = not determined'),
    correlation: z
      .array(z.array(z.number().nullable()))
      .describe('correlation of lnρ₁…lnρ_N, lnh₁…lnh_{N−1}; null where a parameter was held or unresolved'),
    misfitProbability: z
      .number()
      .nullable()
      .describe('chance of a χ² this large if model and errors were right; null = not testable'),
    darZarrouk: z
      .strictObject({
        conductanceS: z.array(z.number()).describe('h/ρ of each bounded layer, S'),
        resistanceOhmM2: z.array(z.number()).describe('hρ of each bounded layer, Ω·m²'),
        conductanceFactor: z.array(factorSchema).describe('factor of each h/ρ; null = not determined'),
        resistanceFactor: z.array(factorSchema).describe('factor of each hρ; null = not determined'),
        totalConductanceS: z.number(),
        totalResistanceOhmM2: z.number(),
        anisotropy: z.number().nullable().describe('√(ρ_T/ρ_L) of the bounded layers; null for a half-space'),
      })
      .describe('Maillet 1947'),
    warnings: z.array(z.string()).describe('plain sentences that stand beside the result'),
    layerCounts: z
      .array(
        z.strictObject({
          layers: z.number().int(),
          status: fitStatusSchema,
          chi2PerReading: z.number(),
          bic: z.number(),
          aicc: z.number().nullable().describe('null where N − p − 1 < 1'),
          withinNoise: z
            .boolean()
            .nullable()
            .describe('χ² below the 95 % point for N − p; null = not testable'),
          chosen: z.boolean(),
          earth: layeredEarthSchema,
        }),
      )
      .nullable()
      .describe('every count tried when layers is "auto"; null otherwise'),
    oneFewer: z
      .strictObject({
        layers: z.number().int(),
        chi2PerReading: z.number(),
        withinNoise: z.boolean().nullable(),
      })
      .nullable()
      .default(null)
      .describe('of a layered fit with a stated count: how well one layer fewer does; else null'),
    reachedTarget: z
      .boolean()
      .nullable()
      .default(null)
      .describe('smooth and stepped: whether χ²/N came down to the target; null for a layered fit'),
    shifts: z
      .array(
        z.strictObject({
          branch: z.string(),
          readings: z.number().int(),
          factor: z
            .number()
            .describe('the readings of the branch stand this much above the ground of the fit'),
          interval: z.tuple([z.number(), z.number()]).describe('95 % of the factor'),
          held: z.boolean().describe('true for the branch that the others are measured by'),
        }),
      )
      .default([])
      .describe('of branches, where shifts were asked for'),
    downWeighted: z
      .array(
        z.strictObject({
          index: z.number().int().describe('in the list of readings, from 0'),
          residual: z.number(),
          weight: z.number().describe('1 = counted in full'),
        }),
      )
      .default([])
      .describe('readings more than 2.5 errors off the ground in an outlier-tolerant fit'),
    starts: z.number().int().describe('starting models tried'),
    iterations: z.number().int(),
    damping: z
      .number()
      .nullable()
      .default(null)
      .describe('of the last step; null in results before engine 2'),
    engine: z.string().describe('semantic version of the engine'),
  })
  .meta({ id: 'FitResult' });

export type FitResult = z.infer<typeof fitResultSchema>;
export type FitStatus = z.infer<typeof fitStatusSchema>;
