/** Signing off: the physicist's statement over the case as it stands, sealed with SHA-256. */
import type { Database } from '../../db/client';
import { addFinding, addSignature, findFinding, listCaseImages, type CaseRow } from '../../db/queries/cases';
import { listMarksOf, listTrialsOf } from '../../db/queries/case-parts';
import type { Transition } from '../contract/case-parts';
import { invalidAt } from '../errors';
import { sha256 } from '../storage/disk-objects';
import type { Caller } from './sessions';

type SignOff = Extract<Transition, { action: 'sign-off' }>;

/** Stores the signature and returns its digest. The typed case number must be this case's. */
export async function signCase(db: Database, caller: Caller, row: CaseRow, signOff: SignOff): Promise<string> {
  if (signOff.caseNumber !== row.number) throw invalidAt(['caseNumber'], `this is case ${row.number}; type that number to sign it`);
  await settleFinding(db, caller, row.id, signOff);
  const at = new Date();
  const statement = canonicalJson(await statementOf(db, caller, row, { at, attested: signOff.attested }));
  const digest = sha256(statement);
  await addSignature(db, { caseId: row.id, memberId: caller.memberId, at, attested: signOff.attested, digest, statement });
  return digest;
}

/** Confidence and lesson given at the signature become a new version of the finding, where they differ from the one that stands. */
async function settleFinding(db: Database, caller: Caller, caseId: string, { confidence, lesson }: SignOff): Promise<void> {
  const standing = (await findFinding(db, caseId))?.finding;
  if (standing === undefined || (standing.confidence === confidence && standing.lesson === lesson)) return;
  await addFinding(db, { caseId, cause: standing.cause, text: standing.text, confidence, lesson, authorId: caller.memberId });
}

/** Everything that the signature vouches for. Pixels enter by the digests of their values, trials by those of their planes. */
async function statementOf(db: Database, caller: Caller, row: CaseRow, given: { at: Date; attested: SignOff['attested'] }) {
  const { updatedAt: _updated, state: _state, version: _version, ...fields } = row;
  const finding = (await findFinding(db, row.id))?.finding;
  const images = await listCaseImages(db, [row.id]);
  const trials = await listTrialsOf(db, row.id);
  const marks = await listMarksOf(db, row.id);
  return {
    case: fields,
    finding,
    images: images.map(({ imageId, role, valuesDigest }) => ({ imageId, role, valuesDigest })),
    trials: trials.map(({ trial }) => ({ number: trial.number, recipe: trial.recipe, metrics: trial.metrics, digest: trial.digest })),
    marks: marks.map(({ mark }) => ({ imageId: mark.imageId, domain: mark.domain, kind: mark.kind, points: mark.points, text: mark.text })),
    signedBy: { id: caller.memberId, name: caller.name, role: caller.role },
    at: given.at,
    attested: given.attested,
  };
}

/** JSON with the keys of every object in order, so that equal contents give equal bytes. */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, part: unknown) => {
    if (typeof part !== 'object' || part === null || Array.isArray(part)) return part;
    return Object.fromEntries(Object.entries(part).sort(([a], [b]) => (a < b ? -1 : 1)));
  });
}
