/** ZIP archives for tests, written out field by field (APPNOTE.TXT 6.3, sections 4.3.7, 4.3.12 and 4.3.16), so that each can lie. */
import { crc32, deflateRawSync } from 'node:zlib';

export interface FileToPack {
  readonly name: string;
  readonly bytes: Buffer;
  readonly stored?: boolean;
  readonly encrypted?: boolean;
  /** What the archive says instead of the truth. */
  readonly says?: { readonly size?: number; readonly crc?: number; readonly offset?: number };
}

const record = (signature: number, ...fields: [bytes: 2 | 4, value: number][]): Buffer => {
  const buffer = Buffer.alloc(4 + fields.reduce((sum, [bytes]) => sum + bytes, 0));
  let at = buffer.writeUInt32LE(signature, 0);
  for (const [bytes, value] of fields) at = bytes === 2 ? buffer.writeUInt16LE(value, at) : buffer.writeUInt32LE(value, at);
  return buffer;
};

/** Version, flags, method, time, date, check sum, sizes and the length of the name: the same in both headers. */
function common({ name, bytes, stored = false, encrypted = false, says = {} }: FileToPack, packed: Buffer): [2 | 4, number][] {
  return [
    ...([
      [2, 20],
      [2, encrypted ? 1 : 0],
      [2, stored ? 0 : 8],
      [2, 0],
      [2, 0],
    ] as [2, number][]),
    [4, says.crc ?? crc32(bytes)],
    [4, packed.length],
    [4, says.size ?? bytes.length],
    [2, Buffer.byteLength(name)],
    [2, 0],
  ];
}

export function zipOf(files: readonly FileToPack[]): Buffer {
  const parts: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const file of files) {
    const packed = file.stored ? file.bytes : deflateRawSync(file.bytes);
    const name = Buffer.from(file.name);
    const place: [2 | 4, number][] = [
      [2, 0],
      [2, 0],
      [2, 0],
      [4, 0],
      [4, file.says?.offset ?? offset],
    ];
    directory.push(record(0x02014b50, [2, 20], ...common(file, packed), ...place), name);
    const local = [record(0x04034b50, ...common(file, packed)), name, packed];
    parts.push(...local);
    offset += local.reduce((sum, part) => sum + part.length, 0);
  }
  const size = directory.reduce((sum, part) => sum + part.length, 0);
  const end = record(0x06054b50, [2, 0], [2, 0], [2, files.length], [2, files.length], [4, size], [4, offset], [2, 0]);
  return Buffer.concat([...parts, ...directory, end]);
}
