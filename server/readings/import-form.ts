import { z } from 'zod';
import { idSchema } from '../contract/common';
import { importAcceptSchema, importMappingSchema } from '../contract/readings';

/** A multipart field holds text: JSON where it is more than a word. */
const jsonText = <T extends z.ZodType>(schema: T) =>
  z
    .string()
    .max(20_000)
    .transform((text, context): unknown => {
      try {
        return JSON.parse(text);
      } catch {
        context.addIssue({ code: 'custom', message: 'must be JSON' });
        return z.NEVER;
      }
    })
    .pipe(schema);

export const importPreviewFormSchema = z.strictObject({
  mapping: jsonText(importMappingSchema).optional().describe('as found in the file when absent'),
});

export const importFormSchema = z.strictObject({
  mapping: jsonText(importMappingSchema),
  accept: importAcceptSchema.describe('all = nothing is stored if any row has a fault'),
  baseRevisionId: z
    .union([idSchema, z.literal('').transform(() => null)])
    .optional()
    .describe('the revision you started from, empty for none; when sent, a newer one is a conflict'),
});
