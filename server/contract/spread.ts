import { z } from 'zod';

const lengthM = z.number().gt(0).max(1e6);

/** A length that may be null; a message for what is no number says so, since zod's names the length alone. */
const lengthOrNull = (whenNull: string) =>
  z
    .number({
      error: ({ code, input }) => {
        if (code !== 'invalid_type') return undefined;
        return `${input === undefined ? 'is missing; it must' : 'must'} be a number, or null ${whenNull}`;
      },
    })
    .gt(0)
    .max(1e6)
    .nullable();
const halfMNOrNull = lengthOrNull('where MN was not recorded').describe(
  'MN/2, m; null = not recorded (gradient limit)',
);
const distanceOrNull = lengthOrNull('for an electrode at infinity');

/** Where the four electrodes stand; lengths in m. */
export const spreadSchema = z
  .discriminatedUnion('type', [
    z.strictObject({
      type: z.literal('schlumberger'),
      halfAB: lengthM.describe('AB/2, m, above halfMN'),
      halfMN: halfMNOrNull,
    }),
    z.strictObject({
      type: z.literal('half-schlumberger'),
      halfAB: lengthM.describe('AO, m, above halfMN; B at infinity'),
      halfMN: halfMNOrNull,
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
      am: distanceOrNull.describe('distance A–M, m; null = at infinity'),
      an: distanceOrNull.describe('distance A–N, m; null = at infinity'),
      bm: distanceOrNull.describe('distance B–M, m; null = at infinity'),
      bn: distanceOrNull.describe('distance B–N, m; null = at infinity'),
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
