import { QueryFailedError } from 'typeorm';
import { expect, test } from 'vitest';
import { createLog } from '../../../server/log.ts';

test('a failed query is logged without what people wrote', () => {
  const lines: string[] = [];
  const log = createLog('info', { write: (line) => lines.push(line) });
  const fromDriver = Object.assign(new Error('Duplicate entry'), {
    code: 'ER_DUP_ENTRY',
    sql: "INSERT INTO notes (body) VALUES ('between us')",
  });
  log.error({ err: new QueryFailedError('INSERT INTO notes (body) VALUES (?)', ['between us'], fromDriver) }, 'failed');
  expect(lines).toHaveLength(1);
  expect(lines[0]).toContain('ER_DUP_ENTRY');
  expect(lines[0]).not.toContain('between us');
});
