/** Reads one DICOM file on a worker thread. Message in: the bytes of a file and a key; out: `Read`, its values transferred, not copied.
 *  The decoders are opened with the thread, before its first file. */
import { move, transferableSymbol, valueSymbol } from 'piscina';
import { openDecoders } from '../server/dicom/codecs/decoders';
import { auditedRead } from '../server/dicom/profile/stored';
import { readDicom, type Read } from '../server/dicom/read';

export interface ReadDicomJob {
  readonly bytes: Uint8Array;
  /** The department's, for unique identifiers. */
  readonly key: Uint8Array;
}

/** A result whose buffers piscina hands over instead of copying them. */
const handedOver = (read: Read, buffers: ArrayBuffer[]) => move({ [transferableSymbol]: buffers, [valueSymbol]: read });

let decoders = openDecoders();

export default async function readDicomTask({ bytes, key }: ReadDicomJob): Promise<ReturnType<typeof handedOver> | Read> {
  if ((await decoders).worn()) decoders = openDecoders();
  const read = auditedRead(readDicom(bytes, key, await decoders));
  if ('refused' in read) return read;
  return handedOver(
    read,
    read.accepted.map(({ values }) => values.buffer),
  );
}
