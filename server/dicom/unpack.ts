/** A file out of a ZIP archive, unpacked up to the size that the archive says it has: one that goes on after that is refused unseen. */
import { inflateRawSync } from 'node:zlib';
import { crc32, faultOf, isZip, lyingSize, nestedArchive, type EntryFault, type ZipEntry, type ZipLimits } from '../contract/zip';
import { refuse, type Refused } from './refusal';

export interface Packed {
  readonly entry: ZipEntry;
  readonly limits: ZipLimits;
}

const refused = ({ code, reason }: EntryFault): Refused => refuse(code, reason);

/** `bytes` are the packed ones. */
export function unpack(bytes: Uint8Array, { entry, limits }: Packed): Uint8Array | Refused {
  const fault = faultOf(entry, limits);
  if (fault !== undefined) return refused(fault);
  const unpacked = entry.method === 0 ? bytes : inflateTo(bytes, entry.size);
  if (unpacked === undefined || unpacked.byteLength !== entry.size || crc32(unpacked) !== entry.crc) return refused(lyingSize);
  return isZip(unpacked) ? refused(nestedArchive) : unpacked;
}

function inflateTo(bytes: Uint8Array, size: number): Uint8Array | undefined {
  try {
    return inflateRawSync(bytes, { maxOutputLength: Math.max(1, size) });
  } catch {
    // Longer than it says, or no deflated data at all: either way it is not what the archive says.
    return undefined;
  }
}
