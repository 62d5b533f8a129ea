import { z } from 'zod';
import { idSchema } from '../contract/common';
import { createSurveySchema, surveyListSchema, surveySchema, updateSurveySchema } from '../contract/surveys';
import { endpoint, type Endpoint } from '../http/endpoint';
import { createSurvey, getSurvey, listSurveys, updateSurvey } from './survey-service';

const surveyParams = z.strictObject({ surveyId: idSchema });

export const surveyEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/surveys',
    summary: 'The surveys one is a member of, with their progress',
    tag: 'Surveys',
    access: 'signed-in',
    answers: { 200: surveyListSchema },
    handle: (context) => listSurveys(context),
  }),
  endpoint({
    method: 'post',
    path: '/surveys',
    summary: 'Start a survey; one becomes its lead',
    tag: 'Surveys',
    access: 'signed-in',
    body: createSurveySchema,
    answers: { 201: surveySchema },
    handle: (context, { body }) => createSurvey(context, body),
  }),
  endpoint({
    method: 'get',
    path: '/surveys/:surveyId',
    summary: 'A survey with its progress',
    tag: 'Surveys',
    access: 'signed-in',
    params: surveyParams,
    answers: { 200: surveySchema },
    handle: (context, { params }) => getSurvey(context, params.surveyId),
  }),
  endpoint({
    method: 'patch',
    path: '/surveys/:surveyId',
    summary: 'Change a survey',
    tag: 'Surveys',
    access: 'signed-in',
    versioned: true,
    params: surveyParams,
    body: updateSurveySchema,
    answers: { 200: surveySchema },
    handle: (context, { params, body, version }) => updateSurvey(context, params.surveyId, version, body),
  }),
];
