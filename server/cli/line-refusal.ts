/** A line of input that cannot be answered; `path` points into it. */
export class LineRefusal extends Error {
  readonly code: string;
  readonly path: readonly (string | number)[];

  constructor(code: string, message: string, path: readonly (string | number)[]) {
    super(message);
    this.name = 'LineRefusal';
    this.code = code;
    this.path = path;
  }
}
