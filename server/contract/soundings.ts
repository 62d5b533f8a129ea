import { z } from 'zod';
import {
  dateSchema,
  idSchema,
  nameSchema,
  pageOf,
  pageQuerySchema,
  remarkSchema,
  timestampSchema,
  versionSchema,
} from './common';
import { surveyCanSchema } from './roles';
import { spreadTypeSchema } from './spread';

export const soundingStateSchema = z.enum([
  'no-readings',
  'measured',
  'fitted',
  'draft',
  'in-review',
  'changes-asked',
  'accepted',
]);
export type SoundingState = z.infer<typeof soundingStateSchema>;

const coordinateM = z.number().min(-1e8).max(1e8).nullable();
const soundingFields = {
  name: nameSchema,
  lineId: idSchema.nullable(),
  spreadType: spreadTypeSchema,
  xM: coordinateM.describe('easting or own x, m'),
  yM: coordinateM.describe('northing or own y, m'),
  elevationM: z.number().min(-500).max(9000).nullable(),
  elevationDatum: z.string().trim().max(120),
  azimuthDeg: z.number().min(0).lt(360).nullable().describe('of the spread, degrees from north'),
  measuredOn: dateSchema.nullable(),
  crew: z.string().trim().max(200),
  instrument: z.string().trim().max(200),
  note: remarkSchema,
};

export const soundingSchema = z
  .strictObject({
    id: idSchema,
    surveyId: idSchema,
    surveyName: z.string(),
    lineName: z.string().nullable(),
    ...soundingFields,
    state: soundingStateSchema,
    currentRevisionId: idSchema.nullable(),
    version: versionSchema,
    createdAt: timestampSchema,
    updatedAt: timestampSchema,
    errorFloor: z.number().describe('the survey’s, relative'),
    can: surveyCanSchema,
  })
  .meta({ id: 'Sounding' });
export type Sounding = z.infer<typeof soundingSchema>;

export const createSoundingSchema = z
  .strictObject({
    ...soundingFields,
    lineId: soundingFields.lineId.default(null),
    xM: soundingFields.xM.default(null),
    yM: soundingFields.yM.default(null),
    elevationM: soundingFields.elevationM.default(null),
    elevationDatum: soundingFields.elevationDatum.default(''),
    azimuthDeg: soundingFields.azimuthDeg.default(null),
    measuredOn: soundingFields.measuredOn.default(null),
    crew: soundingFields.crew.default(''),
    instrument: soundingFields.instrument.default(''),
    note: soundingFields.note.default(''),
  })
  .meta({ id: 'CreateSounding' });
export const updateSoundingSchema = z.strictObject(soundingFields).partial().meta({ id: 'UpdateSounding' });

/** One row of the soundings table, with what its sparkline needs. */
export const soundingRowSchema = z
  .strictObject({
    id: idSchema,
    name: z.string(),
    lineName: z.string().nullable(),
    spreadType: spreadTypeSchema,
    xM: z.number().nullable(),
    yM: z.number().nullable(),
    measuredOn: dateSchema.nullable(),
    state: soundingStateSchema,
    revisionNumber: z.number().int().nullable(),
    curve: z
      .array(
        z.strictObject({
          spacingM: z.number(),
          apparentResistivityOhmM: z.number(),
          excluded: z.boolean(),
        }),
      )
      .describe('readings of the current revision'),
    latestRun: z
      .strictObject({
        id: idSchema,
        number: z.number().int(),
        layers: z.number().int().nullable().describe('count of beds; null for a smooth or stepped ground'),
        chi2PerReading: z.number(),
        rmsPercent: z.number(),
        misfitProbability: z
          .number()
          .nullable()
          .describe(
            'of a misfit at least as large, were model and errors right; null where it cannot be tested',
          ),
        predicted: z.array(z.strictObject({ spacingM: z.number(), apparentResistivityOhmM: z.number() })),
        ofOlderReadings: z.boolean(),
      })
      .nullable()
      .describe(
        'the finished run that stands for it: the pinned one, else that of the weightiest interpretation, else the newest that has beds, else the newest',
      ),
    updatedAt: timestampSchema,
  })
  .meta({ id: 'SoundingRow' });
export type SoundingRow = z.infer<typeof soundingRowSchema>;
export const soundingPageSchema = pageOf(soundingRowSchema);

export const soundingQuerySchema = pageQuerySchema.extend({
  search: z.string().trim().max(120).default(''),
  lineId: idSchema.optional(),
  state: soundingStateSchema.optional(),
  spreadType: spreadTypeSchema.optional(),
  sort: z.enum(['name', 'line', 'measuredOn', 'state', 'misfit', 'layers', 'updatedAt']).default('name'),
  order: z.enum(['asc', 'desc']).default('asc'),
});
