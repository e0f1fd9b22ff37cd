/**
 * Values of images in memory, shared with the worker threads without a copy. The ones used longest ago make room first. An image
 * never changes, so an entry never goes stale.
 */
import type { ObjectStore } from './object-store';

const mebibyte = 1024 * 1024;

export interface ImageValues {
  /** The float32 values of an object, [frame, row, column], in memory that threads share. */
  read(digest: string): Promise<SharedArrayBuffer>;
}

/** A cache over `objects` that holds at most `limitBytes`, the newest entry excepted. */
export function cachedImageValues(objects: ObjectStore, limitBytes = 256 * mebibyte): ImageValues {
  // A Map keeps the order of insertion: an entry that is used is taken out and put in again at the end.
  const entries = new Map<string, Promise<SharedArrayBuffer>>();
  const sizes = new Map<string, number>();

  const load = async (digest: string): Promise<SharedArrayBuffer> => {
    const bytes = await objects.get(digest);
    const shared = new SharedArrayBuffer(bytes.byteLength);
    new Uint8Array(shared).set(bytes);
    sizes.set(digest, bytes.byteLength);
    makeRoom(digest);
    return shared;
  };

  const forget = (digest: string): void => {
    entries.delete(digest);
    sizes.delete(digest);
  };

  const makeRoom = (newest: string): void => {
    let held = [...sizes.values()].reduce((sum, size) => sum + size, 0);
    for (const digest of [...entries.keys()]) {
      const size = sizes.get(digest);
      if (held <= limitBytes || digest === newest || size === undefined) continue;
      forget(digest);
      held -= size;
    }
  };

  return {
    async read(digest) {
      const loading = entries.get(digest) ?? load(digest);
      entries.delete(digest);
      entries.set(digest, loading);
      try {
        return await loading;
      } catch (error) {
        forget(digest);
        throw error;
      }
    },
  };
}
