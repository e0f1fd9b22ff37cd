import * as contract from '../contract/catalogue';
import { serve, type App } from '../serve';
import { describeCauses, describeReconstructions, drawSwatch } from '../services/catalogue';

export function serveCatalogue(app: App): void {
  serve(app, contract.listCauses, ({ caller, query }) => describeCauses(app.deps.db, caller, query.imageId));
  serve(app, contract.readSwatch, ({ params, query, gone }) => drawSwatch(app.deps, params.causeId, query, gone));
  serve(app, contract.listReconstructions, async () => describeReconstructions());
  // No correction is modelled yet: the list is empty, and a client shows that there is none.
  serve(app, contract.listCorrections, async () => []);
}
