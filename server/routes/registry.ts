import { listMembersOf } from '../../db/queries/members';
import { listScannersOf } from '../../db/queries/scanners';
import * as contract from '../contract/registry';
import { serve, type App } from '../serve';

export function serveRegistry(app: App): void {
  const { db } = app.deps;
  serve(app, contract.listMembers, ({ caller }) => listMembersOf(db, caller.departmentId));
  serve(app, contract.listScanners, ({ caller }) => listScannersOf(db, caller.departmentId));
}
