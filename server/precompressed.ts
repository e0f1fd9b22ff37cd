/**
 * Files that the build compressed beforehand are sent as they are: 8 MB of WebAssembly cost no compressor at the time of a request.
 * Beside `name` lie `name.br` and `name.gz`; the first that the browser accepts stands in for it.
 */
import { readdirSync } from 'node:fs';
import { extname, relative, sep } from 'node:path';
import type { RequestHandler } from 'express';

const encodings = [
  { suffix: '.br', name: 'br' },
  { suffix: '.gz', name: 'gzip' },
] as const;

/** The name of a file without the suffix of its compression. */
export const withoutCompression = (path: string): string => path.replace(/\.(br|gz)$/, '');

/** Middleware before the static files of `folder`, which is read once. */
export function preferCompressed(folder: string): RequestHandler {
  const files = new Set(addressesIn(folder));
  return (request, response, next) => {
    const { path } = request;
    const stored = encodings.filter(({ suffix }) => files.has(path + suffix));
    if (stored.length > 0) {
      response.vary('Accept-Encoding');
      const accepted = stored.find(({ name }) => request.acceptsEncodings(name) !== false);
      if (accepted !== undefined) {
        response.type(extname(path)).set('Content-Encoding', accepted.name);
        request.url = request.url.replace(path, path + accepted.suffix);
      }
    }
    next();
  };
}

const addressesIn = (folder: string): string[] =>
  readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map(({ parentPath, name }) => `/${[...relative(folder, parentPath).split(sep), name].filter((part) => part !== '').join('/')}`);
