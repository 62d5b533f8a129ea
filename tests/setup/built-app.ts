import { fileURLToPath } from 'node:url';
import { buildIfStale } from '../../scripts/lib/build';

/** The browser tests run what is delivered: the built client and the server bundles. */
export default async function setup(): Promise<void> {
  await buildIfStale(fileURLToPath(new URL('../..', import.meta.url)));
}
