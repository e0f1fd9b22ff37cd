/** Cases and the images that belong to them. */
import { date, index, integer, pgTable, primaryKey, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { sql } from 'drizzle-orm';
import { images } from './images';
import { departments, members } from './people';
import { coils, scanners } from './scanners';
import { caseStateWord, directionWord, frequencyWord, imageCostWord, imageRoleWord, sightingWord } from './words';

export const cases = pgTable(
  'cases',
  {
    id: uuid().primaryKey().defaultRandom(),
    departmentId: uuid('department_id')
      .notNull()
      .references(() => departments.id),
    /** 1, 2, 3 … within the department: what a person types into the exam's note. */
    number: integer().notNull(),
    /** Raised by every change; a change names the version it was made on. */
    version: integer().notNull().default(1),
    state: caseStateWord().notNull().default('reported'),
    title: text().notNull(),
    scannerId: uuid('scanner_id').references(() => scanners.id),
    coilId: uuid('coil_id').references(() => coils.id),
    seen: sightingWord()
      .array()
      .notNull()
      .default(sql`'{}'::sighting[]`),
    direction: directionWord().notNull().default('unknown'),
    howOften: frequencyWord('how_often').notNull().default('unknown'),
    cost: imageCostWord().notNull().default('unknown'),
    bodyRegion: text('body_region').notNull().default(''),
    protocol: text().notNull().default(''),
    description: text().notNull().default(''),
    tried: text().notNull().default(''),
    seenOn: date('seen_on', { mode: 'string' }),
    reporterId: uuid('reporter_id')
      .notNull()
      .references(() => members.id),
    assigneeId: uuid('assignee_id').references(() => members.id),
    openedAt: timestamp('opened_at', { withTimezone: true, mode: 'date' }).notNull().defaultNow(),
    updatedAt: timestamp('updated_at', { withTimezone: true, mode: 'date' }).notNull().defaultNow(),
  },
  (table) => [
    uniqueIndex('case_number_in_department').on(table.departmentId, table.number),
    index('cases_by_state').on(table.departmentId, table.state),
  ],
);

export const caseImages = pgTable(
  'case_images',
  {
    caseId: uuid('case_id')
      .notNull()
      .references(() => cases.id),
    imageId: uuid('image_id')
      .notNull()
      .references(() => images.id),
    role: imageRoleWord().notNull(),
    addedAt: timestamp('added_at', { withTimezone: true, mode: 'date' }).notNull().defaultNow(),
  },
  (table) => [primaryKey({ columns: [table.caseId, table.imageId] })],
);
