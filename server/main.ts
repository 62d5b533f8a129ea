import { createServer } from 'node:http';
import { pino } from 'pino';
import { createApp } from './app';
import { createServices } from './create-services';
import { createDatabase } from './db/knex';
import { createPool } from './db/pool';
import { startHousekeeping } from './housekeeping';
import { readConfig } from './read-config';
import { stopOnSignal } from './stop-on-signal';

const config = readConfig();
const log = pino({ level: config.logLevel, base: { process: 'web' } });
const die = (error: unknown): void => {
  log.fatal({ err: error }, 'unexpected failure; the process ends');
  process.exit(1);
};
process.on('uncaughtException', die);
process.on('unhandledRejection', die);

const onLost = (error: Error): void => log.warn({ err: error }, 'an idle database connection was lost');
const db = createDatabase(config, onLost);
const pool = createPool(config, onLost);
const running = await createServices({ config, log, db, pool });
const server = createServer(createApp(running.services));
// browsers and proxies reuse connections; the server must not be the first to hang up
server.keepAliveTimeout = 65_000;
await listen();
const housekeeping = startHousekeeping(running.services);
stopOnSignal(log, async () => {
  housekeeping.stop();
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  // connections fall idle one by one, as the answers on them end
  const sweep = setInterval(() => server.closeIdleConnections(), 50);
  setTimeout(() => server.closeAllConnections(), 5000).unref();
  await running.close();
  await closed;
  clearInterval(sweep);
  await db.destroy();
  if (!pool.ended) await pool.end();
});

async function listen(): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    server.once('error', (error) => reject(plainListenError(error)));
    server.listen(config.port, config.host, resolve);
  });
  log.info({ host: config.host, port: config.port, publicUrl: config.publicUrl }, 'listening');
}

function plainListenError(error: NodeJS.ErrnoException): Error {
  return error.code === 'EADDRINUSE'
    ? new Error(`Port ${config.port} on ${config.host} is taken by another program; set PORT to a free one.`)
    : error;
}
