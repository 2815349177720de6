import { describe, expect, test } from 'vitest';
import { AppError, asAppError, codeOf, problemOf } from '../../../server/errors.ts';
import { ERROR_CODES, problemSchema } from '../../../shared/errors.ts';

describe('problem details', () => {
  test('of every code fit their schema and have a status of their kind', () => {
    for (const code of ERROR_CODES) {
      const problem = problemSchema.parse(problemOf(new AppError(code, 'A sentence.')));
      expect(problem).toMatchObject({ code, detail: 'A sentence.', type: `urn:spandrel:problem:${code}` });
      expect(problem.status).toBeGreaterThanOrEqual(400);
      expect(problem.status >= 500).toBe(['internal', 'storage_full'].includes(code));
    }
  });

  test('name fields only where there are some', () => {
    const fields = [{ path: 'frame', message: 'Too far.' }];
    expect(problemOf(new AppError('invalid_request', 'No.', { fields })).fields).toEqual(fields);
    expect(problemOf(new AppError('not_found', 'No.'))).not.toHaveProperty('fields');
  });
});

describe('what was thrown', () => {
  test('stays what it is when it is ours', () => {
    const error = new AppError('conflict', 'Someone was faster.');
    expect(asAppError(error)).toBe(error);
  });

  test.each(['ENOSPC', 'EDQUOT', 'ER_DISK_FULL', 'ER_RECORD_FILE_FULL'])('is a full disk for %s', (code) => {
    expect(asAppError(Object.assign(new Error('no space'), { code })).code).toBe('storage_full');
    expect(asAppError({ driverError: { code } }).code).toBe('storage_full');
  });

  test('is a conflict for a key that is there already', () => {
    expect(asAppError({ driverError: { code: 'ER_DUP_ENTRY' } }).code).toBe('conflict');
  });

  test.each([new Error('SELECT secret FROM users'), 'text', null, undefined, 7])('is internal for %s', (thrown) => {
    const error = asAppError(thrown);
    expect(error.code).toBe('internal');
    expect(error.message).not.toContain('secret');
    expect(error.cause).toBe(thrown);
  });

  test('has a code only where it is text', () => {
    expect(codeOf({ code: 28 })).toBe('');
    expect(codeOf({ code: 'EIO' })).toBe('EIO');
  });
});
