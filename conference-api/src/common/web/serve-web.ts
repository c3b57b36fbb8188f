import type { NestExpressApplication } from '@nestjs/platform-express';
import express, { type NextFunction, type Request, type Response } from 'express';
import { existsSync } from 'node:fs';
import { extname, join } from 'node:path';

/** The built web on the API's own origin: hashed files for ever, everything else gets the page. */
export function serveWeb(app: NestExpressApplication, folder: string): void {
  const page = join(folder, 'index.html');
  if (!existsSync(page)) return;
  app.use('/assets', express.static(join(folder, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false, index: false }));
  app.use(express.static(folder, { index: false, maxAge: '1h' }));
  app.use((request: Request, response: Response, next: NextFunction) => {
    // a page's address has no ending; a file that is not there is not the page
    const wantsPage = (request.method === 'GET' || request.method === 'HEAD') && !request.path.startsWith('/api/') && !extname(request.path);
    if (!wantsPage) return next();
    response.set('Cache-Control', 'no-cache').sendFile(page);
  });
}
