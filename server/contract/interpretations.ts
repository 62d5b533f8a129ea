import { z } from 'zod';
import {
  idSchema,
  listOf,
  longTextSchema,
  nameSchema,
  personSchema,
  timestampSchema,
  versionSchema,
} from './common';

export const interpretationStateSchema = z.enum([
  'draft',
  'in-review',
  'changes-asked',
  'accepted',
  'superseded',
]);
export type InterpretationState = z.infer<typeof interpretationStateSchema>;

/** States of what still counts: all but what a newer acceptance replaced. */
export const standingStateSchema = interpretationStateSchema.exclude(['superseded']);
export type StandingState = z.infer<typeof standingStateSchema>;
/** Weightiest first: where several interpretations stand, the first state of this list that one of them has is told. */
export const STANDING_STATES: readonly StandingState[] = ['in-review', 'changes-asked', 'accepted', 'draft'];

export const bedRoleSchema = z.enum(['cover', 'aquifer', 'aquitard', 'saline', 'basement', 'unknown']);
export type BedRole = z.infer<typeof bedRoleSchema>;
export const bedConfidenceSchema = z.enum(['well-supported', 'likely', 'possible', 'unstated']);
export type BedConfidence = z.infer<typeof bedConfidenceSchema>;

export const interpretationBedSchema = z
  .strictObject({
    layerIndex: z.number().int().min(0).max(7),
    ground: z
      .string()
      .trim()
      .max(200)
      .describe('the ground in words; resistivity alone never names one rock'),
    role: bedRoleSchema,
    confidence: bedConfidenceSchema,
    otherCandidates: z.string().trim().max(500).describe('other grounds the resistivity allows'),
  })
  .meta({ id: 'InterpretationBed' });
export type InterpretationBed = z.infer<typeof interpretationBedSchema>;

export const reviewEventSchema = z
  .strictObject({
    id: z.string(),
    kind: z
      .enum(['submitted', 'withdrawn', 'changes-asked', 'accepted', 'superseded', 'commented', 'edited'])
      .describe('edited: the actor, who is not the author, changed the statement from then on'),
    actor: personSchema,
    at: timestampSchema,
    comment: z.string(),
  })
  .meta({ id: 'ReviewEvent' });
export type ReviewEvent = z.infer<typeof reviewEventSchema>;

export const interpretationSchema = z
  .strictObject({
    id: idSchema,
    soundingId: idSchema,
    runId: idSchema,
    runNumber: z.number().int(),
    author: personSchema,
    title: z.string(),
    narrative: z.string(),
    waterLevelDepthM: z.number().nullable(),
    beds: z.array(interpretationBedSchema),
    state: interpretationStateSchema,
    version: versionSchema,
    createdAt: timestampSchema,
    updatedAt: timestampSchema,
    events: z.array(reviewEventSchema),
    can: z.strictObject({
      edit: z.boolean(),
      submit: z.boolean(),
      withdraw: z.boolean(),
      decide: z.boolean(),
      comment: z.boolean(),
      discard: z.boolean().describe('delete it: a draft that was never submitted and holds no history'),
    }),
    decideRefusal: z
      .string()
      .nullable()
      .describe('why this person may not decide, where the role alone would allow it'),
  })
  .meta({ id: 'Interpretation' });
export type Interpretation = z.infer<typeof interpretationSchema>;
export const interpretationListSchema = listOf(interpretationSchema);

export const createInterpretationSchema = z
  .strictObject({ runId: idSchema, title: nameSchema })
  .meta({ id: 'CreateInterpretation' });
export const updateInterpretationSchema = z
  .strictObject({
    title: nameSchema,
    narrative: longTextSchema,
    waterLevelDepthM: z.number().min(-200).max(5000).nullable(),
    beds: z.array(interpretationBedSchema).max(8),
  })
  .partial()
  .meta({ id: 'UpdateInterpretation' });
export const createReviewEventSchema = z
  .strictObject({
    kind: z.enum(['submitted', 'withdrawn', 'changes-asked', 'accepted', 'commented']),
    comment: z.string().trim().max(5000).default(''),
    version: versionSchema
      .optional()
      .describe('the version that was read; when another one is there by now, the event is refused'),
  })
  .refine((event) => !['changes-asked', 'commented'].includes(event.kind) || event.comment !== '', {
    path: ['comment'],
    message: 'write what is asked or meant',
  })
  .meta({ id: 'CreateReviewEvent' });
