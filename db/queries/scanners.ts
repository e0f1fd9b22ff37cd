/** Scanners and coils of a department. */
import { and, asc, count, eq, ne } from 'drizzle-orm';
import type { Database } from '../client';
import { cases } from '../schema/cases';
import { coils, scanners } from '../schema/scanners';

const coilColumns = { id: coils.id, name: coils.name, serial: coils.serial, elements: coils.elements };

/** Scanners by name, each with its coils and the number of its open cases. */
export async function listScannersOf(db: Database, departmentId: string) {
  const found = await db.select().from(scanners).where(eq(scanners.departmentId, departmentId)).orderBy(asc(scanners.name));
  const theirCoils = await db
    .select({ ...coilColumns, scannerId: coils.scannerId })
    .from(coils)
    .innerJoin(scanners, eq(scanners.id, coils.scannerId))
    .where(eq(scanners.departmentId, departmentId))
    .orderBy(asc(coils.name));
  const open = await db
    .select({ scannerId: cases.scannerId, openCases: count() })
    .from(cases)
    .where(and(eq(cases.departmentId, departmentId), ne(cases.state, 'closed')))
    .groupBy(cases.scannerId);

  return found.map(({ departmentId: _own, ...scanner }) => ({
    ...scanner,
    coils: theirCoils.filter((coil) => coil.scannerId === scanner.id).map(({ scannerId: _scanner, ...coil }) => coil),
    openCases: open.find((row) => row.scannerId === scanner.id)?.openCases ?? 0,
  }));
}

export async function findScannerOf(db: Database, departmentId: string, scannerId: string) {
  const [row] = await db
    .select({ id: scanners.id })
    .from(scanners)
    .where(and(eq(scanners.departmentId, departmentId), eq(scanners.id, scannerId)));
  return row;
}

/** A coil of a scanner of the department, with the scanner it belongs to. */
export async function findCoilOf(db: Database, departmentId: string, coilId: string) {
  const [row] = await db
    .select({ id: coils.id, scannerId: coils.scannerId })
    .from(coils)
    .innerJoin(scanners, eq(scanners.id, coils.scannerId))
    .where(and(eq(scanners.departmentId, departmentId), eq(coils.id, coilId)));
  return row;
}
