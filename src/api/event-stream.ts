import type { z } from 'zod';
import { API_ROOT } from './http';

export type StreamState = 'connecting' | 'open' | 'lost';

export interface EventStreamOptions<S extends z.ZodType> {
  /** Below the API's root, as "/soundings/…/run-events". */
  path: string;
  /** Name of the events to hear. */
  event: string;
  schema: S;
  onEvent: (value: z.output<S>) => void;
  onState?: (state: StreamState) => void;
}

const FIRST_WAIT_MS = 500;
const LONGEST_WAIT_MS = 15_000;

/** Wait before the next attempt: doubled each time, capped. */
export const waitBeforeRetry = (failures: number): number =>
  Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** Math.min(failures, 10));

/**
 * Hears server-sent events until it is closed. The browser gives up for good when a connection is
 * refused, so every lost connection is made anew here.
 */
export function openEventStream<S extends z.ZodType>(options: EventStreamOptions<S>): () => void {
  let source: EventSource | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let failures = 0;
  const connect = () => {
    options.onState?.(failures === 0 ? 'connecting' : 'lost');
    source = new EventSource(`${API_ROOT}${options.path}`);
    source.addEventListener('open', () => {
      failures = 0;
      options.onState?.('open');
    });
    source.addEventListener(options.event, (message: MessageEvent<string>) => {
      const value = readEvent(message.data, options.schema);
      if (value !== undefined) options.onEvent(value);
    });
    source.addEventListener('error', () => {
      source?.close();
      options.onState?.('lost');
      timer = setTimeout(connect, waitBeforeRetry(failures));
      failures += 1;
    });
  };
  connect();
  return () => {
    clearTimeout(timer);
    source?.close();
  };
}

/** The event's value, or undefined where it is not what was agreed on. */
export function readEvent<S extends z.ZodType>(text: string, schema: S): z.output<S> | undefined {
  try {
    const parsed = schema.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : undefined;
  } catch {
    return undefined;
  }
}
