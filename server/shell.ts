/** What stands around the API: headers that protect, the web client's files, and the page that every other address leads to. */
import { join } from 'node:path';
import compression from 'compression';
import express, { type Express, type RequestHandler } from 'express';
import helmet from 'helmet';
import { AppError } from './errors';
import { preferCompressed, withoutCompression } from './precompressed';

/** Headers on every answer. CanvasKit is WebAssembly, which needs `wasm-unsafe-eval`; nothing is loaded from another origin. */
export const protect = (secure: boolean): RequestHandler =>
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'self'"],
        'script-src': ["'self'", "'wasm-unsafe-eval'"],
        // react-native-web writes its rules into a style element of its own.
        'style-src': ["'self'", "'unsafe-inline'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'font-src': ["'self'", 'data:'],
        'connect-src': ["'self'"],
        'worker-src': ["'self'", 'blob:'],
        'object-src': ["'none'"],
        'base-uri': ["'self'"],
        'form-action': ["'self'"],
        'frame-ancestors': ["'none'"],
      },
    },
    strictTransportSecurity: secure,
    crossOriginEmbedderPolicy: false,
  });

/** Text and WebAssembly are compressed; planes are noise to a compressor and PNG pictures are compressed already. */
export const compress = (): RequestHandler =>
  compression({
    filter: (_request, response) => /json|javascript|text\/|wasm|svg/.test(String(response.getHeader('Content-Type') ?? '')),
  });

/** A state-changing request that names another origin is refused; browsers always name it. */
export const refuseForeignOrigins =
  (publicOrigin: string | undefined): RequestHandler =>
  (request, _response, next) => {
    const { origin, host } = request.headers;
    const reads = ['GET', 'HEAD', 'OPTIONS'].includes(request.method);
    const ours = origin === publicOrigin || origin === `http://${host}` || origin === `https://${host}`;
    if (!reads && origin !== undefined && !ours) throw new AppError('foreign-origin');
    next();
  };

const year = 365 * 24 * 3600;
/** Names with a hash of the content in them, as Metro makes them, never change what they hold. */
const hashed = /[.-][0-9a-f]{16,}\.[a-z0-9]+$/;

/** Serves the exported web client of `folder`; addresses that are no file and not under /api lead to its one page. */
export function serveClient(app: Express, folder: string): void {
  const files = express.static(folder, {
    index: false,
    setHeaders: (response, path) => {
      response.setHeader('Cache-Control', hashed.test(withoutCompression(path)) ? `public, max-age=${year}, immutable` : 'no-cache');
    },
  });
  app.use(preferCompressed(folder), files);
  app.get('/{*splat}', (request, response, next) => {
    if (request.path.startsWith('/api/')) {
      next();
      return;
    }
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(join(folder, 'index.html'));
  });
}
