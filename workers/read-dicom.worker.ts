/** Reads one DICOM file on a worker thread. Message in: the bytes of a file; out: `Read`, its values transferred, not copied. */
import { move, transferableSymbol, valueSymbol } from 'piscina';
import { readDicom, type Read } from '../server/dicom/read';

/** A result whose buffer piscina hands over instead of copying it. */
const handedOver = (read: Read, buffer: ArrayBuffer) => move({ [transferableSymbol]: buffer, [valueSymbol]: read });

export default function readDicomTask(bytes: Uint8Array): ReturnType<typeof handedOver> | Read {
  const read = readDicom(bytes);
  return 'refused' in read ? read : handedOver(read, read.accepted.values.buffer);
}
