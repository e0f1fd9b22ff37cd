/**
 * Images as they are after the door: geometry, scan facts, and where the values lie in the object store. There is no column for
 * a name, a date of the exam, a file name or an identifier of the hospital, so none can be stored.
 */
import { boolean, doublePrecision, index, integer, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { departments, members } from './people';
import { scanners } from './scanners';
import { arrivalWord, componentWord, imageUseWord, kspaceOriginWord } from './words';

export const images = pgTable(
  'images',
  {
    id: uuid().primaryKey().defaultRandom(),
    departmentId: uuid('department_id')
      .notNull()
      .references(() => departments.id),
    /** Who sent it; null where a scanner did. */
    uploaderId: uuid('uploader_id').references(() => members.id),
    arrival: arrivalWord().notNull().default('upload'),
    /** The scanner that sent it. */
    scannerId: uuid('scanner_id').references(() => scanners.id),
    rows: integer().notNull(),
    columns: integer().notNull(),
    frames: integer().notNull(),
    component: componentWord().notNull(),
    use: imageUseWord().notNull().default('measured'),
    kspace: kspaceOriginWord().notNull().default('derived'),
    /** A secondary capture may show a name: false until whoever sent it has looked, then true; null where nobody need look. */
    confirmedNoText: boolean('confirmed_no_text'),
    /** Row, column; null where the header is silent. */
    spacingMm: jsonb('spacing_mm').$type<[number, number]>(),
    rangeLow: doublePrecision('range_low').notNull(),
    rangeHigh: doublePrecision('range_high').notNull(),
    /** SHA-256 of the values as float32, little-endian, [frame, row, column], re and im in turn where complex: the name of the object. */
    valuesDigest: text('values_digest').notNull(),
    /** Scan facts as the header gave them. */
    headerFacts: jsonb('header_facts').$type<Record<string, unknown>>().notNull(),
    /** Facts that members set over them. */
    memberFacts: jsonb('member_facts').$type<Record<string, unknown>>().notNull().default({}),
    /** One entry a frame. */
    frameFacts: jsonb('frame_facts').$type<Record<string, unknown>[]>().notNull().default([]),
    warnings: jsonb().$type<{ code: string; text: string }[]>().notNull(),
    removedTags: text('removed_tags').array().notNull(),
    replacedTags: text('replaced_tags').array().notNull(),
    /** Keyed hashes of the unique identifiers that the file had (server/dicom/unique-identifiers.ts). */
    studyKey: text('study_key'),
    seriesKey: text('series_key'),
    frameOfReferenceKey: text('frame_of_reference_key'),
    imageKey: text('image_key'),
    /** Keyed hash of the file's bytes: what was sent already need not be sent again. */
    fileKey: text('file_key'),
    uploadedAt: timestamp('uploaded_at', { withTimezone: true, mode: 'date' }).notNull().defaultNow(),
  },
  (table) => [
    index('images_of_department').on(table.departmentId),
    index('images_of_series').on(table.departmentId, table.seriesKey),
    index('images_of_file').on(table.departmentId, table.fileKey),
    index('images_of_scanner').on(table.scannerId),
  ],
);
