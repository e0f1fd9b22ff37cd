/** The application: middleware, every route of the contract, errors. It never listens; `index.ts` and the tests do. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { type Express } from 'express';
import type { Dependencies } from './dependencies';
import { answerErrors, AppError } from './errors';
import { logRequests } from './log';
import { serveCaseParts } from './routes/case-parts';
import { serveCases } from './routes/cases';
import { serveCatalogue } from './routes/catalogue';
import { serveExports } from './routes/exports';
import { serveHealth } from './routes/health';
import { serveImages } from './routes/images';
import { serveMeasurements } from './routes/measurements';
import { servePush } from './routes/push';
import { serveRegistry } from './routes/registry';
import { serveSeries } from './routes/series';
import { serveSession } from './routes/session';
import { serveSimulations } from './routes/simulations';
import { refuseUnserved, type App } from './serve';
import { compress, protect, refuseForeignOrigins, serveClient } from './shell';

/** Recipes and case texts are small; files come as multipart and have limits of their own. */
const jsonLimit = '256kb';

/** Builds the application over `deps`. Throws when a route of the contract is not served. */
export function createApp(deps: Dependencies, { clientFolder }: { clientFolder?: string } = {}): Express {
  const server = express();
  server.disable('x-powered-by');
  // Answers of the API are not kept, so a hash over megabytes of planes would be work for nothing.
  server.disable('etag');
  server.use(logRequests(deps.log));
  server.use(protect(deps.env.publicOrigin?.startsWith('https:') ?? false));
  server.use(compress());
  server.use('/api', refuseForeignOrigins(deps.env.publicOrigin));
  server.use('/api', (_request, response, next) => {
    response.setHeader('Cache-Control', 'no-store');
    next();
  });
  server.use('/api', express.json({ limit: jsonLimit }));

  const app: App = { express: server, deps, served: new Set() };
  const resources = [
    serveSession,
    serveHealth,
    serveImages,
    serveSeries,
    serveMeasurements,
    serveCatalogue,
    serveSimulations,
    serveExports,
    serveRegistry,
    servePush,
    serveCases,
    serveCaseParts,
  ];
  for (const serveResource of resources) serveResource(app);
  refuseUnserved(app);

  if (clientFolder !== undefined && existsSync(join(clientFolder, 'index.html'))) serveClient(server, clientFolder);
  server.use(() => {
    throw new AppError('not-found');
  });
  server.use(answerErrors(deps.log));
  return server;
}
