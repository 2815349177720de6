import { createServer } from 'node:net';

/**
 * Listens for a moment and gives the port back. Port 0 finds a free one; any other number tests that it is free.
 * @throws {NodeJS.ErrnoException} as `listen` reports it: EADDRINUSE, EACCES, EADDRNOTAVAIL, ENOTFOUND.
 */
export async function probePort(host: string, port = 0): Promise<number> {
  const server = createServer();
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen({ host, port, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(typeof address === 'object' && address ? address.port : port));
    });
  });
}
