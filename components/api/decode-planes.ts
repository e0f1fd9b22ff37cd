/**
 * Planes of an answer as the panes take them: typed views on the bytes that arrived, nothing is copied. The display form only:
 * 16-bit samples with the values of 0 and 65535 beside them, little-endian, one plane after the other in the order of the header.
 */
import { z } from 'zod';
import type { DisplayPlane } from '@/components/image/display-plane';
import { planeHeaderSchema, type PlaneHeader } from '@/server/contract/planes';

const bytesPerSample = 2;

function planeAt(bytes: ArrayBuffer, offset: number, header: PlaneHeader): DisplayPlane {
  const { name, rows, columns, spacing, origin, type, low, high } = header;
  if (type !== 'uint16' || low === undefined || high === undefined) {
    throw new RangeError(`plane ${name} must be uint16 with low and high, got ${type}`);
  }
  return { name, rows, columns, spacing, origin, low, high, samples: new Uint16Array(bytes, offset, rows * columns) };
}

/** The planes of an answer by name. Throws RangeError where header and bytes do not agree. */
export function decodePlanes(bytes: ArrayBuffer, header: string): ReadonlyMap<string, DisplayPlane> {
  const headers = z.array(planeHeaderSchema).parse(JSON.parse(header));
  const expected = headers.reduce((total, { rows, columns }) => total + rows * columns * bytesPerSample, 0);
  if (bytes.byteLength !== expected) throw new RangeError(`planes must take ${expected} bytes, got ${bytes.byteLength}`);
  const planes = new Map<string, DisplayPlane>();
  let offset = 0;
  for (const plane of headers) {
    planes.set(plane.name, planeAt(bytes, offset, plane));
    offset += plane.rows * plane.columns * bytesPerSample;
  }
  return planes;
}
