import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { type Express } from 'express';

/** The built dashboard: files that never change under their names, and one page for every other address. */
export function servePages(app: Express, folder: string): void {
  const page = join(folder, 'index.html');
  if (!existsSync(page)) return;
  app.use('/assets', express.static(join(folder, 'assets'), { index: false, immutable: true, maxAge: '1y' }));
  app.use(express.static(folder, { index: false, maxAge: 0 }));
  app.get('/{*path}', (request, response, next) => {
    if (request.path.startsWith('/api/') || request.path.startsWith('/assets/')) return next();
    response.set('Cache-Control', 'no-cache').sendFile(page);
  });
}
