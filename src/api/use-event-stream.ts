import { useEffect, useEffectEvent, useState } from 'react';
import type { z } from 'zod';
import { openEventStream, type StreamState } from './event-stream';

export interface UseEventStreamOptions<S extends z.ZodType> {
  path: string;
  event: string;
  /** A schema of the contract, the same object at every render. */
  schema: S;
  onEvent: (value: z.output<S>) => void;
  /** Called whenever a connection stands, the first and each later one: fetch what may have been missed. */
  onOpen?: () => void;
  enabled?: boolean;
}

/** Hears a stream while the component is shown; gives the state of the connection. */
export function useEventStream<S extends z.ZodType>(options: UseEventStreamOptions<S>): StreamState {
  const { path, event, schema, enabled = true } = options;
  const [state, setState] = useState<StreamState>('connecting');
  const hear = useEffectEvent((value: z.output<S>) => options.onEvent(value));
  const opened = useEffectEvent(() => options.onOpen?.());
  useEffect(() => {
    if (!enabled) return undefined;
    return openEventStream({
      path,
      event,
      schema,
      onEvent: (value) => hear(value),
      onState: (next) => {
        setState(next);
        if (next === 'open') opened();
      },
    });
  }, [path, event, schema, enabled]);
  return state;
}
