import * as contract from '../contract/push';
import { storeSent } from '../push/stow';
import { serve, serveScanner, type App } from '../serve';
import { discardImages, readInbox } from '../services/inbox';
import { changePush, drawToken, readPush, revokeToken } from '../services/scanner-push';

export function servePush(app: App): void {
  const { deps } = app;
  serve(app, contract.readPush, ({ caller, params }) => readPush(deps, caller, params.scannerId));
  serve(app, contract.changePush, ({ caller, params, body }) => changePush(deps, caller, params.scannerId, body));
  serve(app, contract.drawToken, ({ caller, params }) => drawToken(deps, caller, params.scannerId));
  serve(app, contract.revokeToken, ({ caller, params }) => revokeToken(deps, caller, params));
  serve(app, contract.readInbox, ({ caller, params }) => readInbox(deps, caller, params.scannerId));
  serve(app, contract.discardImages, ({ caller, params, body }) => discardImages(deps, caller, params.scannerId, body.images));
  serveScanner(app, contract.storeInstances, ({ caller, request }) => storeSent(deps, caller, request), { status: storeStatus });
}

/** PS3.18 table 10.5.3-1: all were stored, some were, none was. */
function storeStatus(output: Record<string, unknown>): number {
  const stored = '00081199' in output;
  const failed = '00081198' in output || '0008119A' in output;
  if (!stored) return 409;
  return failed ? 202 : 200;
}
