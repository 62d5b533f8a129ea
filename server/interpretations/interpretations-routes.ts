import { z } from 'zod';
import { idSchema } from '../contract/common';
import {
  createInterpretationSchema,
  createReviewEventSchema,
  interpretationListSchema,
  interpretationSchema,
  updateInterpretationSchema,
} from '../contract/interpretations';
import { endpoint, type Endpoint } from '../http/endpoint';
import {
  changeInterpretation,
  createInterpretation,
  discardInterpretation,
  listSoundingInterpretations,
  showInterpretation,
} from './interpretations-service';
import { addReviewEvent } from './review-service';

const tag = 'Interpretations';
const soundingParams = z.strictObject({ soundingId: idSchema });
const interpretationParams = z.strictObject({ interpretationId: idSchema });

export const interpretationsEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/soundings/:soundingId/interpretations',
    summary: 'Interpretations of a sounding, newest first',
    tag,
    access: 'signed-in',
    params: soundingParams,
    answers: { 200: interpretationListSchema },
    handle: (context, { params }) => listSoundingInterpretations(context, params.soundingId),
  }),
  endpoint({
    method: 'post',
    path: '/soundings/:soundingId/interpretations',
    summary: 'Begin an interpretation of a finished run, with one bed for each of its layers',
    tag,
    access: 'signed-in',
    params: soundingParams,
    body: createInterpretationSchema,
    answers: { 201: interpretationSchema },
    handle: (context, { params, body }) => createInterpretation(context, params.soundingId, body),
  }),
  endpoint({
    method: 'get',
    path: '/interpretations/:interpretationId',
    summary: 'An interpretation with its beds and its review',
    tag,
    access: 'signed-in',
    params: interpretationParams,
    answers: { 200: interpretationSchema },
    handle: (context, { params }) => showInterpretation(context, params.interpretationId),
  }),
  endpoint({
    method: 'patch',
    path: '/interpretations/:interpretationId',
    summary: 'Edit a draft, or one that changes were asked for; beds that are not sent stay as they are',
    tag,
    access: 'signed-in',
    params: interpretationParams,
    body: updateInterpretationSchema,
    versioned: true,
    answers: { 200: interpretationSchema },
    handle: (context, { params, body, version }) =>
      changeInterpretation(context, params.interpretationId, version, body),
  }),
  endpoint({
    method: 'delete',
    path: '/interpretations/:interpretationId',
    summary: 'Discard a draft that was never submitted and holds no history',
    tag,
    access: 'signed-in',
    params: interpretationParams,
    answers: { 204: null },
    handle: (context, { params }) => discardInterpretation(context, params.interpretationId),
  }),
  endpoint({
    method: 'post',
    path: '/interpretations/:interpretationId/review-events',
    summary: 'Submit, withdraw, ask for changes, accept, or comment',
    tag,
    access: 'signed-in',
    params: interpretationParams,
    body: createReviewEventSchema,
    answers: { 201: interpretationSchema },
    handle: (context, { params, body }) => addReviewEvent(context, params.interpretationId, body),
  }),
];
