/**
 * Archives in which a series may be sent: APPNOTE.TXT 6.3 of the ZIP format, sections 4.3 and 4.4. Only the list at the end of an archive is
 * believed, within limits that hold before anything is unpacked; browser and server keep to the same. Names are for telling files apart on a
 * screen: nothing is ever written under one.
 */

/** Bytes `start` to `end` of an archive that need not be in memory as a whole. */
export type ReadRange = (start: number, end: number) => Promise<Uint8Array>;

export interface ZipEntry {
  /** The last part of a path, cut to what a screen shows. */
  readonly name: string;
  readonly isEncrypted: boolean;
  /** 0 stored, 8 deflated: nothing else is unpacked. */
  readonly method: number;
  readonly crc: number;
  readonly packedSize: number;
  readonly size: number;
  /** Of its local header. */
  readonly offset: number;
}

export interface ZipLimits {
  readonly entries: number;
  readonly entryBytes: number;
  readonly totalBytes: number;
}

/** As many files as one exam has; what a file may have is the server's limit for a file. */
export const zipLimits = { entries: 2000, entryBytes: 64 * 1024 * 1024, totalBytes: 1024 * 1024 * 1024 } as const;

/** Pixels shrink to a half or a tenth, an empty image to a hundredth or so; deflate itself ends at 1032 (RFC 1951; madler, zlib technical details). */
const largestRatio = 200;
/** What is smaller than this unpacked is no danger, whatever its ratio. */
const harmlessBytes = 1024 * 1024;

/** Why an archive as a whole, or an entry of it, is not unpacked, in words for whoever sent it. */
export class ZipFault extends Error {}

export const isZip = (head: Uint8Array): boolean => head[0] === 0x50 && head[1] === 0x4b && head[2] === 3 && head[3] === 4;

const endSize = 22;
const longestComment = 0xffff;
const directoryEntrySize = 46;
const localHeaderSize = 30;
const unknown32 = 0xffffffff;

const viewOf = ({ buffer, byteOffset, byteLength }: Uint8Array): DataView => new DataView(buffer, byteOffset, byteLength);

/** The files of an archive as its directory lists them, folders left out. Throws a ZipFault where it is damaged or goes over the limits. */
export async function listZip(size: number, read: ReadRange, limits: ZipLimits = zipLimits): Promise<ZipEntry[]> {
  const { count, start, end } = await findDirectory(size, read);
  if (count > limits.entries) throw new ZipFault(`The archive lists ${count} files; at most ${limits.entries} are opened.`);
  const entries = entriesOf(await read(start, end), count);
  const files = entries.filter(({ name }) => name !== '');
  refuseOverlaps(entries, start);
  const total = files.reduce((sum, entry) => sum + entry.size, 0);
  if (total > limits.totalBytes) throw new ZipFault(`The archive unfolds to more than ${mebibytes(limits.totalBytes)} MB.`);
  return files;
}

const mebibytes = (bytes: number): number => Math.floor(bytes / 1024 / 1024);

/** Section 4.3.16: the record at the very end, behind which only a comment may stand. */
async function findDirectory(size: number, read: ReadRange): Promise<{ count: number; start: number; end: number }> {
  const from = Math.max(0, size - endSize - longestComment);
  const tail = viewOf(await read(from, size));
  for (let at = tail.byteLength - endSize; at >= 0; at--) {
    if (tail.getUint32(at, true) !== 0x06054b50 || at + endSize + tail.getUint16(at + 20, true) !== tail.byteLength) continue;
    const [count, length, start] = [tail.getUint16(at + 10, true), tail.getUint32(at + 12, true), tail.getUint32(at + 16, true)];
    if (count === 0xffff || start === unknown32)
      throw new ZipFault('The archive is in the form for very large ones (ZIP64), which is not read.');
    if (start + length > from + at || count * directoryEntrySize > length) throw damaged();
    return { count, start, end: start + length };
  }
  throw new ZipFault('The archive ends too early: its list of files is missing. Send it again.');
}

const damaged = () => new ZipFault('The archive is damaged: its list of files is not one.');

