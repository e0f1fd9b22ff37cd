/**
 * The demo department in an empty database: accounts, scanners, and two cases that anyone could have filed. Its pictures are drawn
 * by the models, written as DICOM and read through the same door as every upload; trial and mark come through the services.
 */
import { mkdir } from 'node:fs/promises';
import { hash } from 'bcryptjs';
import { isEmpty, seedDepartment } from '../../db/seed';
import type { Dependencies } from '../dependencies';
import { passwordRounds } from '../services/sign-in';
import type { Caller } from '../services/sessions';
import { drawAccounts } from './accounts';
import { fileFoldInCase, fileGhostCase } from './cases';
import { departmentName, people, scanners } from './department';

/** Seeds an empty database; leaves any other as it is. */
export async function seedDemo(deps: Dependencies): Promise<void> {
  if (!(await isEmpty(deps.db))) return;
  await mkdir(deps.env.dataFolder, { recursive: true });
  const accounts = await drawAccounts(deps.env.dataFolder);
  const members = await Promise.all(
    accounts.map(async ({ password, ...person }) => ({ ...person, passwordHash: await hash(password, passwordRounds) })),
  );
  const seeded = await deps.db.transaction((tx) => seedDepartment(tx, { name: departmentName, members, scanners }));

  const as = (role: Caller['role']): Caller => {
    const index = people.findIndex((person) => person.role === role);
    const person = people[index];
    const memberId = seeded.memberIds[index];
    if (person === undefined || memberId === undefined) throw new Error(`the demo department has no ${role}`);
    return { ...person, memberId, sessionId: '', departmentId: seeded.departmentId, departmentName };
  };
  const [tern, heron] = seeded.scanners;
  await fileGhostCase(deps, as, { scannerId: tern?.id, coilId: tern?.coilIds[0] });
  await fileFoldInCase(deps, as, { scannerId: heron?.id, coilId: heron?.coilIds[1] });
}
