/** The web client's files around the API. */
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import type { Express } from 'express';
import request from 'supertest';
import { createApp } from '../../server/app';
import { openApplication, type Application } from './application';
import { binary } from './planes';

const script = 'console.log("the client");'.repeat(200);
const wasm = Buffer.alloc(5000, 7);
const entry = '/_expo/static/js/web/entry-0123456789abcdef0123456789abcdef.js';

let application: Application;
let folder: string;
let server: Express;
beforeAll(async () => {
  application = await openApplication();
  folder = await mkdtemp(join(tmpdir(), 'pickglass-client-'));
  await mkdir(join(folder, '_expo/static/js/web'), { recursive: true });
  await writeFile(join(folder, 'index.html'), '<!doctype html><title>Pickglass</title>');
  await writeFile(join(folder, entry), script);
  await writeFile(join(folder, `${entry}.br`), brotliCompressSync(script));
  await writeFile(join(folder, `${entry}.gz`), gzipSync(script));
  await writeFile(join(folder, 'canvaskit.wasm'), wasm);
  await writeFile(join(folder, 'canvaskit.wasm.br'), brotliCompressSync(wasm));
  server = createApp(application.deps, { clientFolder: folder });
});
afterAll(async () => {
  await application.close();
  await rm(folder, { recursive: true, force: true });
});

it.each(['/', '/cases/1c0a4cb1-62f2-4b0e-8d5f-8a6f6b0f1111/bench', '/nothing'])(
  '%s leads to the one page of the client, which is always asked for anew',
  async (address) => {
    const answer = await request(server).get(address).expect(200);
    expect(answer.text).toContain('<title>Pickglass</title>');
    expect(answer.get('Cache-Control')).toBe('no-cache');
  },
);

it('an address under /api that is not there is a problem and not the page', async () => {
  const answer = await request(server).get('/api/nothing').expect(404);
  expect(answer.body.code).toBe('not-found');
});

it.each([
  ['br, gzip', 'br'],
  ['gzip', 'gzip'],
  ['identity', undefined],
])('a file with a hash in its name is kept for ever, and comes compressed as the browser takes it: %s', async (accepts, encoding) => {
  const answer = await request(server).get(entry).set('Accept-Encoding', accepts).expect(200);
  expect(answer.text).toBe(script);
  expect(answer.get('Content-Encoding')).toBe(encoding);
  expect(answer.get('Content-Type')).toContain('javascript');
  expect(answer.get('Cache-Control')).toBe('public, max-age=31536000, immutable');
  expect(answer.get('Vary')).toContain('Accept-Encoding');
});

it('WebAssembly has its own type, comes compressed and is checked for a newer one', async () => {
  const answer = await request(server).get('/canvaskit.wasm').set('Accept-Encoding', 'br').buffer().parse(binary).expect(200);
  expect(answer.get('Content-Type')).toContain('application/wasm');
  expect(answer.get('Content-Encoding')).toBe('br');
  expect(answer.get('Cache-Control')).toBe('no-cache');
  const again = await request(server)
    .get('/canvaskit.wasm')
    .set('Accept-Encoding', 'br')
    .set('If-None-Match', String(answer.get('ETag')));
  expect(again.status).toBe(304);
});

it('nothing outside the folder is served', async () => {
  const answer = await request(server).get('/..%2f..%2fetc%2fpasswd');
  expect(answer.text).not.toContain('root:');
});
