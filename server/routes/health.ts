import * as contract from '../contract/health';
import { serveAnyone, type App } from '../serve';
import { readHealth } from '../services/health';
import { describeInterface } from '../services/openapi';

export function serveHealth(app: App): void {
  serveAnyone(app, contract.readHealth, () => readHealth(app.deps));
  serveAnyone(app, contract.readOpenApi, async () => describeInterface(app.deps.version));
}
