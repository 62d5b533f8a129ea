export type InversionErrorCode =
  | 'spread-length'
  | 'spread-halfmn'
  | 'spread-cancels'
  | 'earth-shape'
  | 'earth-value'
  | 'reading-value'
  | 'no-readings'
  | 'layer-count'
  | 'fixed-parameter'
  | 'prior'
  | 'branch-shift'
  | 'bounds'
  | 'line-place'
  | 'lateral'
  | 'borehole'
  | 'hydro-value'
  | 'calibration'
  | 'target-misfit'
  | 'sample-draws'
  | 'target-bed'
  | 'stopped';

/** A refused input. `path` points into the argument that was refused, outermost key first. */
export class InversionError extends Error {
  readonly code: InversionErrorCode;
  readonly path: readonly (string | number)[];

  constructor(code: InversionErrorCode, message: string, path: readonly (string | number)[] = []) {
    super(message);
    this.name = 'InversionError';
    this.code = code;
    this.path = path;
  }
}
