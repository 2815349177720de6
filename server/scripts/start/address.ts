import { probePort } from '../../database/freePort.ts';
import { StartupError } from '../../database/startupError.ts';

/**
 * Checks that the server will be able to listen, before anything is started for it.
 * @throws {StartupError} saying what is in the way.
 */
export async function checkAddress(host: string, port: number): Promise<void> {
  try {
    await probePort(host, port);
  } catch (error) {
    throw listenFault(error as NodeJS.ErrnoException, host, port);
  }
}

/** The sentence for an address that cannot be listened on; any other error comes back as it is. */
export function listenFault(error: NodeJS.ErrnoException, host: string, port: number): Error {
  switch (error.code) {
    case 'EADDRINUSE':
      return new StartupError(
        `Port ${port} on ${host} is in use by another program; stop that one or choose another port, for example PORT=${port === 65_535 ? 4310 : port + 1} npm start.`,
      );
    case 'EACCES':
      return new StartupError(`This user may not listen on port ${port}; choose one above 1023, such as PORT=4310.`);
    case 'EADDRNOTAVAIL':
    case 'ENOTFOUND':
    case 'EAI_AGAIN':
      return new StartupError(`HOST=${host} is not an address of this machine; 127.0.0.1 always is.`);
    default:
      return error;
  }
}
