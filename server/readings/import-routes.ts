import { z } from 'zod';
import { idSchema } from '../contract/common';
import { importPreviewSchema, revisionSchema } from '../contract/readings';
import { endpoint, type Endpoint } from '../http/endpoint';
import { importFormSchema, importPreviewFormSchema } from './import-form';
import { importFile, previewImport } from './import-service';

const soundingParams = z.strictObject({ soundingId: idSchema });

export const importEndpoints: Endpoint[] = [
  endpoint({
    method: 'post',
    path: '/soundings/:soundingId/import-previews',
    summary: 'Read a file as a Field sheet: what would be imported, and every fault; stores nothing',
    tag: 'Readings',
    access: 'signed-in',
    upload: true,
    params: soundingParams,
    body: importPreviewFormSchema,
    answers: { 200: importPreviewSchema },
    handle: (context, { params, body }, { request }) =>
      previewImport(context, params.soundingId, request.file, body.mapping),
  }),
  endpoint({
    method: 'post',
    path: '/soundings/:soundingId/imports',
    summary: 'Import a file as a revision, and keep the file; equal content is the same revision (200)',
    tag: 'Readings',
    access: 'signed-in',
    upload: true,
    params: soundingParams,
    body: importFormSchema,
    answers: { 201: revisionSchema, 200: revisionSchema },
    handle: (context, { params, body }, { request }) =>
      importFile(context, params.soundingId, request.file, body),
  }),
];
