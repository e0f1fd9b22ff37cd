/**
 * One decoder in WebAssembly. Its memory grows and never shrinks, and after a C++ exception, which skips what would set memory free, is
 * not to be trusted: both are noted, so that the thread opens a new one before the next file.
 */
import type { Layout } from '../pixels';
import type { Refused } from '../refusal';
import { asFrame, damagedCodestream, type Coded } from './codestream';

export interface WebAssemblyCodec {
  decode(codestream: Uint8Array, coded: Coded, layout: Layout): Uint8Array | Refused;
  worn(): boolean;
}

/** Enough for a few frames of 1024²; the largest that are taken need ten times as much. */
const mostMemory = 64 * 1024 * 1024;

/** What decoders print is about damaged files, and would go to the log of the server. A new object each: it becomes the module. */
export const silently = (): WebAssemblyOptions => ({ print: () => undefined, printErr: () => undefined });

export function webAssemblyCodec(module: WebAssemblyModule, Decoder: new () => WebAssemblyDecoder): WebAssemblyCodec {
  let worn = false;
  return {
    decode(codestream, coded, layout) {
      try {
        const samples = decodedBy(new Decoder(), codestream.subarray(0, coded.length), coded);
        if (module.HEAPU8.length > mostMemory) worn = true;
        return asFrame(samples, coded, layout);
      } catch {
        // Addresses of exceptions, traps and aborts: none says more than that the codestream is damaged.
        worn = true;
        return damagedCodestream;
      }
    },
    worn: () => worn,
  };
}

/** The samples, none where the decoder found another image than announced. */
function decodedBy(decoder: WebAssemblyDecoder, codestream: Uint8Array, coded: Coded): Uint8Array {
  try {
    decoder.getEncodedBuffer(codestream.length).set(codestream);
    decoder.decode();
    const { width, height, bitsPerSample, componentCount } = decoder.getFrameInfo();
    const same =
      width === coded.columns && height === coded.rows && bitsPerSample === coded.precision && componentCount === coded.components;
    return same ? new Uint8Array(decoder.getDecodedBuffer()) : new Uint8Array(0);
  } finally {
    decoder.delete();
  }
}
