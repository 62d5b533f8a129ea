/** A fault whose message is the whole story for the person at the terminal; no stack is shown. */
export class PlainError extends Error {
  constructor(message: string) {
    super(message);
    this.name = 'PlainError';
  }
}

export const describeError = (error: unknown): string => {
  if (error instanceof PlainError) return error.message;
  if (error instanceof Error)
    return error.name === 'ConfigError' ? error.message : (error.stack ?? error.message);
  return String(error);
};

export const errorCode = (error: unknown): string | undefined =>
  error instanceof Error && 'code' in error && typeof error.code === 'string' ? error.code : undefined;
