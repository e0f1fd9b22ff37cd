/** Fills an empty database with a department, its members and its scanners. Cases come in through the services, as anyone's do. */
import { sql } from 'drizzle-orm';
import type { Database } from './client';
import { departments, members } from './schema/people';
import { coils, scanners } from './schema/scanners';

type MemberRow = typeof members.$inferInsert;
type ScannerRow = typeof scanners.$inferInsert;
type CoilRow = typeof coils.$inferInsert;

export interface DepartmentSeed {
  readonly name: string;
  readonly members: readonly Omit<MemberRow, 'id' | 'departmentId'>[];
  readonly scanners: readonly (Omit<ScannerRow, 'id' | 'departmentId'> & {
    readonly coils: readonly Omit<CoilRow, 'id' | 'scannerId'>[];
  })[];
}

export async function isEmpty(db: Database): Promise<boolean> {
  const [row] = await db
    .select({ found: sql<boolean>`true` })
    .from(departments)
    .limit(1);
  return row === undefined;
}

/** Stores a department and returns the ids of what is in it, in the order of `seed`. To be called in a transaction. */
export async function seedDepartment(db: Database, seed: DepartmentSeed) {
  const [department] = await db.insert(departments).values({ name: seed.name }).returning({ id: departments.id });
  if (department === undefined) throw new Error('the department was not stored');
  const memberIds = await db
    .insert(members)
    .values(seed.members.map((member) => ({ ...member, departmentId: department.id })))
    .returning({ id: members.id });

  const seeded: { id: string; coilIds: string[] }[] = [];
  for (const { coils: theirs, ...scanner } of seed.scanners) {
    const [row] = await db
      .insert(scanners)
      .values({ ...scanner, departmentId: department.id })
      .returning({ id: scanners.id });
    if (row === undefined) throw new Error('the scanner was not stored');
    const coilIds = await db
      .insert(coils)
      .values(theirs.map((coil) => ({ ...coil, scannerId: row.id })))
      .returning({ id: coils.id });
    seeded.push({ id: row.id, coilIds: coilIds.map(({ id }) => id) });
  }
  return { departmentId: department.id, memberIds: memberIds.map(({ id }) => id), scanners: seeded };
}
