/**
 * Arrays of planes that nobody reads any more, kept to be written again. A fresh array costs more than the arithmetic of a step: the system
 * hands its memory out page by page, and clears each. Only who made an array, and knows that nobody else holds it, may give it back.
 */

/** Four complex planes: what a recipe lets go until its result is there. */
const mostKept = 8;

interface Spare<A> {
  take(length: number): A | undefined;
  give(array: A): void;
}

function spareOf<A extends { readonly length: number }>(): Spare<A> {
  const kept: A[] = [];
  return {
    take(length) {
      const place = kept.findLastIndex((array) => array.length === length);
      return place < 0 ? undefined : kept.splice(place, 1)[0];
    },
    give(array) {
      if (kept.includes(array)) return;
      kept.push(array);
      // The oldest makes room: sizes that are not asked for any more go.
      if (kept.length > mostKept) kept.shift();
    },
  };
}

const spareSamples = spareOf<Float64Array>();
const spareBytes = spareOf<Uint8Array>();

/** An array with arbitrary content: every sample of it is to be written before it is read. */
export const unwrittenArray = (length: number): Float64Array => spareSamples.take(length) ?? new Float64Array(length);

/** The same of zeros. */
export const zeroArray = (length: number): Float64Array => spareSamples.take(length)?.fill(0) ?? new Float64Array(length);

/** Unwritten bytes. */
export const unwrittenBytes = (length: number): Uint8Array => spareBytes.take(length) ?? new Uint8Array(length);

/** A copy that is its own. */
export function copyOf(array: ArrayLike<number>): Float64Array {
  const copy = unwrittenArray(array.length);
  copy.set(array);
  return copy;
}

/** The same of bytes. */
export function copyOfBytes(bytes: Uint8Array): Uint8Array {
  const copy = unwrittenBytes(bytes.length);
  copy.set(bytes);
  return copy;
}

/** Nothing may hold `array` after this. */
export const giveBack = (array: Float64Array): void => spareSamples.give(array);

/** Nothing may hold `bytes` after this. */
export const giveBackBytes = (bytes: Uint8Array): void => spareBytes.give(bytes);

/** Nothing may hold the samples of `plane` after this. */
export function giveBackPlane({ re, im }: { readonly re: Float64Array; readonly im: Float64Array }): void {
  giveBack(re);
  giveBack(im);
}
