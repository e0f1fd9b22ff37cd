/**
 * One file that has come in whole: a DICOM file, or a ZIP archive of them, whose files go through the same door one after the other. What is
 * accepted is stored at once, so that no more than one file's values are in memory.
 */
import type { Refusal, UploadResult } from '../contract/images';
import { faultOf, isZip, listZip, packedRange, ZipFault, zipLimits, type ReadRange, type ZipEntry, type ZipLimits } from '../contract/zip';
import type { Dependencies } from '../dependencies';
import type { Packed } from '../dicom/unpack';
import { refuse, type Refused } from '../dicom/refusal';
import { departmentKey } from '../dicom/unique-identifiers';
import { storeImages, type Origin } from './upload-images';

export type TakeDependencies = Pick<Dependencies, 'db' | 'objects' | 'workers' | 'env' | 'identityKey'>;

export interface ReceivedFile {
  readonly name: string;
  readonly size: number;
  /** Null where it was larger than the limit, and nobody kept it. */
  readonly bytes: Buffer | null;
}

const mebibyte = 1024 * 1024;

/** What became of a file, or of each file of an archive. */
export async function takeFile(deps: TakeDependencies, origin: Origin, { name, bytes }: ReceivedFile): Promise<UploadResult> {
  const { fileBytes } = deps.env.upload;
  if (bytes === null)
    return refusedAs(name, refuse('too-large', `The file is larger than ${fileBytes / mebibyte} MB, the most that one file may have.`));
  return isZip(bytes) ? takeArchive(deps, origin, name, bytes) : takeOne(deps, origin, name, bytes);
}

const refusedAs = (name: string, { refused }: Refused): UploadResult => ({ images: [], refused: [{ ...refused, name }] });

async function takeOne(deps: TakeDependencies, origin: Origin, name: string, bytes: Uint8Array, packed?: Packed): Promise<UploadResult> {
  const { workers, env, identityKey } = deps;
  const key = departmentKey(identityKey, origin.departmentId);
  const read = await workers.readDicom({ bytes, key, packed }, env.readMilliseconds);
  if (read === undefined) return refusedAs(name, refuse('too-slow', 'Reading the file took too long for its size and was stopped.'));
  if ('refused' in read) return refusedAs(name, read);
  const { fileKey } = read;
  const images = await storeImages(
    deps,
    origin,
    read.accepted.map((image) => ({ ...image, fileKey })),
  );
  return { images, refused: [] };
}

async function takeArchive(deps: TakeDependencies, origin: Origin, name: string, archive: Buffer): Promise<UploadResult> {
  const read: ReadRange = (start, end) => Promise.resolve(archive.subarray(start, end));
  const limits: ZipLimits = { ...zipLimits, entryBytes: deps.env.upload.fileBytes };
  const images: UploadResult['images'] = [];
  const refused: Refusal[] = [];
  try {
    const entries = await listZip(archive.byteLength, read, limits);
    if (entries.length === 0) throw new ZipFault('The archive holds no file.');
    for (const entry of entries) {
      const result = await takeEntry(deps, origin, { archive, read, entry, limits });
      images.push(...result.images);
      refused.push(...result.refused);
    }
  } catch (error) {
    if (!(error instanceof ZipFault)) throw error;
    refused.push({ name, code: 'archive', reason: error.message });
  }
  return { images, refused };
}

interface ArchivedFile extends Packed {
  readonly archive: Buffer;
  readonly read: ReadRange;
  readonly entry: ZipEntry;
}

async function takeEntry(deps: TakeDependencies, origin: Origin, file: ArchivedFile): Promise<UploadResult> {
  const { archive, read, entry, limits } = file;
  const fault = faultOf(entry, limits);
  if (fault !== undefined) return refusedAs(entry.name, refuse(fault.code, fault.reason));
  const [start, end] = await packedRange(entry, archive.byteLength, read);
  // A copy of its own: a message to a thread takes the whole memory behind a view along.
  return takeOne(deps, origin, entry.name, new Uint8Array(archive.subarray(start, end)), { entry, limits });
}
