import type { ErrorCode, Problem } from '../shared/errors.ts';

/** Status and title of each code: one place, so that a code means the same on every route. */
const KINDS: Record<ErrorCode, { status: number; title: string }> = {
  invalid_request: { status: 422, title: 'The request does not fit' },
  sign_in_required: { status: 401, title: 'Sign in first' },
  wrong_sign_in: { status: 401, title: 'Address or password is wrong' },
  too_many_attempts: { status: 429, title: 'Too many attempts' },
  not_allowed: { status: 403, title: 'Not allowed' },
  own_take: { status: 403, title: 'Nobody decides on their own take' },
  not_found: { status: 404, title: 'Not found' },
  conflict: { status: 409, title: 'Things have changed' },
  draft_closed: { status: 409, title: 'The post is closed' },
  draft_empty: { status: 422, title: 'The post has no frames' },
  too_many_frames: { status: 413, title: 'Too many frames' },
  file_too_large: { status: 413, title: 'A file is too large' },
  file_refused: { status: 422, title: 'A file was refused' },
  foreign_origin: { status: 403, title: 'The request came from another site' },
  storage_full: { status: 507, title: 'The disk is full' },
  internal: { status: 500, title: 'Something went wrong here' },
};

export type ProblemField = NonNullable<Problem['fields']>[number];

interface AppErrorOptions {
  fields?: ProblemField[];
  /** Where the usual status of the code is not precise enough. */
  status?: number;
  cause?: unknown;
}

/** An error that a person may read: the sentence goes over the wire as it is. Everything else becomes `internal`. */
export class AppError extends Error {
  override readonly name = 'AppError';
  readonly code: ErrorCode;
  readonly status: number;
  readonly fields: ProblemField[] | undefined;

  constructor(code: ErrorCode, sentence: string, options: AppErrorOptions = {}) {
    super(sentence, { cause: options.cause });
    this.code = code;
    this.status = options.status ?? KINDS[code].status;
    this.fields = options.fields;
  }
}

/** RFC 9457 problem details of an error. */
export function problemOf(error: AppError): Problem {
  return {
    type: `urn:spandrel:problem:${error.code}`,
    title: KINDS[error.code].title,
    status: error.status,
    detail: error.message,
    code: error.code,
    ...(error.fields ? { fields: error.fields } : {}),
  };
}

/** @param what as it stands in the sentence: "take" gives "There is no such take." */
export function notFound(what: string): AppError {
  return new AppError('not_found', `There is no such ${what}.`);
}

const DISK_FULL = new Set(['ENOSPC', 'EDQUOT', 'ER_DISK_FULL', 'ER_RECORD_FILE_FULL']);

/** Every thrown value as an {@link AppError}. Database and system errors are told apart by code, never by text. */
export function asAppError(thrown: unknown): AppError {
  if (thrown instanceof AppError) return thrown;
  if (DISK_FULL.has(codeOf(thrown))) {
    return new AppError(
      'storage_full',
      'The disk of the server is full; nothing of this was stored. Try again later.',
      {
        cause: thrown,
      },
    );
  }
  if (codeOf(thrown) === 'ER_DUP_ENTRY') {
    return new AppError('conflict', 'Someone was faster; look again and repeat what you did.', { cause: thrown });
  }
  return new AppError('internal', 'The server could not do this. It was noted; try again in a moment.', {
    cause: thrown,
  });
}

/** The code of a system or database error, `''` when it has none. TypeORM wraps the driver's error. */
export function codeOf(thrown: unknown): string {
  if (typeof thrown !== 'object' || thrown === null) return '';
  const { code, driverError } = thrown as { code?: unknown; driverError?: unknown };
  if (driverError) return codeOf(driverError);
  return typeof code === 'string' ? code : '';
}
