import { z } from 'zod';
import { idSchema } from '../contract/common';
import { createLineSchema, lineListSchema, lineSchema } from '../contract/surveys';
import { endpoint, type Endpoint } from '../http/endpoint';
import { createLine, listLines } from './line-service';

const surveyParams = z.strictObject({ surveyId: idSchema });

export const lineEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/surveys/:surveyId/lines',
    summary: 'Lines of a survey',
    tag: 'Surveys',
    access: 'signed-in',
    params: surveyParams,
    answers: { 200: lineListSchema },
    handle: (context, { params }) => listLines(context, params.surveyId),
  }),
  endpoint({
    method: 'post',
    path: '/surveys/:surveyId/lines',
    summary: 'Add a line',
    tag: 'Surveys',
    access: 'signed-in',
    params: surveyParams,
    body: createLineSchema,
    answers: { 201: lineSchema },
    handle: (context, { params, body }) => createLine(context, params.surveyId, body.name),
  }),
];
