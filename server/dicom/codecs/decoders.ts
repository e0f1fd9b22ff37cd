/**
 * The decoders of compressed frames by transfer syntax. Some are WebAssembly, which is compiled asynchronously, once a thread; decoding
 * itself is synchronous. `openDecoders` makes them, `noDecoders` is for those who read uncompressed files only.
 */
import type { Layout } from '../pixels';
import type { Refused } from '../refusal';

/** One codestream to the bytes of its frame, rows · columns · bytesPerPixel of them, little endian. Never throws. */
export type Decode = (codestream: Uint8Array, layout: Layout) => Uint8Array | Refused;

export interface Decoders {
  /** None where frames of this transfer syntax are not decoded. */
  decoderOf(transferSyntax: string): Decode | undefined;
  /** Whether a decoder broke down over a damaged codestream, after which its memory is not to be trusted: open new ones. */
  spoilt(): boolean;
}

export const noDecoders: Decoders = { decoderOf: () => undefined, spoilt: () => false };
