import { z } from 'zod';
import { spreadSchema } from './spread';

/** Cells of a smooth or stepped ground. */
export const FEWEST_CELLS = 8;
export const MOST_CELLS = 40;

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
    branch: z
      .string()
      .max(80)
      .optional()
      .describe('group of readings, such as those of one MN, that may stand shifted as a whole'),
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

/** What is known beforehand; index counts layers from 0 at the surface, a depth is that of the base of the layer. */
export const gaussianPriorSchema = z.strictObject({
  on: z.enum(['resistivity', 'thickness', 'depth']),
  index: z.number().int().min(0).max(7),
  value: z.number().gt(0).max(1e9).describe('Ω·m or m'),
  sigma: z
    .number()
    .gt(0)
    .max(1e6)
    .describe('standard deviation: of the logarithm for resistivity and thickness, in m for a depth'),
});

export const DEFAULT_BOUNDS = { resistivity: [0.1, 1e5], thickness: [0.02, 1000] } satisfies z.infer<
  typeof fitBoundsSchema
>;

export const fitSettingsSchema = z
  .strictObject({
    kind: z.enum(['layered', 'smooth', 'stepped']),
    layers: z
      .union([z.number().int().min(1).max(MOST_CELLS), z.literal('auto')])
      .default('auto')
      .describe(
        'layered: 1 to 8, "auto" = the fewest within the noise; smooth and stepped: 8 to 40 cells, "auto" = the usual grid',
      ),
    seed: z.number().int().min(0).max(4294967295).default(1),
    bounds: fitBoundsSchema.default(DEFAULT_BOUNDS),
    fixed: z.array(fixedParameterSchema).max(15).default([]),
    priors: z.array(gaussianPriorSchema).max(30).default([]),
    branchShiftSigma: z
      .number()
      .gt(0)
      .max(1)
      .optional()
      .describe('standard deviation of the ln shift of each branch but the largest; absent = no shifts'),
    outlierTolerant: z.boolean().default(false).describe('readings far off the ground count for less'),
    targetMisfit: z
      .number()
      .gt(0)
      .max(1e6)
      .optional()
      .describe('χ²/N that a smooth or stepped fit aims at; absent = 1'),
    start: layeredEarthSchema.optional().describe('a model to start from, beside the seeded starts'),
  })
  .superRefine((settings, context) => {
    const issue = (path: (string | number)[], message: string) =>
      context.addIssue({ code: 'custom', path, message });
    const { kind, layers, fixed, priors, bounds, start } = settings;
    if (kind !== 'layered') {
      for (const field of ['fixed', 'priors'] as const)
        if (settings[field].length > 0) issue([field], 'belongs to a layered fit');
      if (start) issue(['start'], 'belongs to a layered fit');
      if (layers !== 'auto' && layers < FEWEST_CELLS)
        issue(['layers'], `must be ${FEWEST_CELLS} to ${MOST_CELLS} cells or "auto"`);
      return;
    }
    if (settings.targetMisfit !== undefined) issue(['targetMisfit'], 'belongs to a smooth or stepped fit');
    if (layers === 'auto') {
      if (fixed.length > 0) issue(['fixed'], 'needs a stated layer count');
      if (priors.length > 0) issue(['priors'], 'needs a stated layer count');
      return;
    }
    if (layers > 8) {
      issue(['layers'], 'must be 1 to 8 or "auto" in a layered fit');
      return;
    }
    priors.forEach(({ on, index }, i) => {
      const count = on === 'resistivity' ? layers : layers - 1;
      if (index >= count)
        issue(
          ['priors', i, 'index'],
          count > 0 ? `must be below ${count}` : `one layer has no ${on} to know beforehand`,
        );
    });
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

export type FitSettings = z.infer<typeof fitSettingsSchema>;
export type FitSettingsInput = z.input<typeof fitSettingsSchema>;
export type FitReading = z.infer<typeof fitReadingSchema>;
export type LayeredEarthModel = z.infer<typeof layeredEarthSchema>;
