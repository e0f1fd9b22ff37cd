/** Samples through a colour table to pixels: the one place where a picture gets its colours, whatever draws it afterwards. */
import type { ColourTable } from './colour-table';
import type { DisplayPlane } from './display-plane';

/** Opaque black as a signed word. */
const black = 255 << 24;

/**
 * RGBA pixels of a plane, [row, column, red green blue alpha]. Where `mask` is given, samples whose mask is 0 stay black: the phase
 * of a sample that was never taken means nothing.
 */
export function paintPixels(plane: DisplayPlane, table: ColourTable, mask?: DisplayPlane): Uint8ClampedArray<ArrayBuffer> {
  const { samples } = plane;
  const pixels = new Int32Array(new ArrayBuffer(samples.length * 4));
  const words = new Int32Array(table.buffer, table.byteOffset, table.length);
  for (let i = 0; i < samples.length; i++) pixels[i] = words[samples[i] as number] as number;
  if (mask) {
    for (let i = 0; i < samples.length; i++) if (mask.samples[i] === 0) pixels[i] = black;
  }
  return new Uint8ClampedArray(pixels.buffer);
}
