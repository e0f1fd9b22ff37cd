/**
 * What a scanner sent goes through the same door as an upload, with the same limits and refusals, and into the scanner's inbox. The bytes
 * live in memory only, until they are read.
 */
import { isInInbox } from '../../db/queries/inbox';
import { noteReceived, noteRefused } from '../../db/queries/push';
import type { NewImage } from '../../db/queries/images';
import { isQueueFull } from '../../workers/pool';
import type { PushRefusal } from '../contract/push';
import type { Dependencies } from '../dependencies';
import { departmentKey, fileKeyOf } from '../dicom/unique-identifiers';
import { storeImages } from '../services/upload-images';
import { sha256 } from '../storage/disk-objects';
import type { SendingScanner } from './tokens';

export type PushDependencies = Pick<Dependencies, 'db' | 'objects' | 'workers' | 'env' | 'identityKey'>;

/** Why an object was not taken; null where it was. */
export type Received = { readonly refused: PushRefusal; readonly reason: string } | null;

/** Takes one DICOM file; null stands for one that was larger than the limit, whose bytes nobody kept. */
export async function receiveObject(
  deps: PushDependencies,
  scanner: SendingScanner,
  bytes: Uint8Array | null,
  arrival: NewImage['arrival'],
): Promise<Received> {
  const received = await readAndStore(deps, scanner, bytes, arrival);
  if (typeof received !== 'number') await noteRefused(deps.db, scanner.scannerId, received.refused);
  else if (received > 0) await noteReceived(deps.db, scanner.scannerId, received);
  return typeof received === 'number' ? null : received;
}

/** The number of images that are new. */
async function readAndStore(
  deps: PushDependencies,
  { scannerId, departmentId }: SendingScanner,
  bytes: Uint8Array | null,
  arrival: NewImage['arrival'],
): Promise<number | NonNullable<Received>> {
  const { db, workers, env } = deps;
  if (bytes === null) return { refused: 'too-large', reason: `larger than ${env.upload.fileBytes / 1024 / 1024} MB` };
  const key = departmentKey(deps.identityKey, departmentId);
  const fileKey = fileKeyOf(key, sha256(bytes));
  // A scanner that had no answer sends the whole series once more.
  if (await isInInbox(db, scannerId, fileKey)) return 0;
  try {
    const read = await workers.readDicom({ bytes, key }, env.readMilliseconds);
    if (read === undefined) return { refused: 'too-slow', reason: 'reading it took too long' };
    if ('refused' in read) return { refused: read.refused.code, reason: read.refused.reason };
    const accepted = read.accepted.map((image) => ({ ...image, fileKey }));
    const images = await storeImages(deps, { departmentId, memberId: null, arrival, scannerId }, accepted);
    return images.length;
  } catch (error) {
    if (isQueueFull(error)) return { refused: 'busy', reason: 'too many files are waiting' };
    throw error;
  }
}
