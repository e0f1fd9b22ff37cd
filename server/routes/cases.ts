import * as contract from '../contract/cases';
import { serve, type App } from '../serve';
import { attachToCase, changeCase, fileCase } from '../services/change-case';
import { unquestioned } from '../services/questioned-text';
import { findCases, readCase } from '../services/read-case';

export function serveCases(app: App): void {
  const { db } = app.deps;
  serve(app, contract.createCase, ({ caller, body }) => fileCase(db, caller, unquestioned(body)));
  serve(app, contract.listCases, ({ caller, query }) => findCases(db, caller, query));
  serve(app, contract.readCase, ({ caller, params }) => readCase(db, caller, params.caseId));
  serve(app, contract.changeCase, ({ caller, params, body }) => changeCase(db, caller, params.caseId, unquestioned(body)));
  serve(app, contract.attachImage, ({ caller, params, body }) => attachToCase(db, caller, params.caseId, body));
}
