import { createServer, type Server } from 'node:net';
import { afterEach, expect, it } from 'vitest';
import { anyFreePort, isPortFree, nextFreePort } from '../../../scripts/lib/port';

const servers: Server[] = [];

async function occupy(port: number): Promise<void> {
  const server = createServer();
  servers.push(server);
  await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', resolve));
}

afterEach(async () => {
  await Promise.all(servers.splice(0).map((server) => new Promise((resolve) => server.close(resolve))));
});

it('knows a taken port from a free one', async () => {
  const port = await anyFreePort();
  expect(await isPortFree('127.0.0.1', port)).toBe(true);
  await occupy(port);
  expect(await isPortFree('127.0.0.1', port)).toBe(false);
});

it('goes on to a later port, but no further than asked', async () => {
  const port = await anyFreePort();
  await occupy(port);
  const next = await nextFreePort('127.0.0.1', port);
  expect(next).toBeGreaterThan(port);
  expect(await nextFreePort('127.0.0.1', port, 1)).toBeNull();
});
