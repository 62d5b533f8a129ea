import { z } from 'zod';
import { idSchema } from '../contract/common';
import { boreholeListSchema, boreholeSchema, writeBoreholeSchema } from '../contract/surveys';
import { endpoint, type Endpoint } from '../http/endpoint';
import { createBorehole, getBorehole, listBoreholes, replaceBorehole } from './borehole-service';

const surveyParams = z.strictObject({ surveyId: idSchema });
const boreholeParams = z.strictObject({ boreholeId: idSchema });

export const boreholeEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/surveys/:surveyId/boreholes',
    summary: 'Boreholes of a survey with their logs and water levels',
    tag: 'Boreholes',
    access: 'signed-in',
    params: surveyParams,
    answers: { 200: boreholeListSchema },
    handle: (context, { params }) => listBoreholes(context, params.surveyId),
  }),
  endpoint({
    method: 'post',
    path: '/surveys/:surveyId/boreholes',
    summary: 'Add a borehole',
    tag: 'Boreholes',
    access: 'signed-in',
    params: surveyParams,
    body: writeBoreholeSchema,
    answers: { 201: boreholeSchema },
    handle: (context, { params, body }) => createBorehole(context, params.surveyId, body),
  }),
  endpoint({
    method: 'get',
    path: '/boreholes/:boreholeId',
    summary: 'A borehole with its log and water levels',
    tag: 'Boreholes',
    access: 'signed-in',
    params: boreholeParams,
    answers: { 200: boreholeSchema },
    handle: (context, { params }) => getBorehole(context, params.boreholeId),
  }),
  endpoint({
    method: 'put',
    path: '/boreholes/:boreholeId',
    summary: 'Write a borehole anew, with its log and water levels',
    tag: 'Boreholes',
    access: 'signed-in',
    versioned: true,
    params: boreholeParams,
    body: writeBoreholeSchema,
    answers: { 200: boreholeSchema },
    handle: (context, { params, body, version }) =>
      replaceBorehole(context, params.boreholeId, version, body),
  }),
];
