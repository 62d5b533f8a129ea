import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import {
  draftSchema,
  importPreviewSchema,
  revisionSchema,
  type FieldSheet,
  type ImportMapping,
} from '../../../server/contract/readings';
import { hasCode } from '../../api/api-error';
import { sendForm, sendJson, sendJsonWithStatus } from '../../api/http';
import { meKey } from '../../api/session-queries';
import { soundingKeys } from '../../api/sounding-queries';
import { surveyKeys } from '../../api/survey-queries';
import type { Draft } from './draft-keeper';

async function afterNewReadings(client: QueryClient, soundingId: string): Promise<void> {
  await Promise.all([
    client.invalidateQueries({ queryKey: soundingKeys.detail(soundingId) }),
    client.invalidateQueries({ queryKey: soundingKeys.lists() }),
    client.invalidateQueries({ queryKey: surveyKeys.all }),
  ]);
}

/** Keeps the draft on the server, and in what was fetched, so that coming back to the page shows it. */
export function useSendDraft(soundingId: string) {
  const client = useQueryClient();
  return useCallback(
    async (draft: Draft): Promise<void> => {
      const path = `/soundings/${soundingId}/reading-draft`;
      const kept = await sendJson('PUT', path, draft, draftSchema).catch((error: unknown) => {
        if (hasCode(error, 'unauthenticated')) client.setQueryData(meKey, null);
        throw error;
      });
      client.setQueryData<FieldSheet>(soundingKeys.fieldSheet(soundingId), (sheet) =>
        sheet ? { ...sheet, draft: kept } : sheet,
      );
    },
    [client, soundingId],
  );
}

export function useDiscardDraft(soundingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => sendJson('DELETE', `/soundings/${soundingId}/reading-draft`, undefined, null),
    onSuccess: () => client.invalidateQueries({ queryKey: soundingKeys.fieldSheet(soundingId) }),
  });
}

/** Makes a revision; `isNew` is false when the same content was saved before and that revision serves again. */
export function useSaveRevision(soundingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (body: Draft) => {
      const path = `/soundings/${soundingId}/revisions`;
      const { status, data } = await sendJsonWithStatus('POST', path, body, revisionSchema);
      return { isNew: status === 201, revision: data };
    },
    onSuccess: () => afterNewReadings(client, soundingId),
  });
}

export interface ImportRequest {
  file: File;
  mapping: ImportMapping | null;
}

function importForm({ file, mapping }: ImportRequest): FormData {
  const form = new FormData();
  form.set('file', file);
  if (mapping) form.set('mapping', JSON.stringify(mapping));
  return form;
}

/** What a file would give; nothing is stored. */
export const usePreviewImport = (soundingId: string) =>
  useMutation({
    mutationFn: async (request: ImportRequest) => {
      const path = `/soundings/${soundingId}/import-previews`;
      return (await sendForm(path, importForm(request), importPreviewSchema)).data;
    },
  });

interface AcceptedImport extends ImportRequest {
  accept: 'all' | 'good-rows';
  /** the revision the person saw before the import */
  baseRevisionId: string | null;
}

export function useImport(soundingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async ({ accept, baseRevisionId, ...request }: AcceptedImport) => {
      const form = importForm(request);
      form.set('accept', accept);
      form.set('baseRevisionId', baseRevisionId ?? '');
      const path = `/soundings/${soundingId}/imports`;
      const { status, data } = await sendForm(path, form, revisionSchema);
      return { isNew: status === 201, revision: data };
    },
    onSuccess: () => afterNewReadings(client, soundingId),
    // shows whose readings came first, so that the person can decide on them
    onError: (error) =>
      hasCode(error, 'conflict')
        ? client.invalidateQueries({ queryKey: soundingKeys.fieldSheet(soundingId) })
        : undefined,
  });
}
