import { expect, test } from 'vitest';
import { createDataSource, ENTITIES } from '../../../server/data-source.ts';

/** esbuild emits no decorator metadata: a column without an explicit type fails here and not at the next start (privatenumber/tsx 740). */
test('every entity has its metadata without a database', async () => {
  const nowhere = { host: '127.0.0.1', port: 1, user: 'nobody', password: '', database: 'none' };
  const dataSource = createDataSource(nowhere) as unknown as { buildMetadatas(): Promise<void> };
  await dataSource.buildMetadatas();
  const { entityMetadatas } = dataSource as unknown as {
    entityMetadatas: { name: string; columns: { propertyName: string; type: unknown }[] }[];
  };
  expect(entityMetadatas.map(({ name }) => name).sort()).toEqual(ENTITIES.map(({ name }) => name).sort());
  for (const { name, columns } of entityMetadatas) {
    expect(columns.length, name).toBeGreaterThan(1);
    for (const column of columns) expect(column.type, `${name}.${column.propertyName}`).toBeTypeOf('string');
  }
});
