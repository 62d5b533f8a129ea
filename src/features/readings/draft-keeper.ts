import { z } from 'zod';
import { writeDraftSchema } from '../../../server/contract/readings';
import { messageOf } from '../../api/api-error';

export type Draft = z.output<typeof writeDraftSchema>;

const localDraftSchema = z.object({ draft: writeDraftSchema, editedAt: z.string() });
export type LocalDraft = z.output<typeof localDraftSchema>;

export type DraftState =
  | { kind: 'none' }
  | { kind: 'waiting' }
  | { kind: 'sending' }
  | { kind: 'kept'; at: Date }
  | { kind: 'unsent'; reason: string };

export interface DraftKeeperOptions {
  key: string;
  storage: Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;
  send: (draft: Draft) => Promise<void>;
}

const QUIET_MS = 1200;
const RETRY_MS = 10_000;

/**
 * Keeps every keystroke of a sheet: at once on this device, and after a short rest on the server.
 * The copy on the device goes only when the server has the very same content.
 */
export class DraftKeeper {
  #state: DraftState = { kind: 'none' };
  #listeners = new Set<() => void>();
  #pending: Draft | null = null;
  #timer: ReturnType<typeof setTimeout> | undefined;
  #inFlight: Promise<void> = Promise.resolve();
  #storedText: string | null = null;
  #isOpen = true;

  constructor(private readonly options: DraftKeeperOptions) {}

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  readonly getState = (): DraftState => this.#state;

  /** What an earlier visit wrote and could not send. */
  readLocal(): LocalDraft | null {
    try {
      const parsed = localDraftSchema.safeParse(
        JSON.parse(this.options.storage.getItem(this.options.key) ?? 'null'),
      );
      return parsed.success ? parsed.data : null;
    } catch {
      return null;
    }
  }

  change(draft: Draft): void {
    this.#pending = draft;
    this.#storeLocal(draft);
    this.#set({ kind: 'waiting' });
    this.#schedule(QUIET_MS);
  }

  /** Sends what waits, now; resolves when no sending is under way. */
  async flush(): Promise<void> {
    clearTimeout(this.#timer);
    await this.#inFlight;
    if (this.#pending === null) return;
    this.#inFlight = this.#send(this.#pending);
    await this.#inFlight;
  }

  /** Stops sending and waits until the last one has ended, so that nothing arrives after a save. Gives what waits. */
  async settle(): Promise<Draft | null> {
    clearTimeout(this.#timer);
    await this.#inFlight;
    clearTimeout(this.#timer);
    return this.#pending;
  }

  /** What `settle` gave is saved as a revision. What was written since goes on as a draft on top of it. */
  saved(settled: Draft | null, revisionId: string): void {
    if (this.#pending === null || this.#pending === settled) this.discard();
    else this.change({ ...this.#pending, baseRevisionId: revisionId });
  }

  /** A save that failed leaves its content to be kept as before. */
  resume(): void {
    if (this.#pending !== null) this.#schedule(QUIET_MS);
  }

  /** The content is saved or given up: nothing is left to send. */
  discard(): void {
    clearTimeout(this.#timer);
    this.#pending = null;
    this.#removeLocal();
    this.#set({ kind: 'none' });
  }

  /** The sheet is shown; the function given back sends what waits when it is left. */
  open(): () => void {
    this.#isOpen = true;
    return () => {
      this.#isOpen = false;
      void this.flush();
    };
  }

  async #send(draft: Draft): Promise<void> {
    this.#set({ kind: 'sending' });
    try {
      await this.options.send(draft);
      if (this.#pending !== draft) return;
      this.#pending = null;
      this.#removeLocal();
      this.#set({ kind: 'kept', at: new Date() });
    } catch (error) {
      if (this.#pending !== draft) return;
      this.#set({ kind: 'unsent', reason: messageOf(error) });
      this.#schedule(RETRY_MS);
    }
  }

  #schedule(delayMs: number): void {
    clearTimeout(this.#timer);
    if (this.#isOpen) this.#timer = setTimeout(() => void this.flush(), delayMs);
  }

  #storeLocal(draft: Draft): void {
    const local: LocalDraft = { draft, editedAt: new Date().toISOString() };
    const text = JSON.stringify(local);
    this.#storedText = text;
    try {
      this.options.storage.setItem(this.options.key, text);
    } catch {
      // Storage may be full or closed to the page; the server still gets the draft.
    }
  }

  /** Another window may have written since; its copy is its own to send. */
  #removeLocal(): void {
    const { key, storage } = this.options;
    try {
      if (this.#storedText === null || storage.getItem(key) === this.#storedText) storage.removeItem(key);
    } catch {
      // Closed storage holds nothing to remove.
    }
  }

  #set(state: DraftState): void {
    this.#state = state;
    this.#listeners.forEach((listener) => listener());
  }
}
