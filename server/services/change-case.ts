/** Filing a case, changing what it says, and putting images on it. */
import type { z } from 'zod';
import type { Database } from '../../db/client';
import { addCase, addCaseImages, changeCaseRow, touchCase, type CaseRow } from '../../db/queries/cases';
import { addEvents } from '../../db/queries/case-parts';
import { findImagesOf } from '../../db/queries/images';
import { findCoilOf, findScannerOf } from '../../db/queries/scanners';
import type { attachImage, changeCase as changeCaseRoute, createCase, Case } from '../contract/cases';
import { AppError, invalidAt } from '../errors';
import { lockOpenCase } from './open-case';
import { readCase } from './read-case';
import type { Caller } from './sessions';

type Fields = Pick<Partial<CaseRow>, 'scannerId' | 'coilId'>;

/** Files a case with its images. Nothing is kept unless all of it is. */
export async function fileCase(db: Database, caller: Caller, { images, ...fields }: z.output<typeof createCase.body>): Promise<Case> {
  return db.transaction(async (tx) => {
    await checkRegistry(tx, caller, fields);
    await checkImages(tx, caller, images, ['images']);
    const filed = await addCase(tx, { ...fields, departmentId: caller.departmentId, reporterId: caller.memberId });
    await addCaseImages(tx, filed.id, uniqueByImage(images));
    await addEvents(tx, [
      { caseId: filed.id, actorId: caller.memberId, kind: 'filed', to: 'reported', text: `Filed as case ${filed.number}` },
      ...added(images).map((text) => ({ caseId: filed.id, actorId: caller.memberId, kind: 'image-added' as const, text })),
    ]);
    return readCase(tx, caller, filed.id);
  });
}

/** A line for each role: a series of 200 images is one event. */
function added(images: readonly { role: string }[]): string[] {
  const roles = [...new Set(images.map(({ role }) => role))];
  return roles.map((role) => {
    const count = images.filter((image) => image.role === role).length;
    return count === 1 ? `Image added: ${role}` : `${count} images added: ${role}`;
  });
}

/** Changes fields of an open case, if nobody else did since `version` was read. */
export async function changeCase(
  db: Database,
  caller: Caller,
  caseId: string,
  { version, ...fields }: z.output<typeof changeCaseRoute.body>,
): Promise<Case> {
  return db.transaction(async (tx) => {
    const current = await lockOpenCase(tx, caller, caseId);
    if (current.version !== version) {
      throw new AppError('version-conflict', {
        detail: `The case is at version ${current.version}; the change was made on version ${version}`,
      });
    }
    const changed = Object.keys(fields);
    if (changed.length === 0) return readCase(tx, caller, caseId);
    await checkRegistry(tx, caller, { scannerId: current.scannerId, coilId: current.coilId, ...fields });
    await changeCaseRow(tx, caseId, fields);
    await addEvents(tx, [{ caseId, actorId: caller.memberId, kind: 'changed', text: `Changed: ${changed.map(inWords).join(', ')}` }]);
    return readCase(tx, caller, caseId);
  });
}

/** Puts an image of the department on an open case. */
export async function attachToCase(db: Database, caller: Caller, caseId: string, image: z.output<typeof attachImage.body>): Promise<Case> {
  return db.transaction(async (tx) => {
    await lockOpenCase(tx, caller, caseId);
    await checkImages(tx, caller, [image], []);
    await addCaseImages(tx, caseId, [image]);
    await touchCase(tx, caseId);
    await addEvents(tx, [{ caseId, actorId: caller.memberId, kind: 'image-added', text: `Image added: ${image.role}` }]);
    return readCase(tx, caller, caseId);
  });
}

/** Scanner and coil must be the department's, and the coil one of the scanner's. */
async function checkRegistry(db: Database, caller: Caller, { scannerId, coilId }: Fields): Promise<void> {
  if (scannerId && !(await findScannerOf(db, caller.departmentId, scannerId))) throw invalidAt(['scannerId'], 'there is no such scanner');
  if (!coilId) return;
  const coil = await findCoilOf(db, caller.departmentId, coilId);
  if (coil === undefined) throw invalidAt(['coilId'], 'there is no such coil');
  if (coil.scannerId !== scannerId) throw invalidAt(['coilId'], 'this coil belongs to another scanner');
}

async function checkImages(db: Database, caller: Caller, images: readonly { imageId: string }[], root: string[]): Promise<void> {
  const found = await findImagesOf(
    db,
    caller.departmentId,
    images.map(({ imageId }) => imageId),
  );
  const pathOf = (index: number) => [...root, ...(root.length > 0 ? [index] : []), 'imageId'];
  const missing = images.findIndex(({ imageId }) => !found.some(({ id }) => id === imageId));
  if (missing >= 0) throw invalidAt(pathOf(missing), 'there is no such image');
  const unseen = images.findIndex(({ imageId }) => found.some(({ id, confirmedNoText }) => id === imageId && confirmedNoText === false));
  if (unseen >= 0) throw invalidAt(pathOf(unseen), 'look at this secondary capture first, and confirm that it shows no name and no text');
}

/** The last role that an image was given counts. */
const uniqueByImage = <I extends { imageId: string }>(images: readonly I[]): I[] => [
  ...new Map(images.map((image) => [image.imageId, image])).values(),
];

/** `bodyRegion` → `body region`. */
const inWords = (field: string): string => field.replace(/Id$/, '').replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
