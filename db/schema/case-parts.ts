/** What members add to a case: trials, marks, comments, findings, signatures. */
import { index, integer, jsonb, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { Acquisition } from '../../recon/acquisition';
import type { Recipe } from '../../recon/recipe';
import { cases } from './cases';
import { images } from './images';
import { members } from './people';
import { confidenceWord, domainWord, markKindWord, phaseEncodeWord } from './words';

const ofCase = () =>
  uuid('case_id')
    .notNull()
    .references(() => cases.id);
const byMember = (column: string) =>
  uuid(column)
    .notNull()
    .references(() => members.id);
const madeAt = (column = 'created_at') => timestamp(column, { withTimezone: true, mode: 'date' }).notNull().defaultNow();

export const trials = pgTable(
  'trials',
  {
    id: uuid().primaryKey().defaultRandom(),
    caseId: ofCase(),
    number: integer().notNull(),
    note: text().notNull(),
    imageId: uuid('image_id')
      .notNull()
      .references(() => images.id),
    frame: integer().notNull(),
    compareImageId: uuid('compare_image_id').references(() => images.id),
    compareFrame: integer('compare_frame'),
    phaseEncode: phaseEncodeWord('phase_encode').notNull(),
    /** What it ran with: a scan fact that is corrected later does not change what was kept. Null in trials older than this column. */
    acquisition: jsonb().$type<Acquisition>(),
    recipe: jsonb().$type<Recipe>().notNull(),
    metrics: jsonb().$type<Record<string, unknown>>().notNull(),
    digest: text().notNull(),
    imageThumbnail: text('image_thumbnail').notNull(),
    kspaceThumbnail: text('kspace_thumbnail').notNull(),
    authorId: byMember('author_id'),
    createdAt: madeAt(),
  },
  (table) => [uniqueIndex('trial_number_in_case').on(table.caseId, table.number)],
);

export const marks = pgTable(
  'marks',
  {
    id: uuid().primaryKey().defaultRandom(),
    caseId: ofCase(),
    imageId: uuid('image_id')
      .notNull()
      .references(() => images.id),
    frame: integer().notNull(),
    domain: domainWord().notNull(),
    kind: markKindWord().notNull(),
    /** [column, row] in pixels of the image. */
    points: jsonb().$type<[number, number][]>().notNull(),
    text: text().notNull(),
    authorId: byMember('author_id'),
    createdAt: madeAt(),
  },
  (table) => [index('marks_of_case').on(table.caseId)],
);

export const comments = pgTable(
  'comments',
  {
    id: uuid().primaryKey().defaultRandom(),
    caseId: ofCase(),
    text: text().notNull(),
    authorId: byMember('author_id'),
    createdAt: madeAt(),
  },
  (table) => [index('comments_of_case').on(table.caseId)],
);

/** Every version of a finding is a row; the newest is the one that stands. */
export const findings = pgTable(
  'findings',
  {
    id: uuid().primaryKey().defaultRandom(),
    caseId: ofCase(),
    version: integer().notNull(),
    cause: text(),
    confidence: confidenceWord().notNull(),
    text: text().notNull(),
    lesson: text().notNull(),
    authorId: byMember('author_id'),
    at: madeAt('at'),
  },
  (table) => [uniqueIndex('finding_version_in_case').on(table.caseId, table.version)],
);

/** A signature stands while the case is closed; after a reopening the row stays as the record that it was once given. */
export const signatures = pgTable(
  'signatures',
  {
    id: uuid().primaryKey().defaultRandom(),
    caseId: ofCase(),
    memberId: byMember('member_id'),
    at: madeAt('at'),
    attested: jsonb().$type<{ line: string; stands: boolean }[]>().notNull(),
    /** SHA-256 over `statement`. */
    digest: text().notNull(),
    /** The case as it was signed, as canonical JSON: what the digest was made of. */
    statement: text().notNull(),
  },
  (table) => [index('signatures_of_case').on(table.caseId)],
);
