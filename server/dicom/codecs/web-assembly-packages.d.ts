/** What is used of the WebAssembly decoders, which ship no types: one shape, four classes. */
interface WebAssemblyDecoder {
  /** Memory of the decoder for a codestream of this length. */
  getEncodedBuffer(length: number): Uint8Array;
  /** Throws numbers, which are addresses of exceptions. */
  decode(): void;
  getFrameInfo(): WebAssemblyFrame;
  /** A view of the decoder's memory, which the next call may move. */
  getDecodedBuffer(): Uint8Array;
  delete(): void;
}

interface WebAssemblyFrame {
  readonly width: number;
  readonly height: number;
  readonly bitsPerSample: number;
  readonly componentCount: number;
}

/** What the C++ code writes to its two streams goes to these. */
interface WebAssemblyOptions {
  readonly print: (line: string) => void;
  readonly printErr: (line: string) => void;
}

declare module '@cornerstonejs/codec-charls/decodewasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<{ readonly JpegLSDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}

declare module '@cornerstonejs/codec-openjpeg/decodewasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<{ readonly J2KDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}

declare module '@cornerstonejs/codec-openjph/wasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<{ readonly HTJ2KDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}

declare module '@cornerstonejs/codec-libjpeg-turbo-8bit/decodewasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<{ readonly JPEGDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}
