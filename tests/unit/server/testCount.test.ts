import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { conclude } from '../../../server/scripts/test/checks.ts';
import { count } from '../../../server/scripts/test/vitest.ts';

beforeAll(() => void vi.spyOn(console, 'log').mockImplementation(() => {}));
afterAll(() => void vi.restoreAllMocks());

const passing = (project: string) => ({
  name: `/repo/tests/${project}/a.test.ts`,
  status: 'passed',
  assertionResults: [{ status: 'passed' }],
});
const report = (...testResults: ReturnType<typeof passing>[]) => {
  const statuses = testResults.flatMap((file) => file.assertionResults.map(({ status }) => status));
  const of = (wanted: string) => statuses.filter((status) => status === wanted).length;
  return { numPassedTests: of('passed'), numFailedTests: of('failed'), testResults };
};

describe('the count at the end of npm test', () => {
  it('is what vitest counted when every project ran', () => {
    expect(count(report(passing('unit'), passing('api')), ['unit', 'api'], 0)).toEqual({ passed: 2, failed: 0 });
  });

  it('counts a failed test once', () => {
    const failing = { ...passing('unit'), status: 'failed', assertionResults: [{ status: 'failed' }] };
    expect(count(report(failing), ['unit'], 1)).toEqual({ passed: 0, failed: 1 });
  });

  it('counts a file that could not be loaded, and the project that so ran nothing', () => {
    const broken = { ...passing('api'), status: 'failed', assertionResults: [] };
    expect(count(report(passing('unit'), broken), ['unit', 'api'], 1)).toEqual({ passed: 1, failed: 2 });
  });

  it('counts a file that failed after its tests had passed', () => {
    expect(count(report({ ...passing('unit'), status: 'failed' }), ['unit'], 1)).toEqual({ passed: 1, failed: 1 });
  });

  it('counts a project in which nothing ran', () => {
    expect(count(report(passing('unit')), ['unit', 'e2e'], 0)).toEqual({ passed: 1, failed: 1 });
    const skipping = { ...passing('e2e'), assertionResults: [{ status: 'skipped' }] };
    expect(count(report(passing('unit'), skipping), ['unit', 'e2e'], 0)).toEqual({ passed: 1, failed: 1 });
  });

  it('counts a vitest that failed for a reason of its own', () => {
    expect(count(report(passing('unit')), ['unit'], 1)).toEqual({ passed: 1, failed: 1 });
    expect(count(undefined, ['unit'], null)).toEqual({ passed: 0, failed: 1 });
  });

  it('ends with a failure when nothing was tried', () => {
    expect(conclude({ passed: 0, failed: 0 })).toBe(1);
    expect(conclude({ passed: 3, failed: 0 })).toBe(0);
    expect(conclude({ passed: 3, failed: 1 })).toBe(1);
  });
});
