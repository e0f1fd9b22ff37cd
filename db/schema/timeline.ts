/** The timeline of a case: who did what, when. Rows are only ever added; a trigger refuses everything else. */
import { bigserial, index, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { cases } from './cases';
import { members } from './people';
import { caseStateWord, eventKindWord } from './words';

export const timelineEvents = pgTable(
  'timeline_events',
  {
    id: uuid().primaryKey().defaultRandom(),
    /** Order of writing: two events may share a time. */
    sequence: bigserial({ mode: 'number' }).notNull(),
    caseId: uuid('case_id')
      .notNull()
      .references(() => cases.id),
    at: timestamp({ withTimezone: true, mode: 'date' }).notNull().defaultNow(),
    actorId: uuid('actor_id')
      .notNull()
      .references(() => members.id),
    kind: eventKindWord().notNull(),
    from: caseStateWord('from_state'),
    to: caseStateWord('to_state'),
    text: text().notNull(),
  },
  (table) => [index('timeline_of_case').on(table.caseId, table.sequence)],
);
