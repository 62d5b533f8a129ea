import { loadConfig, readEnvFile, type Config } from '../../server/config';
import { nextFreePort } from './port';
import { PlainError } from './plain-error';

export interface Settings {
  config: Config;
  /** null: the checkout's private cluster is used. */
  databaseUrl: string | null;
  hasOwnPort: boolean;
}

/** Reads `.env` and the environment before anything is started, so that every fault is told at once. */
export function readSettings(): Settings {
  readEnvFile();
  const databaseUrl = process.env.DATABASE_URL || null;
  const config = loadConfig({
    ...process.env,
    DATABASE_URL: databaseUrl ?? 'postgres://private@127.0.0.1/layerwell',
  });
  return { config, databaseUrl, hasOwnPort: Boolean(process.env.PORT) };
}

/** The asked-for port must be free; without one the next free port from the usual one on is taken. */
export async function choosePort(
  { config, hasOwnPort }: Settings,
  say: (line: string) => void,
): Promise<number> {
  const port = await nextFreePort(config.host, config.port, hasOwnPort ? 1 : 100);
  if (port === null) {
    const taken = hasOwnPort
      ? `Port ${config.port}`
      : `Every port from ${config.port} to ${config.port + 99}`;
    throw new PlainError(`${taken} on ${config.host} is in use or not allowed. Set PORT to a free one.`);
  }
  if (port !== config.port) say(`port ${config.port} is in use by another program; taking ${port}`);
  return port;
}
