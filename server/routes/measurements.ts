import * as contract from '../contract/measurements';
import { serve, type App } from '../serve';
import { profileOf, statisticsOf } from '../services/measure';

export function serveMeasurements(app: App): void {
  const { deps } = app;
  serve(app, contract.measureProfile, ({ caller, params, query, gone }) => profileOf(deps, caller, { ...params, ...query }, gone));
  serve(app, contract.measureRegion, ({ caller, params, query, gone }) => statisticsOf(deps, caller, { ...params, ...query }, gone));
}
