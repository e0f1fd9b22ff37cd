/**
 * Finding cases. Every word of the query must occur somewhere in what is written about a case: title, description, what was tried,
 * protocol, body region, number, names of scanner and coil, the finding that stands, marks and comments. Words are parts of
 * words, in any case of letters (PostgreSQL ILIKE), so that a search works while it is being typed; a department has thousands of
 * cases, not millions, and reads them in milliseconds without an index for it.
 */
import { and, arrayContains, asc, count, desc, eq, ne, sql, type SQL } from 'drizzle-orm';
import type { Database } from '../client';
import { comments, findings, marks } from '../schema/case-parts';
import { cases } from '../schema/cases';
import { coils, scanners } from '../schema/scanners';
import { selectCases, type CaseRow } from './cases';

export interface CaseFilter {
  readonly q?: string | undefined;
  readonly state?: CaseRow['state'] | 'open' | undefined;
  readonly scannerId?: string | undefined;
  readonly seen?: CaseRow['seen'][number] | undefined;
  /** The cause of the finding that stands. */
  readonly cause?: string | undefined;
}

export interface CasePage {
  readonly order: 'age' | 'number' | 'title' | 'state';
  readonly descending: boolean;
  readonly offset: number;
  readonly limit: number;
}

const written = sql`concat_ws(E'\n', ${cases.title}, ${cases.description}, ${cases.tried}, ${cases.protocol}, ${cases.bodyRegion},
  '#' || ${cases.number}, ${scanners.name}, ${coils.name},
  (select ${findings.text} || E'\n' || ${findings.lesson} from ${findings}
    where ${findings.caseId} = ${cases.id} order by ${findings.version} desc limit 1),
  (select string_agg(${marks.text}, E'\n') from ${marks} where ${marks.caseId} = ${cases.id}),
  (select string_agg(${comments.text}, E'\n') from ${comments} where ${comments.caseId} = ${cases.id}))`;

/** The cause of the finding that stands: an earlier one was replaced. */
const foundCause = sql`(select ${findings.cause} from ${findings}
    where ${findings.caseId} = ${cases.id} order by ${findings.version} desc limit 1)`;

/** `%` and `_` of a typed word are letters, not wildcards. */
const asPattern = (word: string): string => `%${word.replace(/[\\%_]/g, (letter) => `\\${letter}`)}%`;

function matching(departmentId: string, { q, scannerId, seen, cause }: CaseFilter): SQL | undefined {
  const words = (q ?? '').split(/\s+/).filter((word) => word !== '');
  return and(
    eq(cases.departmentId, departmentId),
    scannerId === undefined ? undefined : eq(cases.scannerId, scannerId),
    seen === undefined ? undefined : arrayContains(cases.seen, [seen]),
    cause === undefined ? undefined : sql`${foundCause} = ${cause}`,
    ...words.map((word) => sql`${written} ilike ${asPattern(word)}`),
  );
}

const inState = (state: CaseFilter['state']): SQL | undefined => {
  if (state === undefined) return undefined;
  return state === 'open' ? ne(cases.state, 'closed') : eq(cases.state, state);
};

/** Ascending age is youngest first. */
function ordering({ order, descending }: CasePage): SQL[] {
  const up = descending ? desc : asc;
  const down = descending ? asc : desc;
  const byAge = down(cases.openedAt);
  const first = { age: byAge, number: up(cases.number), title: up(sql`lower(${cases.title})`), state: up(cases.state) }[order];
  return [first, down(cases.number)];
}

/** One page of the cases that match. */
export async function findCasesOf(db: Database, departmentId: string, filter: CaseFilter, page: CasePage) {
  return selectCases(db)
    .where(and(matching(departmentId, filter), inState(filter.state)))
    .orderBy(...ordering(page))
    .offset(page.offset)
    .limit(page.limit);
}

/** How many cases match in each state, whatever state the filter names. */
export async function countCasesOf(db: Database, departmentId: string, filter: CaseFilter) {
  return db
    .select({ state: cases.state, total: count() })
    .from(cases)
    .leftJoin(scanners, eq(scanners.id, cases.scannerId))
    .leftJoin(coils, eq(coils.id, cases.coilId))
    .where(matching(departmentId, filter))
    .groupBy(cases.state);
}
