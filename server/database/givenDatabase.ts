import { createConnection } from 'mysql2/promise';
import { type DatabaseConnection, databaseOf } from '../env.ts';
import { StartupError } from './startupError.ts';

/**
 * The database that DATABASE_URL names, once it has answered.
 * @throws {StartupError} when it does not let us in; the password is never repeated.
 */
export async function openGivenDatabase(url: string): Promise<DatabaseConnection> {
  const connection = databaseOf(url);
  if (!connection) throw new TypeError('The settings were not read by readEnv.');
  try {
    await (await createConnection(connection)).end();
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    const where = `${connection.database} at ${connection.host}:${connection.port}`;
    throw new StartupError(`The database ${where}, which DATABASE_URL names, does not let us in: ${message || code}`);
  }
  return connection;
}
