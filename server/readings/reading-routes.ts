import { z } from 'zod';
import { idSchema } from '../contract/common';
import {
  draftSchema,
  fieldSheetSchema,
  revisionListSchema,
  revisionSchema,
  saveRevisionSchema,
  writeDraftSchema,
} from '../contract/readings';
import { endpoint, type Endpoint } from '../http/endpoint';
import {
  dropDraft,
  getFieldSheet,
  getRevision,
  getRevisionFile,
  listRevisions,
  putDraft,
  saveSheet,
} from './reading-service';

const soundingParams = z.strictObject({ soundingId: idSchema });
const revisionParams = z.strictObject({ revisionId: idSchema });

export const readingEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/soundings/:soundingId/readings',
    summary: 'The Field sheet: the current revision, and your own draft',
    tag: 'Readings',
    access: 'signed-in',
    params: soundingParams,
    answers: { 200: fieldSheetSchema },
    handle: (context, { params }) => getFieldSheet(context, params.soundingId),
  }),
  endpoint({
    method: 'put',
    path: '/soundings/:soundingId/reading-draft',
    summary: 'Keep your draft of the Field sheet',
    tag: 'Readings',
    access: 'signed-in',
    params: soundingParams,
    body: writeDraftSchema,
    answers: { 200: draftSchema },
    handle: (context, { params, body }) => putDraft(context, params.soundingId, body),
  }),
  endpoint({
    method: 'delete',
    path: '/soundings/:soundingId/reading-draft',
    summary: 'Drop your draft of the Field sheet',
    tag: 'Readings',
    access: 'signed-in',
    params: soundingParams,
    answers: { 204: null },
    handle: (context, { params }) => dropDraft(context, params.soundingId),
  }),
  endpoint({
    method: 'get',
    path: '/soundings/:soundingId/revisions',
    summary: 'Revisions of the readings, newest first',
    tag: 'Readings',
    access: 'signed-in',
    params: soundingParams,
    answers: { 200: revisionListSchema },
    handle: (context, { params }) => listRevisions(context, params.soundingId),
  }),
  endpoint({
    method: 'post',
    path: '/soundings/:soundingId/revisions',
    summary: 'Save the Field sheet as a revision; equal content is the same revision (200)',
    tag: 'Readings',
    access: 'signed-in',
    params: soundingParams,
    body: saveRevisionSchema,
    answers: { 201: revisionSchema, 200: revisionSchema },
    handle: (context, { params, body }) => saveSheet(context, params.soundingId, body),
  }),
  endpoint({
    method: 'get',
    path: '/revisions/:revisionId',
    summary: 'A revision with what follows from its readings',
    tag: 'Readings',
    access: 'signed-in',
    params: revisionParams,
    answers: { 200: revisionSchema },
    handle: (context, { params }) => getRevision(context, params.revisionId),
  }),
  endpoint({
    method: 'get',
    path: '/revisions/:revisionId/source-file',
    summary: 'The uploaded file that a revision was read from, byte for byte',
    tag: 'Readings',
    access: 'signed-in',
    params: revisionParams,
    answers: { 200: z.unknown().meta({ type: 'string', format: 'binary' }) },
    async handle(context, { params }, { response }) {
      const { name, bytes } = await getRevisionFile(context, params.revisionId);
      response.attachment(name).type('application/octet-stream').send(bytes);
    },
  }),
];
