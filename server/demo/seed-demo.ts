/**
 * The demo department in an empty database: accounts, scanners, and cases in every state. Its pictures are phantoms scanned by the
 * department's own protocols, written as DICOM and read through the same door as every upload; all that happens to the cases comes
 * through the services.
 */
import { mkdir } from 'node:fs/promises';
import { hash } from 'bcryptjs';
import { isEmpty, seedDepartment } from '../../db/seed';
import type { Dependencies } from '../dependencies';
import { passwordRounds } from '../services/sign-in';
import { drawAccounts } from './accounts';
import { breathingGhosts, brightFat, brightInFront, dottedLine, unexpectedVoid } from './cases-body';
import { armFoldedIn, corduroy, ghostsOnT1, secondHead } from './cases-head';
import { darkSector, darkSectorAgain, ringsAlongEdges, shortDisc, smearedVials } from './cases-quality';
import { departmentName, people, scanners } from './department';
import { forgetScans } from './pictures';
import { tell, type Cast, type Story } from './story';

/** In the order in which they were seen, oldest first. */
export const stories: readonly Story[] = [
  darkSector,
  ringsAlongEdges,
  corduroy,
  breathingGhosts,
  shortDisc,
  unexpectedVoid,
  dottedLine,
  secondHead,
  darkSectorAgain,
  brightFat,
  ghostsOnT1,
  smearedVials,
  armFoldedIn,
  brightInFront,
];

/** Seeds an empty database; leaves any other as it is. */
export async function seedDemo(deps: Dependencies): Promise<void> {
  if (!(await isEmpty(deps.db))) return;
  await mkdir(deps.env.dataFolder, { recursive: true });
  const accounts = await drawAccounts(deps.env.dataFolder);
  const members = await Promise.all(
    accounts.map(async ({ password, ...person }) => ({ ...person, passwordHash: await hash(password, passwordRounds) })),
  );
  const seeded = await deps.db.transaction((tx) => seedDepartment(tx, { name: departmentName, members, scanners }));
  const cast = castOf(seeded);
  for (const story of stories) await tell(deps, cast, story);
  forgetScans();
}

const castOf = ({ departmentId, memberIds, scanners: registered }: Awaited<ReturnType<typeof seedDepartment>>): Cast => ({
  as(role) {
    const index = people.findIndex((person) => person.role === role);
    const [person, memberId] = [people[index], memberIds[index]];
    if (person === undefined || memberId === undefined) throw new Error(`the demo department has no ${role}`);
    return { ...person, memberId, sessionId: '', departmentId, departmentName };
  },
  placeOf({ scanner: { name }, coil }) {
    const index = scanners.findIndex((scanner) => scanner.name === name);
    const scannerId = registered[index]?.id;
    const coilId = registered[index]?.coilIds[scanners[index]?.coils.findIndex((one) => one.name === coil) ?? -1];
    if (scannerId === undefined || coilId === undefined) throw new Error(`the demo department has no ${name} with ${coil}`);
    return { scannerId, coilId };
  },
});
