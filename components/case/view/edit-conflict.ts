/**
 * Two people change a case at once. The later one keeps what was typed and is shown, field by field, what stands there now; saving
 * again then writes over the newer version knowingly.
 */
import type { Case } from '@/server/contract/cases';

export interface CaseDraft {
  readonly title: string;
  readonly scannerId: string;
  readonly coilId: string;
  readonly seen: Case['seen'];
  readonly direction: Case['direction'];
  readonly howOften: Case['howOften'];
  readonly cost: Case['cost'];
  readonly bodyRegion: string;
  readonly protocol: string;
  readonly description: string;
  readonly tried: string;
  readonly seenOn: string;
}

export const draftOf = (found: Case): CaseDraft => ({
  title: found.title,
  scannerId: found.scanner?.id ?? '',
  coilId: found.coil?.id ?? '',
  seen: found.seen,
  direction: found.direction,
  howOften: found.howOften,
  cost: found.cost,
  bodyRegion: found.bodyRegion,
  protocol: found.protocol,
  description: found.description,
  tried: found.tried,
  seenOn: found.seenOn ?? '',
});

const text = (value: string | readonly string[]): string => (typeof value === 'string' ? value : [...value].sort().join(','));

/** Fields that a person changed from what they started with. Only these are sent, so that nobody undoes another's field by accident. */
export const changedFields = (start: CaseDraft, typed: CaseDraft): (keyof CaseDraft)[] =>
  (Object.keys(start) as (keyof CaseDraft)[]).filter((name) => text(start[name]) !== text(typed[name]));

/** Fields that both sides changed, to different values: the ones to decide about. */
export const contestedFields = (start: CaseDraft, typed: CaseDraft, newest: CaseDraft): (keyof CaseDraft)[] =>
  changedFields(start, typed).filter((name) => text(newest[name]) !== text(start[name]) && text(newest[name]) !== text(typed[name]));

/** The body of the change: the changed fields, with null where a choice or a day is empty. */
export function changeOf(start: CaseDraft, typed: CaseDraft) {
  const names = changedFields(start, typed);
  const nullable = new Set<keyof CaseDraft>(['scannerId', 'coilId', 'seenOn']);
  return Object.fromEntries(names.map((name) => [name, nullable.has(name) && typed[name] === '' ? null : typed[name]]));
}
