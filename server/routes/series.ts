import * as contract from '../contract/series';
import { serve, type App } from '../serve';
import { findSentFilesOf, readSlices } from '../services/series';

export function serveSeries(app: App): void {
  const { deps } = app;
  serve(app, contract.readSlices, ({ caller, params }) => readSlices(deps.db, caller, params.imageId));
  serve(app, contract.findSentFiles, ({ caller, body }) => findSentFilesOf(deps, caller, body.digests));
}
