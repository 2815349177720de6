import { readdir } from 'node:fs/promises';
import path from 'node:path';
import type { DataSource } from 'typeorm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createDataSource, ENTITIES, MIGRATIONS } from '../../server/data-source.ts';
import { createTestDatabase, type TestDatabase } from '../support/testDatabase.ts';

let database: TestDatabase;
let dataSource: DataSource;

beforeAll(async () => {
  database = await createTestDatabase();
  const { drop: _drop, ...connection } = database;
  dataSource = await createDataSource(connection).initialize();
  await dataSource.runMigrations();
});
afterAll(async () => {
  await dataSource.destroy();
  await database.drop();
});

/** What `migration:generate` would write: the statements that would make the database fit the entities. */
async function drift(): Promise<string[]> {
  const { upQueries } = await dataSource.driver.createSchemaBuilder().log();
  return upQueries.map(({ query }) => query);
}

const filesIn = async (folder: string) =>
  (await readdir(path.resolve(import.meta.dirname, '../../server', folder))).map((file) => path.parse(file).name);

test('migrations make exactly the tables that the entities describe', async () => {
  expect(await drift()).toEqual([]);
});

test('a column that no migration made would be noticed', async () => {
  await dataSource.query('ALTER TABLE takes DROP COLUMN intended');
  expect(await drift()).toEqual([expect.stringMatching(/ALTER TABLE `takes` ADD `intended` text/)]);
  await dataSource.query('ALTER TABLE takes ADD intended text NOT NULL');
  expect(await drift()).toEqual([]);
});

test('every entity and every migration that is in its folder is in use', async () => {
  expect(ENTITIES.map(({ name }) => name).sort()).toEqual((await filesIn('entities')).sort());
  const migrations = (await filesIn('migrations')).map((file) => file.replace(/^(\d+)-(\w+)$/, '$2$1'));
  expect(MIGRATIONS.map(({ name }) => name)).toEqual(migrations.sort());
});

test('migrations go back as well', async () => {
  for (const _ of MIGRATIONS) await dataSource.undoLastMigration();
  const tables = await dataSource.query('SHOW TABLES');
  expect(tables.map((row: Record<string, string>) => Object.values(row)[0])).toEqual(['migrations']);
  await dataSource.runMigrations();
  expect(await drift()).toEqual([]);
});
