/** What is used of fft-js, which comes without types. */
declare module 'fft-js' {
  /** Radix-2 transform of a power of two of real or complex values, kernel exp(−i2πjk/n), no scale, index 0 first. */
  export function fft(signal: readonly number[] | readonly (readonly [number, number])[]): [number, number][];
  /** Its inverse, scaled by 1/n. */
  export function ifft(spectrum: readonly (readonly [number, number])[]): [number, number][];
}
