import type { RequestHandler } from 'express';
import type { Logger } from 'pino';

/** One line a request at level debug: what was asked, what was answered, how long it took. Nothing of its content. */
export function requestLog(log: Logger): RequestHandler {
  return (req, res, next) => {
    const began = performance.now();
    const { method, path } = req;
    res.once('close', () => {
      const milliseconds = Math.round(performance.now() - began);
      log.debug({ method, path, status: res.statusCode, milliseconds }, 'request');
    });
    next();
  };
}
