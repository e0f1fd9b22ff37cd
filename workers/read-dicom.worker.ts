/** Reads one DICOM file on a worker thread. Message in: the bytes of a file and a key; out: `Read`, its values transferred, not copied.
 *  The decoders are opened with the thread, before its first file. */
import { move, transferableSymbol, valueSymbol } from 'piscina';
import { openDecoders } from '../server/dicom/codecs/decoders';
import { auditedRead } from '../server/dicom/profile/stored';
import { readDicom, type Read } from '../server/dicom/read';
import { isRefused } from '../server/dicom/refusal';
import { unpack, type Packed } from '../server/dicom/unpack';

export interface ReadDicomJob {
  readonly bytes: Uint8Array;
  /** The department's, for unique identifiers. */
  readonly key: Uint8Array;
  /** Where the bytes are those of a file in an archive. */
  readonly packed?: Packed | undefined;
}

/** A result whose buffers piscina hands over instead of copying them. */
const handedOver = (read: Read, buffers: ArrayBuffer[]) => move({ [transferableSymbol]: buffers, [valueSymbol]: read });

let decoders = openDecoders();

export default async function readDicomTask({ bytes: sent, key, packed }: ReadDicomJob): Promise<ReturnType<typeof handedOver> | Read> {
  const bytes = packed ? unpack(sent, packed) : sent;
  if (isRefused(bytes)) return bytes;
  if ((await decoders).worn()) decoders = openDecoders();
  const read = auditedRead(readDicom(bytes, key, await decoders));
  if ('refused' in read) return read;
  return handedOver(
    read,
    read.accepted.map(({ values }) => values.buffer),
  );
}
