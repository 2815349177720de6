import type { ErrorRequestHandler } from 'express';
import { MulterError } from 'multer';
import type { Logger } from 'pino';
import { MAX_PICTURE_BYTES, MAX_PICTURES_PER_BATCH } from '../../shared/api/drafts.ts';
import { AppError, asAppError, problemOf } from '../errors.ts';

/** The one place where errors become answers: RFC 9457, a sentence and no more. What is ours to mend is logged. */
export function errorSink(log: Logger): ErrorRequestHandler {
  return (thrown, req, res, next) => {
    const error = thrown instanceof AppError ? thrown : (fromMiddleware(thrown) ?? asAppError(thrown));
    if (error.status >= 500) {
      log.error({ err: error.cause ?? error, method: req.method, path: req.path }, error.message);
    }
    if (res.headersSent) return next(thrown);
    res
      .status(error.status)
      .set('Cache-Control', 'no-store')
      .type('application/problem+json')
      .send(JSON.stringify(problemOf(error)));
  };
}

function fromMiddleware(thrown: unknown): AppError | undefined {
  if (thrown instanceof MulterError) return fromMulter(thrown);
  // Errors of body-parser, send and the router carry the status they mean.
  const { status, type } = Object(thrown) as { status?: unknown; type?: unknown };
  if (type === 'entity.parse.failed') return new AppError('invalid_request', 'This is not JSON.', { status: 400 });
  if (type === 'entity.too.large') return new AppError('invalid_request', 'This is too much text.', { status: 413 });
  if (thrown instanceof URIError) return new AppError('not_found', 'There is nothing at this address.');
  if (typeof status === 'number' && status >= 400 && status < 500) {
    return new AppError(status === 404 ? 'not_found' : 'invalid_request', 'This request cannot be understood.', {
      status,
    });
  }
  return undefined;
}

function fromMulter(error: MulterError): AppError {
  if (error.code === 'LIMIT_FILE_SIZE') {
    return new AppError('file_too_large', `A picture may have ${MAX_PICTURE_BYTES / 1024 / 1024} MB.`);
  }
  if (error.code === 'LIMIT_FILE_COUNT' || error.code === 'LIMIT_PART_COUNT') {
    return new AppError('invalid_request', `Send up to ${MAX_PICTURES_PER_BATCH} pictures at a time.`);
  }
  return new AppError('invalid_request', 'The pictures did not arrive as they should; send them again.');
}