/** Section 4.3.12. */
function entriesOf(directory: Uint8Array, count: number): ZipEntry[] {
  const view = viewOf(directory);
  const entries: ZipEntry[] = [];
  let at = 0;
  for (let i = 0; i < count; i++) {
    if (at + directoryEntrySize > view.byteLength || view.getUint32(at, true) !== 0x02014b50) throw damaged();
    const nameLength = view.getUint16(at + 28, true);
    const next = at + directoryEntrySize + nameLength + view.getUint16(at + 30, true) + view.getUint16(at + 32, true);
    if (next > view.byteLength) throw damaged();
    entries.push({
      name: shownName(directory.subarray(at + directoryEntrySize, at + directoryEntrySize + nameLength)),
      isEncrypted: (view.getUint16(at + 8, true) & 0x2041) !== 0,
      method: view.getUint16(at + 10, true),
      crc: view.getUint32(at + 16, true),
      packedSize: view.getUint32(at + 20, true),
      size: view.getUint32(at + 24, true),
      offset: view.getUint32(at + 42, true),
    });
    at = next;
  }
  return entries;
}

const longestName = 255;

/** Empty for a folder. */
function shownName(bytes: Uint8Array): string {
  const path = new TextDecoder().decode(bytes);
  return (path.split(/[/\\]/).at(-1) ?? '').slice(0, longestName);
}

/** Entries that share packed bytes unfold far beyond their ratio (Fifield, A better zip bomb, WOOT 2019). */
function refuseOverlaps(entries: readonly ZipEntry[], directoryStart: number): void {
  let free = 0;
  for (const { offset, packedSize } of [...entries].sort((a, b) => a.offset - b.offset)) {
    if (offset < free) throw new ZipFault('The archive lists the same bytes twice: it is not opened.');
    free = offset + localHeaderSize + packedSize;
    if (free > directoryStart) throw damaged();
  }
}

export interface EntryFault {
  readonly code: 'encrypted' | 'archive' | 'too-large';
  readonly reason: string;
}

/** Why an entry is not unpacked; undefined where it may be. Known before a byte of it is. */
export function faultOf({ isEncrypted, method, packedSize, size }: ZipEntry, limits: ZipLimits = zipLimits): EntryFault | undefined {
  if (isEncrypted) return { code: 'encrypted', reason: 'The file is encrypted inside the archive: pack it without a password.' };
  if (method !== 0 && method !== 8)
    return { code: 'archive', reason: 'The file is packed in a way that is not read: pack it with deflate.' };
  if (size > limits.entryBytes)
    return { code: 'too-large', reason: `The file is larger than ${mebibytes(limits.entryBytes)} MB, the most that one file may have.` };
  if (method === 0 && size !== packedSize) return lyingSize;
  if (size > harmlessBytes && size > largestRatio * packedSize)
    return { code: 'archive', reason: `The file unfolds to more than ${largestRatio} times its packed size: no image does.` };
  return undefined;
}

export const lyingSize: EntryFault = {
  code: 'archive',
  reason: 'The file is not what the archive says: its size or its check sum differs.',
};
export const nestedArchive: EntryFault = { code: 'archive', reason: 'An archive inside an archive is not opened: unpack it first.' };

/** The packed bytes of an entry. Its local header says only how long itself is. */
export async function packedRange({ offset, packedSize }: ZipEntry, size: number, read: ReadRange): Promise<[start: number, end: number]> {
  const header = viewOf(await read(offset, Math.min(size, offset + localHeaderSize)));
  if (header.byteLength < localHeaderSize || header.getUint32(0, true) !== 0x04034b50) throw damaged();
  const start = offset + localHeaderSize + header.getUint16(26, true) + header.getUint16(28, true);
  if (start + packedSize > size) throw damaged();
  return [start, start + packedSize];
}

const crcTable = Uint32Array.from({ length: 256 }, (_, byte) => {
  let remainder = byte;
  for (let bit = 0; bit < 8; bit++) remainder = (remainder & 1) === 1 ? (remainder >>> 1) ^ 0xedb88320 : remainder >>> 1;
  return remainder;
});

/** The check sum of section 4.4.7: CRC-32 of ISO 3309. */
export function crc32(bytes: Uint8Array): number {
  let remainder = unknown32;
  for (const byte of bytes) remainder = (crcTable[(remainder ^ byte) & 0xff] ?? 0) ^ (remainder >>> 8);
  return (remainder ^ unknown32) >>> 0;
}
