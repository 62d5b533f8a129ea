import { endRunningCommands } from './command';
import { describeError } from './plain-error';

interface Part {
  name: string;
  stop: () => Promise<void>;
  force: () => void;
}

/** npm passes a Ctrl-C on that the terminal has already delivered; only a later one is a second one. */
const sameSignalMs = 1_000;

/** What this command started, stopped in the reverse order, whatever the reason. */
export class Shutdown {
  readonly #parts: Part[] = [];
  readonly #interruptedCode: number;
  #startedAt: number | null = null;

  constructor(interruptedCode = 0) {
    this.#interruptedCode = interruptedCode;
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, () => this.#onSignal());
    this.#followNpm();
  }

  get isUnderWay(): boolean {
    return this.#startedAt !== null;
  }

  add(name: string, stop: () => Promise<void>, force: () => void = () => undefined): void {
    this.#parts.push({ name, stop, force });
  }

  /** Never returns. */
  async end(code: number): Promise<never> {
    this.#startedAt ??= Date.now();
    let worst = code;
    for (let part = this.#parts.pop(); part !== undefined; part = this.#parts.pop()) {
      try {
        if (part.name !== '') console.log(`· stopping ${part.name}`);
        await part.stop();
      } catch (error) {
        worst ||= 1;
        console.error(`  ${part.name} did not stop in order: ${describeError(error)}`);
      }
    }
    process.exit(worst);
  }

  #onSignal(): void {
    if (this.#startedAt === null) {
      this.#startedAt = Date.now();
      console.log('');
      endRunningCommands();
      void this.end(this.#interruptedCode);
      return;
    }
    if (Date.now() - this.#startedAt < sameSignalMs) return;
    console.log('· stopping at once');
    endRunningCommands('SIGKILL');
    for (const part of this.#parts) part.force();
    process.exit(130);
  }

  /** npm killed without a chance to pass a signal on must not leave the command behind. */
  #followNpm(): void {
    if (process.env.npm_lifecycle_event === undefined) return;
    const parent = process.ppid;
    setInterval(() => {
      if (process.ppid !== parent && this.#startedAt === null) this.#onSignal();
    }, 500).unref();
  }
}

/** Runs a command's work; a fault is told in plain words and everything started so far is stopped. */
export async function runWith(shutdown: Shutdown, work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    // A step that was cut short by the stop is no fault of its own.
    if (shutdown.isUnderWay) return;
    console.error(`\n✗ ${describeError(error)}`);
    await shutdown.end(1);
  }
}
