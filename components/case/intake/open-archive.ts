/**
 * A zip opened in the browser, so that progress and resumption go file by file. The archive is never in memory as a whole: the list at its end
 * is read, and each file is cut out and unpacked by the browser (Compression Streams) when its turn comes, up to the size that the list says.
 */
import {
  crc32,
  faultOf,
  isZip,
  listZip,
  lyingSize,
  nestedArchive,
  packedRange,
  ZipFault,
  type EntryFault,
  type ReadRange,
  type ZipEntry,
} from '@/server/contract/zip';
import type { Refusal } from '@/server/contract/images';
import type { FileToSend } from './file-to-send';

export const isArchive = async (file: Blob): Promise<boolean> => isZip(await bytesOf(file.slice(0, 4)));

/** Where the browser cannot unpack, an archive is sent as it is and opened by the server. */
export const canUnpack = (): boolean => 'DecompressionStream' in window;

const bytesOf = async (blob: Blob): Promise<Uint8Array<ArrayBuffer>> => new Uint8Array(await blob.arrayBuffer());

/** The files of an archive, or why it is not opened. */
export async function openArchive(archive: File): Promise<readonly FileToSend[] | Refusal> {
  const read: ReadRange = (start, end) => bytesOf(archive.slice(start, end));
  try {
    const entries = await listZip(archive.size, read);
    if (entries.length === 0) throw new ZipFault('The archive holds no file.');
    return entries.map((entry) => ({ name: entry.name, size: entry.size, open: () => openEntry(archive, entry, read) }));
  } catch (error) {
    if (error instanceof ZipFault) return { name: archive.name, code: 'archive', reason: error.message };
    throw error;
  }
}

async function openEntry(archive: File, entry: ZipEntry, read: ReadRange): Promise<File | Refusal> {
  const refused = ({ code, reason }: EntryFault): Refusal => ({ name: entry.name, code, reason });
  const fault = faultOf(entry);
  if (fault !== undefined) return refused(fault);
  try {
    const [start, end] = await packedRange(entry, archive.size, read);
    const packed = archive.slice(start, end);
    const bytes = entry.method === 0 ? await bytesOf(packed) : await inflateTo(packed, entry.size);
    if (bytes === undefined || crc32(bytes) !== entry.crc) return refused(lyingSize);
    return isZip(bytes) ? refused(nestedArchive) : new File([bytes], entry.name);
  } catch (error) {
    if (error instanceof ZipFault) return refused({ code: 'archive', reason: error.message });
    throw error;
  }
}

/** Unpacks into memory of exactly the size that was said; undefined where there is more or less of it, or it is no deflated data. */
async function inflateTo(packed: Blob, size: number): Promise<Uint8Array<ArrayBuffer> | undefined> {
  const bytes = new Uint8Array(size);
  const reader = packed.stream().pipeThrough(new DecompressionStream('deflate-raw')).getReader();
  let filled = 0;
  try {
    for (let part = await reader.read(); !part.done; part = await reader.read()) {
      if (filled + part.value.byteLength > size) {
        await reader.cancel();
        return undefined;
      }
      bytes.set(part.value, filled);
      filled += part.value.byteLength;
    }
  } catch (error) {
    // What the Compression Streams standard throws at damaged data.
    if (error instanceof TypeError) return undefined;
    throw error;
  }
  return filled === size ? bytes : undefined;
}
