import * as contract from '../contract/simulations';
import { serve, type App } from '../serve';
import { formAskedFor } from '../services/planes-answer';
import { simulate } from '../services/simulate';

export function serveSimulations(app: App): void {
  serve(app, contract.simulate, ({ caller, body, request, gone }) =>
    simulate(app.deps, caller, { ...body, form: formAskedFor(request) }, gone),
  );
}
