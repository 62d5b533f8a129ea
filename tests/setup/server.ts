import type { Express } from 'express';
import type { Knex } from 'knex';
import { pino } from 'pino';
import request, { type Test } from 'supertest';
import { afterAll } from 'vitest';
import { createApp } from '../../server/app';
import type { Role } from '../../server/contract/roles';
import { loadConfig } from '../../server/config';
import { createServices } from '../../server/create-services';
import type { Method } from '../../server/http/endpoint';
import type { Services } from '../../server/http/context';
import { createFactories, type Factories, type TestUser } from './factories';
import { createTestDatabase, type TestDatabase } from './test-database';

/** Sends requests below /api/v1 as one person, or as nobody. */
export interface Client {
  readonly user: TestUser | null;
  send(method: Method, path: string): Test;
  get(path: string): Test;
  post(path: string, body?: object): Test;
  put(path: string, body?: object, version?: number): Test;
  patch(path: string, body?: object, version?: number): Test;
  delete(path: string): Test;
}

export interface TestServer extends Factories {
  readonly app: Express;
  readonly db: Knex;
  readonly services: Services;
  readonly nobody: Client;
  /** a client with a session of this person */
  signIn(user: TestUser): Promise<Client>;
  /** a client of a new person who has this role in the survey */
  signInAs(role: Role, surveyId: string): Promise<Client>;
  /** a client of a new person who is no member of any survey */
  signInOutsider(): Promise<Client>;
  signInAdmin(): Promise<Client>;
}

/** The real server on a database of its own; await it at the top of a test file. `env` changes settings. */
export async function createTestServer(env: NodeJS.ProcessEnv = {}): Promise<TestServer> {
  return serverOn(await createTestDatabase(), env);
}

/** The same on a database that the caller opened. */
export async function serverOn(
  database: Pick<TestDatabase, 'url' | 'knex' | 'pool'>,
  env: NodeJS.ProcessEnv = {},
): Promise<TestServer> {
  const running = await createServices({
    config: loadConfig({ DATABASE_URL: database.url, LOG_REQUESTS: 'false', ...env }),
    log: pino({ level: 'silent' }),
    db: database.knex,
    pool: database.pool,
  });
  // hooks run last-in first-out: services end before the database is dropped
  afterAll(() => running.close());
  const { services } = running;
  const app = createApp(services);
  const factories = createFactories(database.knex);
  const signIn = async (user: TestUser): Promise<Client> => {
    const cookie = await services.sessions.create(user.id, 'vitest');
    return clientOf(app, user, cookie.split(';')[0]);
  };
  return {
    ...factories,
    app,
    db: database.knex,
    services,
    nobody: clientOf(app, null),
    signIn,
    async signInAs(role, surveyId) {
      const user = await factories.createUser();
      await factories.addMember(surveyId, user.id, role);
      return signIn(user);
    },
    signInOutsider: async () => signIn(await factories.createUser()),
    signInAdmin: async () => signIn(await factories.createUser({ isAdmin: true })),
  };
}

function clientOf(app: Express, user: TestUser | null, cookie?: string): Client {
  const send = (method: Method, path: string): Test => {
    const test = request(app)[method](`/api/v1${path}`);
    return cookie ? test.set('Cookie', cookie) : test;
  };
  const write = (test: Test, body?: object, version?: number): Test => {
    if (version !== undefined) test.set('If-Match', `"${version}"`);
    return body ? test.send(body) : test;
  };
  return {
    user,
    send,
    get: (path) => send('get', path),
    post: (path, body) => write(send('post', path), body),
    put: (path, body, version) => write(send('put', path), body, version),
    patch: (path, body, version) => write(send('patch', path), body, version),
    delete: (path) => send('delete', path),
  };
}
