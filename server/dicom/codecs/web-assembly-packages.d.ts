/** What is used of the WebAssembly decoders, which ship no types: one shape, four classes. */
interface WebAssemblyDecoder {
  /** Memory of the decoder for a codestream of this length. */
  getEncodedBuffer(length: number): Uint8Array;
  /** Throws numbers, which are addresses of exceptions. */
  decode(): void;
  getFrameInfo(): WebAssemblyFrame;
  /** Often a view of the decoder's memory, which the next call may move. */
  getDecodedBuffer(): Uint8Array | Uint8ClampedArray;
  delete(): void;
}

interface WebAssemblyFrame {
  readonly width: number;
  readonly height: number;
  readonly bitsPerSample: number;
  readonly componentCount: number;
}

interface WebAssemblyModule {
  /** All of its memory; another array whenever it grows. */
  readonly HEAPU8: Uint8Array;
}

/** What the C++ code writes to its two streams goes to these. */
interface WebAssemblyOptions {
  readonly print: (line: string) => void;
  readonly printErr: (line: string) => void;
}

declare module '@cornerstonejs/codec-charls/decodewasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<WebAssemblyModule & { readonly JpegLSDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}

declare module '@cornerstonejs/codec-openjpeg/decodewasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<WebAssemblyModule & { readonly J2KDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}

declare module '@cornerstonejs/codec-openjph/wasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<WebAssemblyModule & { readonly HTJ2KDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}

declare module '@cornerstonejs/codec-libjpeg-turbo-8bit/decodewasmjs' {
  const open: (options: WebAssemblyOptions) => Promise<WebAssemblyModule & { readonly JPEGDecoder: new () => WebAssemblyDecoder }>;
  export default open;
}
