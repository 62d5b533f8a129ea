import { z } from 'zod';
import { idSchema } from '../contract/common';
import {
  createRunSchema,
  runListSchema,
  runSchema,
  runSummarySchema,
  updateRunNoteSchema,
} from '../contract/runs';
import { endpoint, type Endpoint } from '../http/endpoint';
import { streamRunEvents } from './run-event-stream';
import {
  changeRunNote,
  listSoundingRuns,
  requestCancellation,
  requestRecomputation,
  requestRun,
  showRun,
} from './runs-service';

const tag = 'Runs';
const soundingParams = z.strictObject({ soundingId: idSchema });
const runParams = z.strictObject({ runId: idSchema });

export const runsEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/soundings/:soundingId/runs',
    summary: 'The Ledger: runs of a sounding, newest first',
    tag,
    access: 'signed-in',
    params: soundingParams,
    answers: { 200: runListSchema },
    handle: (context, { params }) => listSoundingRuns(context, params.soundingId),
  }),
  endpoint({
    method: 'post',
    path: '/soundings/:soundingId/runs',
    summary: 'Ask for a run; a request that was computed before is answered at once',
    tag,
    access: 'signed-in',
    params: soundingParams,
    body: createRunSchema,
    answers: { 201: runSchema },
    handle: (context, { params, body }) => requestRun(context, params.soundingId, body),
  }),
  endpoint({
    method: 'get',
    path: '/soundings/:soundingId/run-events',
    summary: 'Server-sent events "run": each run of the sounding as it changes, and the recent ones at first',
    tag,
    access: 'signed-in',
    params: soundingParams,
    stream: true,
    answers: { 200: runSummarySchema },
    handle: (context, { params }, exchange) => streamRunEvents(context, params.soundingId, exchange),
  }),
  endpoint({
    method: 'get',
    path: '/runs/:runId',
    summary: 'A run with its frozen readings, settings and result',
    tag,
    access: 'signed-in',
    params: runParams,
    answers: { 200: runSchema },
    handle: (context, { params }) => showRun(context, params.runId),
  }),
  endpoint({
    method: 'post',
    path: '/runs/:runId/recomputation',
    summary: 'Compute again past the cache and compare value by value',
    tag,
    access: 'signed-in',
    params: runParams,
    answers: { 201: runSchema },
    handle: (context, { params }) => requestRecomputation(context, params.runId),
  }),
  endpoint({
    method: 'put',
    path: '/runs/:runId/cancellation',
    summary: 'Cancel a run that waits or is being computed',
    tag,
    access: 'signed-in',
    params: runParams,
    answers: { 200: runSchema },
    handle: (context, { params }) => requestCancellation(context, params.runId),
  }),
  endpoint({
    method: 'patch',
    path: '/runs/:runId/note',
    summary: 'Label, note and pin of a run',
    tag,
    access: 'signed-in',
    params: runParams,
    body: updateRunNoteSchema,
    versioned: true,
    answers: { 200: runSchema },
    handle: (context, { params, body, version }) => changeRunNote(context, params.runId, version, body),
  }),
];
