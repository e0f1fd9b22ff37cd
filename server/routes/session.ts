import * as contract from '../contract/session';
import { serve, serveAnyone, type App } from '../serve';
import { closeSession, describeSession } from '../services/sessions';
import { signIn, signInGuard } from '../services/sign-in';

export function serveSession(app: App): void {
  const guard = signInGuard(app.deps.sql);
  serveAnyone(app, contract.signIn, ({ body, request, response }) =>
    signIn(app.deps, guard, { ...body, address: request.socket.remoteAddress ?? '' }, response),
  );
  serve(app, contract.whoAmI, async ({ caller }) => describeSession(caller));
  serveAnyone(app, contract.signOut, ({ request, response }) => closeSession(app.deps, request.headers.cookie, response));
}
