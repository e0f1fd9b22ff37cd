/** Units of a sender, written out by hand after DICOM PS3.8 section 9.3 and PS3.7 annex E: also such as no library would write. */

const item = (type: number, content: Buffer): Buffer => {
  const head = Buffer.from([type, 0, 0, 0]);
  head.writeUInt16BE(content.length, 2);
  return Buffer.concat([head, content]);
};

const unit = (type: number, content: Buffer): Buffer => {
  const head = Buffer.from([type, 0, 0, 0, 0, 0]);
  head.writeUInt32BE(content.length, 2);
  return Buffer.concat([head, content]);
};

const mrImageStorage = '1.2.840.10008.5.1.4.1.1.4';
const explicitLittleEndian = '1.2.840.10008.1.2.1';

/** A-ASSOCIATE-RQ with one context, number 1: MR images, explicit little endian. */
export function associate(calling: string, called = 'PICKGLASS', implementation = 'HANDMADE'): Buffer {
  const maximum = Buffer.alloc(4);
  maximum.writeUInt32BE(16_384);
  const context = [Buffer.from([1, 0, 0, 0]), item(0x30, Buffer.from(mrImageStorage)), item(0x40, Buffer.from(explicitLittleEndian))];
  const user = [item(0x51, maximum), item(0x52, Buffer.from('1.2.3.4')), item(0x55, Buffer.from(implementation))];
  return unit(
    1,
    Buffer.concat([
      Buffer.from([0, 1, 0, 0]),
      Buffer.from(called.padEnd(16)),
      Buffer.from(calling.padEnd(16)),
      Buffer.alloc(32),
      item(0x10, Buffer.from('1.2.840.10008.3.1.1.1')),
      item(0x20, Buffer.concat(context)),
      item(0x50, Buffer.concat(user)),
    ]),
  );
}

function fragment(context: number, flags: number, value: Buffer): Buffer {
  const head = Buffer.alloc(6);
  head.writeUInt32BE(value.length + 2);
  head.writeUInt8(context, 4);
  head.writeUInt8(flags, 5);
  return unit(4, Buffer.concat([head, value]));
}

export const data = (context: number, value: Buffer, last = true): Buffer => fragment(context, last ? 2 : 0, value);
export const command = (value: Buffer, last = true): Buffer => fragment(1, last ? 3 : 1, value);

function element(number: number, value: Buffer): Buffer {
  const head = Buffer.alloc(8);
  head.writeUInt16LE(number, 2);
  head.writeUInt32LE(value.length, 4);
  return Buffer.concat([head, value]);
}

const uint16 = (value: number): Buffer => Buffer.from([value & 255, value >> 8]);
const padded = (text: string): Buffer => Buffer.from(text.length % 2 === 0 ? text : `${text}\0`);

/** A C-STORE request, or with another field what else a data set may follow. */
export const storeCommand = (field = 0x0001, originator = 'NOBODY'): Buffer =>
  Buffer.concat([
    element(0x0002, padded(mrImageStorage)),
    element(0x0100, uint16(field)),
    element(0x0110, uint16(1)),
    element(0x0700, uint16(0)),
    element(0x0800, uint16(1)),
    element(0x1000, padded('1.2.3.4.5')),
    element(0x1030, padded(originator)),
  ]);
