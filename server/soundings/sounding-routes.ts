import { z } from 'zod';
import { idSchema } from '../contract/common';
import {
  createSoundingSchema,
  soundingPageSchema,
  soundingQuerySchema,
  soundingSchema,
  updateSoundingSchema,
} from '../contract/soundings';
import { endpoint, type Endpoint } from '../http/endpoint';
import { createSounding, getSounding, listSoundings, updateSounding } from './sounding-service';

const surveyParams = z.strictObject({ surveyId: idSchema });
const soundingParams = z.strictObject({ soundingId: idSchema });

export const soundingEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/surveys/:surveyId/soundings',
    summary: 'Soundings of a survey with their curves and the run that stands for each',
    tag: 'Soundings',
    access: 'signed-in',
    params: surveyParams,
    query: soundingQuerySchema,
    answers: { 200: soundingPageSchema },
    handle: (context, { params, query }) => listSoundings(context, params.surveyId, query),
  }),
  endpoint({
    method: 'post',
    path: '/surveys/:surveyId/soundings',
    summary: 'Add a sounding',
    tag: 'Soundings',
    access: 'signed-in',
    params: surveyParams,
    body: createSoundingSchema,
    answers: { 201: soundingSchema },
    handle: (context, { params, body }) => createSounding(context, params.surveyId, body),
  }),
  endpoint({
    method: 'get',
    path: '/soundings/:soundingId',
    summary: 'A sounding',
    tag: 'Soundings',
    access: 'signed-in',
    params: soundingParams,
    answers: { 200: soundingSchema },
    handle: (context, { params }) => getSounding(context, params.soundingId),
  }),
  endpoint({
    method: 'patch',
    path: '/soundings/:soundingId',
    summary: 'Change a sounding',
    tag: 'Soundings',
    access: 'signed-in',
    versioned: true,
    params: soundingParams,
    body: updateSoundingSchema,
    answers: { 200: soundingSchema },
    handle: (context, { params, body, version }) => updateSounding(context, params.soundingId, version, body),
  }),
];
