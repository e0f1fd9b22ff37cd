/** What of many files goes into one request, and what is said of those that were refused. */
import type { Refusal, RefusalCode } from '@/server/contract/images';
import type { FileToSend } from './file-to-send';

/** A lost connection costs at most this much: a second or two on a slow line. The server takes 64 files and 512 MB. */
export const batchLimits = { files: 16, bytes: 24 * 1024 * 1024 } as const;

/** Batches in the order of the files; one that is larger than a batch goes alone. */
export function batchesOf(files: readonly FileToSend[]): FileToSend[][] {
  const batches: FileToSend[][] = [];
  let bytes = 0;
  for (const file of files) {
    const last = batches.at(-1);
    if (last !== undefined && last.length < batchLimits.files && bytes + file.size <= batchLimits.bytes) {
      last.push(file);
      bytes += file.size;
    } else {
      batches.push([file]);
      bytes = file.size;
    }
  }
  return batches;
}

export interface RefusalSum {
  readonly code: RefusalCode;
  readonly count: number;
  /** Why the first of them was refused. */
  readonly reason: string;
}

/** As many refusals as are read one by one; a folder with more has them summed up. */
export const readOneByOne = 3;

/** Refusals by what they say, the most frequent first. */
export function sumRefusals(refused: readonly Refusal[]): RefusalSum[] {
  const sums = new Map<RefusalCode, RefusalSum>();
  for (const { code, reason } of refused) {
    const sum = sums.get(code);
    sums.set(code, { code, count: (sum?.count ?? 0) + 1, reason: sum?.reason ?? reason });
  }
  return [...sums.values()].sort((a, b) => b.count - a.count);
}
