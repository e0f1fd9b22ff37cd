/** Is the product up? */
import { z } from 'zod';
import { route } from './route';

export const readHealth = route({
  method: 'get',
  path: '/api/health',
  summary: 'Whether server, database and workers are up',
  access: 'anyone',
  output: z.object({ status: z.literal('ok'), version: z.string(), database: z.literal('ok'), workers: z.number().int() }),
});
export const readOpenApi = route({
  method: 'get',
  path: '/api/openapi.json',
  summary: 'This interface as OpenAPI 3.1',
  access: 'anyone',
  output: z.record(z.string(), z.unknown()),
});
