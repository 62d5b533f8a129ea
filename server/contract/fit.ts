import { z } from 'zod';
import { spreadSchema } from './spread';

export const resistivityOhmM = z.number().gt(0).max(1e9).describe('Ω·m');
export const thicknessM = z.number().gt(0).max(1e6).describe('m');

/** ρ₁…ρ_N over h₁…h_{N−1}; the last layer is unbounded. */
export const layeredEarthSchema = z
  .strictObject({
    resistivity: z.array(resistivityOhmM).min(1).max(50),
    thickness: z.array(thicknessM).max(49),
  })
  .refine((earth) => earth.thickness.length === earth.resistivity.length - 1, {
    path: ['thickness'],
    message: 'must have one entry fewer than resistivity',
  })
  .meta({ id: 'LayeredEarth' });

export const fitReadingSchema = z
  .strictObject({
    spread: spreadSchema,
    apparentResistivity: resistivityOhmM,
    relativeError: z.number().gt(0).max(1).describe('standard error of ln ρa, used as given'),
  })
  .meta({ id: 'FitReading' });

const boundPair = (item: z.ZodNumber) =>
  z
    .tuple([item, item])
    .refine(([low, high]) => low < high, { message: 'must be [low, high] with low < high' });

export const fitBoundsSchema = z.strictObject({
  resistivity: boundPair(z.number().gt(0).max(1e9)).describe('Ω·m'),
  thickness: boundPair(z.number().gt(0).max(1e6)).describe('m'),
});

/** Values held during a fit; index counts layers from 0 at the surface. */
export const fixedParameterSchema = z.strictObject({
  on: z.enum(['resistivity', 'thickness']),
  index: z.number().int().min(0).max(7),
  value: z.number().gt(0).max(1e9).describe('Ω·m or m'),
});

export const DEFAULT_BOUNDS = { resistivity: [0.1, 1e5], thickness: [0.02, 1000] } satisfies z.infer<
  typeof fitBoundsSchema
>;

export const fitSettingsSchema = z
  .strictObject({
    kind: z.literal('layered'),
    layers: z.union([z.number().int().min(1).max(8), z.literal('auto')]),
    seed: z.number().int().min(0).max(4294967295).default(1),
    bounds: fitBoundsSchema.default(DEFAULT_BOUNDS),
    fixed: z.array(fixedParameterSchema).max(15).default([]),
    start: layeredEarthSchema.optional().describe('a model to start from, beside the seeded starts'),
  })
  .superRefine((settings, context) => {
    const issue = (path: (string | number)[], message: string) =>
      context.addIssue({ code: 'custom', path, message });
    const { layers, fixed, bounds, start } = settings;
    if (layers === 'auto') {
      if (fixed.length > 0) issue(['fixed'], 'needs a stated layer count');
      return;
    }
    fixed.forEach(({ on, index, value }, i) => {
      const count = on === 'resistivity' ? layers : layers - 1;
      const before = fixed.findIndex((one) => one.on === on && one.index === index);
      if (before < i) issue(['fixed', i], `is fixed already by entry ${before}; a value can be fixed once`);
      if (index >= count)
        issue(
          ['fixed', i, 'index'],
          count > 0 ? `must be below ${count}` : 'one layer has no thickness to fix',
        );
      const [low, high] = bounds[on];
      if (value < low || value > high)
        issue(['fixed', i, 'value'], `must lie within the bounds ${low} to ${high}`);
    });
    if (start && start.resistivity.length !== layers)
      issue(['start', 'resistivity'], `must have ${layers} entries, one for each layer`);
  })
  .meta({ id: 'FitSettings' });

/** Why a fit stopped. `converged-*` are good ends; the model is the best found in every case. */
export const fitStatusSchema = z.enum([
  'converged-gradient',
  'converged-step',
  'converged-decrease',
  'iteration-limit',
  'no-descent',
]);

const intervalSchema = z.tuple([z.number().nullable(), z.number().nullable()]);
const factorSchema = z.number().nullable().describe('68 % factor: value × and ÷ this; null = not determined');

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
      .describe('95 %; null = unbounded'),
    factors: z
      .strictObject({
        resistivity: z.array(factorSchema),
        thickness: z.array(factorSchema),
        depth: z.array(factorSchema),
      })
      .describe('68 % factors; null = not determined'),
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
        conductanceFactor: z.array(factorSchema).describe('68 % factor of each h/ρ; null = not determined'),
        resistanceFactor: z.array(factorSchema).describe('68 % factor of each hρ; null = not determined'),
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
    starts: z.number().int().describe('starting models tried'),
    iterations: z.number().int(),
    engine: z.string().describe('semantic version of the engine'),
  })
  .meta({ id: 'FitResult' });

export type FitSettings = z.infer<typeof fitSettingsSchema>;
export type FitSettingsInput = z.input<typeof fitSettingsSchema>;
export type FitResult = z.infer<typeof fitResultSchema>;
export type FitStatus = z.infer<typeof fitStatusSchema>;
export type FitReading = z.infer<typeof fitReadingSchema>;
export type LayeredEarthModel = z.infer<typeof layeredEarthSchema>;
