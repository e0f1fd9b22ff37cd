/** The promise that no route of the contract is left out, and that errors tell nothing that they should not. */
import express from 'express';
import request from 'supertest';
import { routes } from '../../server/contract/routes';
import { signIn, whoAmI } from '../../server/contract/session';
import { answerErrors, asAppError } from '../../server/errors';
import { openLog } from '../../server/log';
import { type App, refuseUnserved, serve, serveAnyone, serveScanner } from '../../server/serve';
import { openApplication, type Application } from './application';

let application: Application;
beforeAll(async () => {
  application = await openApplication();
});
afterAll(() => application.close());

const emptyApp = (): App => ({ express: express(), deps: application.deps, served: new Set() });

it('a server that leaves out a route of the contract does not start, and names it', () => {
  const app = emptyApp();
  for (const { method, path } of routes) app.served.add(`${method.toUpperCase()} ${path}`);
  expect(() => refuseUnserved(app)).not.toThrow();
  app.served.delete('GET /api/session');
  expect(() => refuseUnserved(app)).toThrow('GET /api/session');
});

it('a route for members cannot be served to anyone or to scanners by mistake, nor the other way round', () => {
  expect(() => serveAnyone(emptyApp(), whoAmI, () => Promise.reject(new Error('never called')))).toThrow('is for members');
  expect(() => serve(emptyApp(), signIn, () => Promise.reject(new Error('never called')))).toThrow('not for members');
  expect(() => serveScanner(emptyApp(), whoAmI, () => Promise.reject(new Error('never called')))).toThrow('not for scanners');
});

it('an output that breaks the contract is not sent', async () => {
  const app = emptyApp();
  serveAnyone(app, signIn, async () => ({ member: 'nobody' }) as never);
  app.express.use(answerErrors(openLog('silent')));
  // No body parser stands before it, so the input is broken too: give it one.
  const outer = express().use(express.json()).use(app.express);
  const answer = await request(outer).post('/api/session').send({ email: 'a@b.example', password: 'x' }).expect(500);
  expect(answer.body).toEqual({
    ...{ type: 'urn:pickglass:problem:unexpected', status: 500, code: 'unexpected' },
    title: 'Something went wrong on the server',
  });
});

it('an unexpected error is logged without the values that a database repeats in its messages', () => {
  const lines: string[] = [];
  const log = openLog('info', { write: (line: string) => void lines.push(line) });
  const fault = Object.assign(new Error('Failed query: insert … params: BRAMBLEBY'), { query: 'insert', params: ['BRAMBLEBY'] });
  log.error({ err: fault }, 'unexpected error');
  expect(lines.join('')).toContain('the database refused a statement');
  expect(lines.join('')).not.toContain('BRAMBLEBY');
});

it('an error of the database’s connection is told from every other', () => {
  const wrapped = Object.assign(new Error('query'), { cause: Object.assign(new Error(), { code: 'ECONNREFUSED' }) });
  expect(asAppError(wrapped).code).toBe('database-away');
  expect(asAppError(Object.assign(new Error(), { code: '57P01' })).code).toBe('database-away');
  expect(asAppError(Object.assign(new Error(), { code: '23505' })).code).toBe('unexpected');
  expect(asAppError('a string').code).toBe('unexpected');
});
