import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import express, { Router } from 'express';

/** The built client: hashed files may be kept for a year, the page that names them is asked for each time. */
export function clientPages(folder = resolve('dist/client')): Router {
  const router = Router();
  const page = resolve(folder, 'index.html');
  router.use(
    '/assets',
    express.static(resolve(folder, 'assets'), {
      index: false,
      immutable: true,
      maxAge: '1y',
      fallthrough: true,
    }),
  );
  router.use('/assets', (_request, response) => {
    response.status(404).type('text').send('Not found');
  });
  router.use(express.static(folder, { index: false, maxAge: '1h' }));
  router.get('/{*path}', (request, response) => {
    response.set('Cache-Control', 'no-cache');
    if (!request.accepts('html')) return response.status(404).type('text').send('Not found');
    if (existsSync(page)) return response.sendFile(page, { cacheControl: false });
    return response
      .status(503)
      .type('text')
      .send(
        'The pages are not built yet. `npm start` builds them; `npm run dev` serves them while they are changed.',
      );
  });
  return router;
}
