/** The registry: scanners of a department and the coils of each. */
import { doublePrecision, index, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { departments } from './people';

export const scanners = pgTable(
  'scanners',
  {
    id: uuid().primaryKey().defaultRandom(),
    departmentId: uuid('department_id')
      .notNull()
      .references(() => departments.id),
    name: text().notNull(),
    manufacturer: text().notNull(),
    model: text().notNull(),
    fieldStrengthTesla: doublePrecision('field_strength_tesla').notNull(),
    serial: text().notNull(),
    softwareVersion: text('software_version').notNull(),
    room: text().notNull(),
  },
  (table) => [index('scanners_of_department').on(table.departmentId)],
);

export const coils = pgTable(
  'coils',
  {
    id: uuid().primaryKey().defaultRandom(),
    scannerId: uuid('scanner_id')
      .notNull()
      .references(() => scanners.id),
    name: text().notNull(),
    serial: text().notNull(),
    elements: integer().notNull(),
  },
  (table) => [index('coils_of_scanner').on(table.scannerId)],
);
