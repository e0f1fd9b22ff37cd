/** Objects: immutable bytes under the SHA-256 of themselves. Where they lie is the implementation's affair. */
export interface ObjectStore {
  /** Keeps `bytes` and returns their digest, 64 hexadecimal digits. Keeping the same bytes twice keeps them once, and renews them. */
  put(bytes: Uint8Array): Promise<string>;
  /** The bytes under `digest`. Throws where there are none, or where they no longer match it. */
  get(digest: string): Promise<Buffer>;
  /** Takes an object away, unless somebody kept the same bytes within the last `unusedForMs`. Says whether it is gone. */
  remove(digest: string, unusedForMs: number): Promise<boolean>;
}
