/** Departments, their members, the sessions of the members, and the counters that slow down password guessing. */
import { bigint, index, integer, pgTable, text, timestamp, uniqueIndex, uuid, varchar } from 'drizzle-orm/pg-core';
import { sql } from 'drizzle-orm';
import { roleWord } from './words';

export const departments = pgTable('departments', {
  id: uuid().primaryKey().defaultRandom(),
  name: text().notNull(),
  /** Number of the newest case; the next one takes it plus one in the same transaction. */
  lastCaseNumber: integer('last_case_number').notNull().default(0),
});

export const members = pgTable(
  'members',
  {
    id: uuid().primaryKey().defaultRandom(),
    departmentId: uuid('department_id')
      .notNull()
      .references(() => departments.id),
    name: text().notNull(),
    email: text().notNull(),
    role: roleWord().notNull(),
    passwordHash: text('password_hash').notNull(),
  },
  (table) => [
    uniqueIndex('members_email_in_any_case').on(sql`lower(${table.email})`),
    index('members_of_department').on(table.departmentId),
  ],
);

export const sessions = pgTable(
  'sessions',
  {
    id: uuid().primaryKey().defaultRandom(),
    memberId: uuid('member_id')
      .notNull()
      .references(() => members.id),
    expiresAt: timestamp('expires_at', { withTimezone: true, mode: 'date' }).notNull(),
  },
  (table) => [index('sessions_of_member').on(table.memberId)],
);

/** Columns and their order are those that rate-limiter-flexible writes; `expire` is milliseconds since 1970. */
export const signInAttempts = pgTable('sign_in_attempts', {
  key: varchar({ length: 255 }).primaryKey(),
  points: integer().notNull().default(0),
  expire: bigint({ mode: 'number' }),
});
