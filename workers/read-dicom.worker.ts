/** Reads one file, DICOM or raw data, on a worker thread. Message in: the bytes of a file and a key; out: `Read`, its values transferred, not
 *  copied. The decoders are opened with the thread, before its first file; HDF5 with the first file that needs it. */
import { move, transferableSymbol, valueSymbol } from 'piscina';
import { openDecoders } from '../server/dicom/codecs/decoders';
import { auditedRead } from '../server/dicom/profile/stored';
import { readDicom, type Read } from '../server/dicom/read';
import { isRefused } from '../server/dicom/refusal';
import { unpack, type Packed } from '../server/dicom/unpack';
import { openHdf5, type Hdf5 } from '../server/mrd/hdf5';
import { readMrd } from '../server/mrd/read';
import { isHdf5 } from '../server/mrd/signature';

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
let hdf5: Promise<Hdf5> | undefined;

export default async function readDicomTask({ bytes: sent, key, packed }: ReadDicomJob): Promise<ReturnType<typeof handedOver> | Read> {
  const bytes = packed ? unpack(sent, packed) : sent;
  if (isRefused(bytes)) return bytes;
  const read = auditedRead(isHdf5(bytes) ? await readRawData(bytes, key) : await readImages(bytes, key));
  if ('refused' in read) return read;
  return handedOver(
    read,
    read.accepted.map(({ values }) => values.buffer),
  );
}

async function readImages(bytes: Uint8Array, key: Uint8Array): Promise<Read> {
  if ((await decoders).worn()) decoders = openDecoders();
  return readDicom(bytes, key, await decoders);
}

/** An instance that a file has worn out is replaced between files. */
async function readRawData(bytes: Uint8Array, key: Uint8Array): Promise<Read> {
  hdf5 ??= openHdf5();
  const opened = await hdf5;
  const read = readMrd(bytes, key, opened);
  if (opened.worn()) hdf5 = openHdf5();
  return read;
}
