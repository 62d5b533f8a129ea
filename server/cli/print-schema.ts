import type { Writable } from 'node:stream';
import { z } from 'zod';
import { COMMAND_LINE_SCHEMAS } from '../contract/command-line';

const NAMES = Object.keys(COMMAND_LINE_SCHEMAS);

function isName(name: string): name is keyof typeof COMMAND_LINE_SCHEMAS {
  return NAMES.includes(name);
}

/** Writes the JSON Schema of `name`, as it stands before defaults are filled in; without a name, the names. */
export function printSchema(name: string | undefined, output: Writable, errors: Writable): number {
  if (name === undefined) {
    output.write(`${NAMES.join('\n')}\n`);
    return 0;
  }
  if (!isName(name)) {
    errors.write(`"${name}" is not a schema; there are ${NAMES.join(', ')}.\n`);
    return 2;
  }
  const schema = z.toJSONSchema(COMMAND_LINE_SCHEMAS[name], { io: 'input' });
  output.write(`${JSON.stringify(schema, null, 2)}\n`);
  return 0;
}
