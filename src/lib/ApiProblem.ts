import type { ErrorCode, Problem } from '../../shared/errors.ts';

/** What went wrong with a call, in the server's own words; `unreachable` when no answer came at all. */
export class ApiProblem extends Error {
  readonly code: ErrorCode | 'unreachable';
  /** HTTP status; 0 when no answer came. */
  readonly status: number;
  /** A sentence for the person at the screen. */
  readonly detail: string;
  readonly fields: NonNullable<Problem['fields']>;

  constructor(problem: Pick<Problem, 'detail' | 'status' | 'fields'> & { code: ErrorCode | 'unreachable' }) {
    super(problem.detail);
    this.name = 'ApiProblem';
    this.code = problem.code;
    this.status = problem.status;
    this.detail = problem.detail;
    this.fields = problem.fields ?? [];
  }
}

/** The sentence to show for anything that was thrown; never a stack or an internal name. */
export function sentenceOf(error: unknown): string {
  return error instanceof ApiProblem ? error.detail : 'Something went wrong on this page. Nothing you posted was lost.';
}
