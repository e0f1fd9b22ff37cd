/**
 * The decoders of compressed frames by transfer syntax. Some are WebAssembly, which is compiled asynchronously, once a thread; decoding
 * itself is synchronous. `openDecoders` makes them, `noDecoders` is for those who read uncompressed files only.
 * Transfer syntaxes: DICOM PS3.5 annex A.4.
 */
import openJpegLs from '@cornerstonejs/codec-charls/decodewasmjs';
import openJpeg from '@cornerstonejs/codec-libjpeg-turbo-8bit/decodewasmjs';
import openJpeg2000 from '@cornerstonejs/codec-openjpeg/decodewasmjs';
import openHighThroughput from '@cornerstonejs/codec-openjph/wasmjs';
import type { Layout } from '../pixels';
import { isRefused, refuse, type Refused } from '../refusal';
import { whyNotRead } from '../transfer-syntax';
import { whyUnfit, type Coded } from './codestream';
import { jpeg2000HeaderOf } from './jpeg-2000-header';
import { jpegHeaderOf, markers } from './jpeg-header';
import { decodeJpegLossless } from './jpeg-lossless';
import { decodeRunLength } from './run-length';
import { silently, webAssemblyCodec, type WebAssemblyCodec } from './web-assembly';

/** One codestream to the bytes of its frame, rows · columns · bytesPerPixel of them, little endian. Never throws. */
export type Decode = (codestream: Uint8Array, layout: Layout) => Uint8Array | Refused;

export interface Decoders {
  /** None where frames of this transfer syntax are not decoded. */
  decoderOf(transferSyntax: string): Decode | undefined;
  /** Whether a decoder broke down over a damaged codestream, or its memory grew large: open new ones before the next file. */
  worn(): boolean;
}

export const noDecoders: Decoders = { decoderOf: () => undefined, worn: () => false };

const jpegFamily = '1.2.840.10008.1.2.4';

export async function openDecoders(): Promise<Decoders> {
  const [charls, libjpeg, openjpeg, openjph] = await Promise.all([
    openJpegLs(silently()),
    openJpeg(silently()),
    openJpeg2000(silently()),
    openHighThroughput(silently()),
  ]);
  const jpeg = webAssemblyCodec(libjpeg, libjpeg.JPEGDecoder);
  const jpegLs = webAssemblyCodec(charls, charls.JpegLSDecoder);
  const jpeg2000 = webAssemblyCodec(openjpeg, openjpeg.J2KDecoder);
  const highThroughput = webAssemblyCodec(openjph, openjph.HTJ2KDecoder);
  const decodeJpegLs = checked((codestream) => jpegHeaderOf(codestream, [markers.jpegLs]), jpegLs);
  const decodeJpeg2000 = checked(jpeg2000HeaderOf, jpeg2000);
  const decodeHighThroughput = checked(jpeg2000HeaderOf, highThroughput);
  const decoders = new Map<string, Decode>([
    ['1.2.840.10008.1.2.5', decodeRunLength],
    [`${jpegFamily}.50`, checked(eightBitJpegHeaderOf, jpeg)],
    [`${jpegFamily}.51`, checked(eightBitJpegHeaderOf, jpeg)],
    [`${jpegFamily}.57`, decodeJpegLossless],
    [`${jpegFamily}.70`, decodeJpegLossless],
    [`${jpegFamily}.80`, decodeJpegLs],
    [`${jpegFamily}.81`, decodeJpegLs],
    [`${jpegFamily}.90`, decodeJpeg2000],
    [`${jpegFamily}.91`, decodeJpeg2000],
    [`${jpegFamily}.201`, decodeHighThroughput],
    [`${jpegFamily}.202`, decodeHighThroughput],
    [`${jpegFamily}.203`, decodeHighThroughput],
  ]);
  const codecs = [jpeg, jpegLs, jpeg2000, highThroughput];
  return { decoderOf: (transferSyntax) => decoders.get(transferSyntax), worn: () => codecs.some((codec) => codec.worn()) };
}

/** Only a codestream that is whole by its own markers, and fits the header of the file, is given to a decoder. */
function checked(headerOf: (codestream: Uint8Array) => Coded | Refused, codec: WebAssemblyCodec): Decode {
  return (codestream, layout) => {
    const coded = headerOf(codestream);
    if (isRefused(coded)) return coded;
    return whyUnfit(coded, layout) ?? codec.decode(codestream, coded, layout);
  };
}

/** Lossy JPEG of 12 bits is a process of its own, which the decoder does not know. */
function eightBitJpegHeaderOf(codestream: Uint8Array): Coded | Refused {
  const header = jpegHeaderOf(codestream, [markers.baseline, markers.extended]);
  if (isRefused(header) || header.precision === 8) return header;
  return refuse('transfer-syntax', `The pixels are ${whyNotRead(`${jpegFamily}.51`)}.`);
}
