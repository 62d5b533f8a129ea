import { z } from 'zod';
import { fitResultSchema, fitStatusSchema } from './fit-result';
import { fitReadingSchema, fitSettingsSchema, layeredEarthSchema } from './fit-settings';
import { fitLineAnswerSchema, fitLineRequestSchema, fitLineSettingsSchema } from './fit-line';
import {
  ensembleStatusSchema,
  sampleAnswerSchema,
  sampleRequestSchema,
  sampleSettingsSchema,
} from './sample';
import { lineId } from './line-id';
import { spreadSchema } from './spread';

export const forwardRequestSchema = z.strictObject({
  id: lineId,
  earth: layeredEarthSchema,
  spreads: z.array(spreadSchema).min(1).max(2000),
});

export const forwardAnswerSchema = z.strictObject({
  id: lineId,
  apparentResistivity: z.array(z.number()).describe('Ω·m, one a spread, in order'),
  geometricFactor: z.array(z.number().nullable()).describe('K, m, signed; null where halfMN is null'),
});

export const fitRequestSchema = z.strictObject({
  id: lineId,
  readings: z.array(fitReadingSchema).min(1).max(2000),
  settings: fitSettingsSchema,
});

export const fitAnswerSchema = z.strictObject({ id: lineId, ...fitResultSchema.shape });

export const lineErrorSchema = z.strictObject({
  id: lineId.nullable().describe('null when the line could not be read that far'),
  error: z.strictObject({
    code: z.string(),
    message: z.string().describe('what was found and what is allowed'),
    path: z.array(z.union([z.string(), z.number()])).describe('where in the line, outermost key first'),
  }),
});

/** What `schema NAME` prints. */
export const COMMAND_LINE_SCHEMAS = {
  spread: spreadSchema,
  earth: layeredEarthSchema,
  reading: fitReadingSchema,
  'fit-settings': fitSettingsSchema,
  'fit-status': fitStatusSchema,
  forward: z.strictObject({ request: forwardRequestSchema, answer: forwardAnswerSchema }),
  'forward-request': forwardRequestSchema,
  'forward-answer': forwardAnswerSchema,
  fit: z.strictObject({ request: fitRequestSchema, answer: fitAnswerSchema }),
  'fit-request': fitRequestSchema,
  'fit-answer': fitAnswerSchema,
  'fit-line': z.strictObject({ request: fitLineRequestSchema, answer: fitLineAnswerSchema }),
  'fit-line-settings': fitLineSettingsSchema,
  'fit-line-request': fitLineRequestSchema,
  'fit-line-answer': fitLineAnswerSchema,
  sample: z.strictObject({ request: sampleRequestSchema, answer: sampleAnswerSchema }),
  'sample-settings': sampleSettingsSchema,
  'sample-status': ensembleStatusSchema,
  'sample-request': sampleRequestSchema,
  'sample-answer': sampleAnswerSchema,
  error: lineErrorSchema,
} as const;

export type ForwardRequest = z.infer<typeof forwardRequestSchema>;
export type ForwardAnswer = z.infer<typeof forwardAnswerSchema>;
export type FitRequest = z.infer<typeof fitRequestSchema>;
export type LineError = z.infer<typeof lineErrorSchema>;
