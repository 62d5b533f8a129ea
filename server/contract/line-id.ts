import { z } from 'zod';

/** Name of a line of the command line, or of a part of it. */
export const lineId = z
  .union([z.string().max(200), z.number()])
  .describe('name of the line, given back with its answer');
