import { z } from 'zod';

const lengthM = z.number().gt(0).max(1e6);

/** Where the four electrodes stand; lengths in m. */
export const spreadSchema = z
  .discriminatedUnion('type', [
    z.strictObject({
      type: z.literal('schlumberger'),
      halfAB: lengthM.describe('AB/2, m, above halfMN'),
      halfMN: lengthM.nullable().describe('MN/2, m; null = not recorded (gradient limit)'),
    }),
    z.strictObject({
      type: z.literal('half-schlumberger'),
      halfAB: lengthM.describe('AO, m, above halfMN; B at infinity'),
      halfMN: lengthM.nullable().describe('MN/2, m; null = not recorded (gradient limit)'),
    }),
    z.strictObject({ type: z.literal('wenner'), spacing: lengthM.describe('a, m') }),
    z.strictObject({ type: z.literal('pole-pole'), spacing: lengthM.describe('AM, m') }),
    z.strictObject({
      type: z.literal('dipole-dipole'),
      dipole: lengthM.describe('dipole length a, m'),
      n: z.number().gt(0).max(1000).describe('separation of the dipoles in dipole lengths'),
    }),
    z.strictObject({
      type: z.literal('electrodes'),
      am: lengthM.nullable().describe('distance A–M, m; null = at infinity'),
      an: lengthM.nullable().describe('distance A–N, m; null = at infinity'),
      bm: lengthM.nullable().describe('distance B–M, m; null = at infinity'),
      bn: lengthM.nullable().describe('distance B–N, m; null = at infinity'),
    }),
  ])
  .meta({ id: 'Spread' });

export const spreadTypeSchema = z.enum([
  'schlumberger',
  'half-schlumberger',
  'wenner',
  'pole-pole',
  'dipole-dipole',
  'electrodes',
]);
export type SpreadType = z.infer<typeof spreadTypeSchema>;
