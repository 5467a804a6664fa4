import type { NestExpressApplication } from '@nestjs/platform-express';
import type { NextFunction, Request, Response } from 'express';
import { join, sep } from 'node:path';

const YEAR_S = 31_536_000;

/**
 * The built web program. Files with their content's hash in the name are kept for ever; the page itself, the service
 * worker and the manifest are asked for each time, so that a new version is seen. Any other address without a dot is
 * one of the program's pages.
 */
export function serveWeb(app: NestExpressApplication, folder: string): void {
  const hashed = join(folder, 'assets') + sep;
  app.useStaticAssets(folder, {
    index: false,
    setHeaders: (response: Response, path: string) => {
      response.setHeader(
        'cache-control',
        path.startsWith(hashed) ? `public, max-age=${YEAR_S}, immutable` : 'no-cache',
      );
    },
  });
  app.use((request: Request, response: Response, next: NextFunction) => {
    if (isApi(request)) return next();
    // Answered here, for the framework's own page of this kind would put other headers in place of ours.
    if (!isPage(request)) return void response.status(404).type('text/plain').send('Not found.\n');
    response.sendFile('index.html', { root: folder, headers: { 'cache-control': 'no-cache' } }, (error) => {
      if (error) next(error);
    });
  });
}

const isApi = ({ path }: Request): boolean => path === '/api' || path.startsWith('/api/');

const isPage = ({ method, path }: Request): boolean =>
  (method === 'GET' || method === 'HEAD') && !path.includes('.');
