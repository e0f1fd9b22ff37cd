/**
 * Images as they are after the door: geometry, scan facts, and where the values lie in the object store. There is no column for
 * a name, a date of the exam, a file name or an identifier of the hospital, so none can be stored.
 */
import { doublePrecision, index, integer, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { departments, members } from './people';
import { componentWord } from './words';

export const images = pgTable(
  'images',
  {
    id: uuid().primaryKey().defaultRandom(),
    departmentId: uuid('department_id')
      .notNull()
      .references(() => departments.id),
    uploaderId: uuid('uploader_id')
      .notNull()
      .references(() => members.id),
    rows: integer().notNull(),
    columns: integer().notNull(),
    frames: integer().notNull(),
    component: componentWord().notNull(),
    /** Row, column; null where the header is silent. */
    spacingMm: jsonb('spacing_mm').$type<[number, number]>(),
    rangeLow: doublePrecision('range_low').notNull(),
    rangeHigh: doublePrecision('range_high').notNull(),
    /** SHA-256 of the values as float32, little-endian, [frame, row, column]: the name of the object. */
    valuesDigest: text('values_digest').notNull(),
    /** Scan facts as the header gave them. */
    headerFacts: jsonb('header_facts').$type<Record<string, unknown>>().notNull(),
    /** Facts that members set over them. */
    memberFacts: jsonb('member_facts').$type<Record<string, unknown>>().notNull().default({}),
    warnings: jsonb().$type<{ code: string; text: string }[]>().notNull(),
    removedTags: text('removed_tags').array().notNull(),
    replacedTags: text('replaced_tags').array().notNull(),
    uploadedAt: timestamp('uploaded_at', { withTimezone: true, mode: 'date' }).notNull().defaultNow(),
  },
  (table) => [index('images_of_department').on(table.departmentId)],
);
