import { createServer } from 'node:net';
import { errorCode } from './plain-error';

/** The port when it can be listened on, else null; 0 asks the system for any free one. */
function tryPort(host: string, port: number): Promise<number | null> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', (error) => {
      if (errorCode(error) === 'EADDRINUSE' || errorCode(error) === 'EACCES') resolve(null);
      else reject(error);
    });
    server.listen({ host, port, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(typeof address === 'object' && address !== null ? address.port : null));
    });
  });
}

export const isPortFree = async (host: string, port: number) => (await tryPort(host, port)) !== null;

export async function anyFreePort(host = '127.0.0.1'): Promise<number> {
  const port = await tryPort(host, 0);
  if (port === null) throw new Error(`no free port on ${host}`);
  return port;
}

/** The first free port from `first` on; null when `tries` ports in a row are taken. */
export async function nextFreePort(host: string, first: number, tries = 100): Promise<number | null> {
  for (let port = first; port < Math.min(first + tries, 65536); port++) {
    if (await isPortFree(host, port)) return port;
  }
  return null;
}
