import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { TestProject } from 'vitest/node';
import { buildIfStale } from '../../scripts/lib/build';
import { prepareDatabase } from '../../scripts/lib/prepare';
import { dropDatabase, runSql, withDatabase } from './run-sql';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Holds the demo survey; loaded once for all browser tests, cloned by the files that want it. */
    demoTemplateName: string;
  }
}

/** The browser tests run what is delivered: the built client and the server bundles, and the demo as they load it. */
export default async function setup(project: TestProject) {
  await buildIfStale(fileURLToPath(new URL('../..', import.meta.url)));
  const { clusterUrl, templateName } = project.getProvidedContext();
  const demoTemplateName = `demo_${randomBytes(6).toString('hex')}`;
  await runSql(clusterUrl, `CREATE DATABASE ${demoTemplateName} TEMPLATE ${templateName}`);
  await prepareDatabase([join('dist', 'server', 'prepare.js')], {
    ...process.env,
    NODE_ENV: 'production',
    DATABASE_URL: withDatabase(clusterUrl, demoTemplateName),
    LOAD_DEMO: 'true',
  });
  project.provide('demoTemplateName', demoTemplateName);
  return () => dropDatabase(clusterUrl, demoTemplateName);
}
