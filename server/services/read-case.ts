/** A case as the asking member sees it, and the list of cases. */
import { findCaseOf, findFinding, findSignature, listCaseImages, type selectCases } from '../../db/queries/cases';
import { countCasesOf, findCasesOf } from '../../db/queries/find-cases';
import type { Database } from '../../db/client';
import { caseStates, type listCases, type Case, type CaseSummary } from '../contract/cases';
import { AppError } from '../errors';
import type { z } from 'zod';
import { permissions } from './case-life';
import type { Caller } from './sessions';

type CaseWithNames = Awaited<ReturnType<typeof selectCases>>[number];
type CaseImageRow = Awaited<ReturnType<typeof listCaseImages>>[number];

/** The case, or `not-found`: also where it is another department's. */
export async function readCase(db: Database, caller: Caller, caseId: string): Promise<Case> {
  const found = await findCaseOf(db, caller.departmentId, caseId);
  if (found === undefined) throw new AppError('not-found');
  const images = await listCaseImages(db, [caseId]);
  const finding = await findFinding(db, caseId);
  const signature = found.row.state === 'closed' ? await findSignature(db, caseId) : undefined;
  const { version, howOften, cost, bodyRegion, protocol, description, tried, seenOn, state } = found.row;
  return {
    ...summarise(found, images),
    ...{ version, howOften, cost, bodyRegion, protocol, description, tried, seenOn },
    reporter: found.reporter,
    images: images.map(({ imageId, role, addedAt }) => ({ imageId, role, addedAt: addedAt.toISOString() })),
    finding: finding ? describeFinding(finding) : null,
    signature: signature ? describeSignature(signature) : null,
    may: permissions(caller.role, { state, hasFinding: finding !== undefined }),
  };
}

/** One page of the department's cases, with how many there are in each state. */
export async function findCases(
  db: Database,
  caller: Caller,
  query: z.output<typeof listCases.query>,
): Promise<z.input<typeof listCases.output>> {
  const { order, descending, offset, limit, ...filter } = query;
  const found = await findCasesOf(db, caller.departmentId, filter, { order, descending: descending === 'true', offset, limit });
  const images = await listCaseImages(
    db,
    found.map(({ row }) => row.id),
  );
  const counted = await countCasesOf(db, caller.departmentId, filter);
  const countIn = (state: (typeof caseStates)[number]): number => counted.find((row) => row.state === state)?.total ?? 0;
  const chosen = caseStates.filter((state) => {
    if (filter.state === undefined) return true;
    return filter.state === 'open' ? state !== 'closed' : state === filter.state;
  });
  return {
    cases: found.map((one) =>
      summarise(
        one,
        images.filter(({ caseId }) => caseId === one.row.id),
      ),
    ),
    total: chosen.reduce((sum, state) => sum + countIn(state), 0),
    counts: {
      reported: countIn('reported'),
      'under-investigation': countIn('under-investigation'),
      'awaiting-sign-off': countIn('awaiting-sign-off'),
      closed: countIn('closed'),
    },
  };
}

function summarise({ row, scanner, coil, assignee }: CaseWithNames, images: CaseImageRow[]): CaseSummary {
  const { id, number, title, state, seen, direction, openedAt, updatedAt } = row;
  const picture = images.find(({ role }) => role === 'bad') ?? images[0];
  return {
    ...{ id, number, title, state, seen, direction, scanner, coil, assignee },
    pictureImageId: picture?.imageId ?? null,
    openedAt: openedAt.toISOString(),
    updatedAt: updatedAt.toISOString(),
  };
}

function describeFinding({ finding, author }: NonNullable<Awaited<ReturnType<typeof findFinding>>>): NonNullable<Case['finding']> {
  const { cause, confidence, text, lesson, at } = finding;
  return { cause, confidence, text, lesson, author, at: at.toISOString() };
}

function describeSignature({ signature, member }: NonNullable<Awaited<ReturnType<typeof findSignature>>>): NonNullable<Case['signature']> {
  const { at, attested, digest } = signature;
  return { member, at: at.toISOString(), attested, digest };
}
