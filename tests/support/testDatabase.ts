import { randomBytes } from 'node:crypto';
import { createConnection } from 'mysql2/promise';
import { inject } from 'vitest';
import type { DatabaseConnection } from '../../server/env.ts';

/** An empty database with a name of its own, so that files running side by side never meet. */
export interface TestDatabase extends DatabaseConnection {
  /** Removes the database with everything in it. */
  drop(): Promise<void>;
}

/** Makes an empty database in the MariaDB that support/database.global.ts started. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const server = inject('mariadb');
  const database = `spandrel_test_${randomBytes(6).toString('hex')}`;
  await run(server, `CREATE DATABASE ${database} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  return { ...server, database, drop: () => run(server, `DROP DATABASE IF EXISTS ${database}`) };
}

async function run(server: DatabaseConnection, statement: string): Promise<void> {
  const connection = await createConnection(server);
  try {
    await connection.query(statement);
  } finally {
    await connection.end();
  }
}
