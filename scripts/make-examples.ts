import { execFileSync } from 'node:child_process';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { crewSheet } from '../server/demo/crew-sheet';
import { SOUNDINGS } from '../server/demo/scenario';

/** Makes what follows in examples/ from the rest: the crew's sheets of the demo, and the answers of the command line. */
const folder = fileURLToPath(new URL('../examples/', import.meta.url));
const SHEETS = ['S-04', 'S-05', 'S-07'];

mkdirSync(`${folder}sheets`, { recursive: true });
for (const sounding of SOUNDINGS.filter(({ name }) => SHEETS.includes(name)))
  writeFileSync(`${folder}sheets/${sounding.name}.csv`, crewSheet(sounding));

for (const command of ['forward', 'fit'])
  writeFileSync(
    `${folder}${command}.expected.jsonl`,
    execFileSync(process.execPath, ['--import', 'tsx', 'server/cli.ts', command], {
      input: readFileSync(`${folder}${command}.jsonl`),
      cwd: fileURLToPath(new URL('..', import.meta.url)),
    }),
  );
