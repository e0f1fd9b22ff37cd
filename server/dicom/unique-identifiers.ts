/**
 * Unique identifiers lead back to the exam, so none is kept. What is kept is a keyed hash: the same identifier gives the same hash in one
 * department, so that the slices of a series find each other, and nobody without the key gets from one to the other.
 * Form: DICOM PS3.5 annex B.2 (2.25. and a 128-bit number in decimals); action U of PS3.15 table E.1-1.
 */
import { createHmac } from 'node:crypto';
import type { AttributeName } from './allow-list';

/** The identifiers of a file of which a hash is kept. */
export const identifierNames = [
  'studyInstance',
  'seriesInstance',
  'frameOfReference',
  'sopInstance',
] as const satisfies readonly AttributeName[];
export type IdentifierName = (typeof identifierNames)[number];

export interface UniqueIdentifiers {
  readonly study: string | null;
  readonly series: string | null;
  readonly frameOfReference: string | null;
  readonly image: string | null;
}

/** The key of a department: of the server's own key and the department's id. */
export const departmentKey = (identityKey: Uint8Array, departmentId: string): Uint8Array =>
  createHmac('sha256', identityKey).update(`department ${departmentId}`).digest();

/** What stands for a file that was sent, of the SHA-256 of its bytes in hexadecimal. */
export const fileKeyOf = (key: Uint8Array, digest: string): string => createHmac('sha256', key).update(`file ${digest}`).digest('hex');

/** An identifier of ours in the place of `uid`: at most 44 characters. */
export function replacedUid(key: Uint8Array, uid: string): string {
  const hash = createHmac('sha256', key).update(`uid ${uid}`).digest('hex');
  return `2.25.${BigInt(`0x${hash.slice(0, 32)}`)}`;
}
