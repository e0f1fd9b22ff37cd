/**
 * Arrays as NumPy's .npy files, format version 1.0: a magic string, the length of a header, the header as a Python literal padded with
 * spaces to a multiple of 64, the values in row order, little-endian. Source: NumPy Enhancement Proposal 1.
 */

/** `<f4`: float32. `<c8`: complex64, re and im in turn. */
export type NpyType = '<f4' | '<c8';

const magic = Uint8Array.of(0x93, ...new TextEncoder().encode('NUMPY'), 1, 0);
const alignment = 64;

const bytesPerValue: Readonly<Record<NpyType, number>> = { '<f4': 4, '<c8': 8 };

/** @param bytes the values as they are stored */
export function encodeNpy(bytes: Uint8Array, shape: readonly number[], type: NpyType): Uint8Array {
  const expected = shape.reduce((product, side) => product * side, bytesPerValue[type]);
  if (bytes.length !== expected) throw new RangeError(`bytes must be ${expected} for this shape, got ${bytes.length}`);
  const header = headerOf(shape, type);
  const file = new Uint8Array(magic.length + 2 + header.length + bytes.length);
  file.set(magic);
  new DataView(file.buffer).setUint16(magic.length, header.length, true);
  file.set(header, magic.length + 2);
  file.set(bytes, file.length - bytes.length);
  return file;
}

/** A tuple of one has a comma behind it; the header ends in a line feed. */
function headerOf(shape: readonly number[], type: NpyType): Uint8Array {
  const tuple = `(${shape.join(', ')}${shape.length === 1 ? ',' : ''})`;
  const literal = `{'descr': '${type}', 'fortran_order': False, 'shape': ${tuple}, }`;
  const unpadded = magic.length + 2 + literal.length + 1;
  const padding = (alignment - (unpadded % alignment)) % alignment;
  return new TextEncoder().encode(`${literal}${' '.repeat(padding)}\n`);
}
