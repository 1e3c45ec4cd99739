import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router } from 'express';
import { nonceOf } from '../middleware/security';

/** The built browser application: hashed files for a year, the page itself anew each time with its nonce. */
export function applicationRoutes(folder: string): Router {
  const router = Router();
  const page = join(folder, 'index.html');
  const html = existsSync(page) ? readFileSync(page, 'utf8') : undefined;
  // Before the static files: the page goes out with a nonce only.
  router.get('/index.html', (_request, response) => response.redirect('/'));
  router.use('/assets', express.static(join(folder, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }));
  router.use(express.static(folder, { index: false, maxAge: '1h' }));
  router.get('/{*path}', (_request, response) => {
    if (html === undefined) {
      response.status(503).type('text').send('The browser application is not built. Run npm start, or npm run build.');
      return;
    }
    response
      .set('Cache-Control', 'no-store')
      .type('html')
      .send(html.replaceAll('__CSP_NONCE__', nonceOf(response.locals)));
  });
  return router;
}
