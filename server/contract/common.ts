import { z } from 'zod';

export const idSchema = z.uuid();
export const timestampSchema = z.iso.datetime().describe('UTC, ISO 8601');
export const dateSchema = z.iso.date().describe('calendar date, ISO 8601');
export const versionSchema = z
  .number()
  .int()
  .min(1)
  .describe('for optimistic locking: send it back quoted in If-Match');
export const nameSchema = z.string().trim().min(1).max(120);
export const remarkSchema = z.string().trim().max(2000);
export const longTextSchema = z.string().max(50_000);
export const emailSchema = z
  .email()
  .max(254)
  .transform((email) => email.toLowerCase());

export const personSchema = z.strictObject({ id: idSchema, name: z.string() }).meta({ id: 'Person' });
export type Person = z.infer<typeof personSchema>;

export const pageQuerySchema = z.strictObject({
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(500).default(100),
});

export const pageOf = <T extends z.ZodType>(item: T) =>
  z.strictObject({
    items: z.array(item),
    total: z.number().int().describe('rows that match, over all pages'),
    page: z.number().int(),
    pageSize: z.number().int(),
  });

export const listOf = <T extends z.ZodType>(item: T) => z.strictObject({ items: z.array(item) });

/** One thing that is wrong with what was sent: where, what was found, what is allowed. */
export const faultSchema = z
  .strictObject({
    path: z.array(z.union([z.string(), z.number()])),
    message: z.string(),
    found: z.string().optional(),
    allowed: z.string().optional(),
  })
  .meta({ id: 'Fault' });
export type Fault = z.infer<typeof faultSchema>;

/** RFC 9457 problem details. */
export const problemSchema = z
  .strictObject({
    type: z.string(),
    title: z.string(),
    status: z.number().int(),
    code: z.string().describe('stable word for programs'),
    detail: z.string().describe('a sentence for people'),
    instance: z.string(),
    requestId: z.string(),
    faults: z.array(faultSchema).optional(),
    current: z.unknown().optional().describe('with "conflict": the row as it now stands'),
  })
  .meta({ id: 'Problem' });
export type Problem = z.infer<typeof problemSchema>;
