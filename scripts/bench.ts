import { fitRows } from './bench/fit-rows';
import { kernelRow } from './bench/kernel-row';
import { poolRows } from './bench/pool-rows';
import { samplerRow } from './bench/sampler-row';
import { printRow } from './bench/table';

/** Speed of the engine against yardsticks that are run in turn with it; only ratios are judged. */
printRow(await kernelRow());
for (const row of await fitRows()) printRow(row);
printRow(samplerRow());
for (const row of await poolRows()) printRow(row);
