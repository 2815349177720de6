import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { Router } from 'express';
import { AppError } from '../errors.ts';

const YEAR = 'public, max-age=31536000, immutable';

/** The built client: files with a hash in their name for good, fonts for a week, and every other address the page. */
export function client(distDir: string): Router {
  const router = Router();
  const page = path.join(distDir, 'index.html');
  router.use('/assets', express.static(path.join(distDir, 'assets'), { index: false, setHeaders: setForGood }));
  router.use(
    '/fonts',
    express.static(path.join(distDir, 'fonts'), {
      index: false,
      setHeaders: (res) => res.set('Cache-Control', 'public, max-age=604800'),
    }),
  );
  router.use(['/assets', '/fonts'], () => {
    throw new AppError('not_found', 'There is nothing at this address.');
  });
  router.use(express.static(distDir, { index: false, redirect: false }));
  router.get('/{*splat}', (_req, res) => {
    if (!existsSync(page)) throw new AppError('not_found', 'The pages are not built yet; run npm run build.');
    res.set('Cache-Control', 'no-store').sendFile(page, { dotfiles: 'allow', cacheControl: false });
  });
  router.use(() => {
    throw new AppError('not_found', 'There is nothing at this address.');
  });
  return router;
}

function setForGood(res: express.Response): void {
  res.set('Cache-Control', YEAR);
}
