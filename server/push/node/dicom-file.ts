/**
 * A data set that came over the network as a DICOM file: preamble, prefix, and as much file meta information as says how the data set is
 * written (DICOM PS3.10 section 7.1). The identifiers of the message are left out: the data set has them, and the door replaces them there.
 */

const preambleLength = 128;
const transferSyntaxTag = Buffer.from([0x02, 0x00, 0x10, 0x00]);
const groupLengthTag = Buffer.from([0x02, 0x00, 0x00, 0x00]);

function elementOf(tag: Buffer, vr: 'UI' | 'UL', value: Buffer): Buffer {
  const length = Buffer.alloc(2);
  length.writeUInt16LE(value.length);
  return Buffer.concat([tag, Buffer.from(vr, 'latin1'), length, value]);
}

/** What stands before the data set in a file. */
function headOf(transferSyntax: string): Buffer {
  // UIDs are padded to an even length with a zero byte (PS3.5 section 9).
  const padded = transferSyntax.length % 2 === 0 ? transferSyntax : `${transferSyntax}\0`;
  const meta = elementOf(transferSyntaxTag, 'UI', Buffer.from(padded, 'latin1'));
  const length = Buffer.alloc(4);
  length.writeUInt32LE(meta.length);
  return Buffer.concat([Buffer.alloc(preambleLength), Buffer.from('DICM', 'latin1'), elementOf(groupLengthTag, 'UL', length), meta]);
}

/** A buffer of its own, to be handed over to another thread. */
export function dicomFile(transferSyntax: string, dataSet: readonly Buffer[]): Uint8Array<ArrayBuffer> {
  const parts = [headOf(transferSyntax), ...dataSet];
  const bytes = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  let offset = 0;
  for (const part of parts) {
    bytes.set(part, offset);
    offset += part.length;
  }
  return bytes;
}
