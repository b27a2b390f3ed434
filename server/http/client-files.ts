import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router, type RequestHandler } from 'express';
import { AppError } from './app-error.ts';

/**
 * Serves the built browser app: files with a hash in their name for good, the page itself
 * anew each time, and the page for every address that is not a file.
 */
export function clientFiles(clientDir: string): Router {
  const router = Router();
  router.use('/assets', express.static(join(clientDir, 'assets'), { index: false, immutable: true, maxAge: '365d', redirect: false }), nothingHere);
  router.use(express.static(clientDir, { index: false, maxAge: 0, redirect: false, dotfiles: 'ignore' }));
  router.use((req, res, next) => {
    const page = join(clientDir, 'index.html');
    if ((req.method !== 'GET' && req.method !== 'HEAD') || !existsSync(page)) throw new AppError('not-found');
    res.set('Cache-Control', 'no-cache').sendFile(page, (error) => {
      if (error) next(error);
    });
  });
  return router;
}

const nothingHere: RequestHandler = () => {
  throw new AppError('not-found');
};
