/** Planes of an answer, taken apart again: independent of the code that put them together. */
import type { Response } from 'supertest';
import { planesHeader, type PlaneHeader } from '../../server/contract/planes';

export interface ReceivedPlane {
  readonly header: PlaneHeader;
  readonly bytes: ArrayBuffer;
}

const bytesPerSample = { float32: 4, complex64: 8, uint16: 2 } as const;

/** Collects the body of an answer as bytes. */
export function binary(response: Response, done: (error: Error | null, body: Buffer) => void): void {
  const chunks: Buffer[] = [];
  const stream = response as unknown as NodeJS.ReadableStream;
  stream.on('data', (chunk: Buffer) => chunks.push(Buffer.from(chunk)));
  stream.on('end', () => done(null, Buffer.concat(chunks)));
}

/** The planes, one after the other; fails when the bytes do not come out even. */
export function planesOf(answer: Response): ReceivedPlane[] {
  const headers = JSON.parse(String(answer.get(planesHeader))) as PlaneHeader[];
  const body: Buffer = answer.body;
  let offset = 0;
  const planes = headers.map((header) => {
    const length = header.rows * header.columns * bytesPerSample[header.type];
    const bytes = Uint8Array.from(body.subarray(offset, offset + length)).buffer;
    offset += length;
    return { header, bytes };
  });
  expect(body.byteLength).toBe(offset);
  return planes;
}

export const realOf = (plane: ReceivedPlane | undefined): Float64Array =>
  Float64Array.from(new Float32Array(plane?.bytes ?? new ArrayBuffer(0)));

export function complexOf(plane: ReceivedPlane | undefined) {
  const interleaved = new Float32Array(plane?.bytes ?? new ArrayBuffer(0));
  const part = (offset: 0 | 1) => Float64Array.from({ length: interleaved.length / 2 }, (_, i) => interleaved[2 * i + offset] ?? NaN);
  return { re: part(0), im: part(1) };
}
