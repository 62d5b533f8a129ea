import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import { sendJson } from './http';
import { meKey } from './session-queries';

/** Forgets everything that was fetched, as before another person signs in. */
export function useForgetSession(): () => void {
  const client = useQueryClient();
  return useCallback(() => {
    client.setQueryData(meKey, null);
    client.removeQueries({ predicate: (query) => query.queryKey[0] !== meKey[0] });
  }, [client]);
}

export function useSignOut() {
  const forget = useForgetSession();
  return useMutation({
    mutationFn: () => sendJson('DELETE', '/session', undefined, null),
    onSuccess: forget,
  });
}
