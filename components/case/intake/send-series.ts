/**
 * Sending many files, batch after batch. After a lost connection it waits and asks what has arrived before it goes on, so that nothing is sent
 * twice; the same question makes an upload go on where it was after a reload. Where the browser cannot work out digests (no secure
 * context) a batch whose answer was lost is sent again: the same slice sent twice counts once.
 */
import { ApiProblem } from '@/components/api/api-problem';
import type { Refusal, UploadResult } from '@/server/contract/images';
import { batchesOf } from './batches';
import { isRefusal, type FileToSend } from './file-to-send';

/** What the sending needs of the world. */
export interface Line {
  send(files: readonly File[], onProgress: (part: number) => void): Promise<UploadResult>;
  /** Images of files that have arrived, by digest. */
  findSent(digests: readonly string[]): Promise<ReadonlyMap<string, readonly string[]>>;
  /** Undefined where the browser cannot. */
  readonly digest: ((file: Blob) => Promise<string>) | undefined;
  /** Resolves when another attempt is worth while. */
  untilRetry(attempt: number): Promise<void>;
  /** Resolves at once unless somebody paused; rejects once somebody cancelled. */
  untilWanted(): Promise<void>;
}

export interface Report {
  onProgress(settled: number): void;
  onArrived(result: { imageIds: readonly string[]; refused: readonly Refusal[] }): void;
  onLost(): void;
}

const lostStatuses = [0, 502, 503, 504];
export const isLost = (error: unknown): boolean => error instanceof ApiProblem && lostStatuses.includes(error.status);

export async function sendSeries(files: readonly FileToSend[], line: Line, report: Report): Promise<void> {
  let settled = 0;
  for (const batch of batchesOf(files)) {
    await line.untilWanted();
    const opened = await Promise.all(batch.map((file) => file.open()));
    const good = opened.filter((file) => !isRefusal(file)) as File[];
    const refusedHere = opened.filter(isRefusal);
    const result = await untilSent(good, line, {
      ...report,
      onProgress: (sent) => report.onProgress(settled + refusedHere.length + sent),
    });
    report.onArrived({ imageIds: result.imageIds, refused: [...refusedHere, ...result.refused] });
    settled += batch.length;
    report.onProgress(settled);
  }
}

interface Sent {
  readonly imageIds: readonly string[];
  readonly refused: readonly Refusal[];
}

async function untilSent(files: readonly File[], line: Line, report: Report): Promise<Sent> {
  for (let attempt = 0; ; attempt++) {
    try {
      return await sendRest(files, line, report);
    } catch (error) {
      if (!isLost(error)) throw error;
      report.onLost();
      await line.untilRetry(attempt);
      await line.untilWanted();
    }
  }
}

/** Sends what has not arrived yet. */
async function sendRest(files: readonly File[], line: Line, report: Report): Promise<Sent> {
  if (files.length === 0) return { imageIds: [], refused: [] };
  const { digest } = line;
  const digests = digest === undefined ? [] : await Promise.all(files.map((file) => digest(file)));
  const arrived = digests.length > 0 ? await line.findSent(digests) : new Map<string, readonly string[]>();
  const idsOf = (index: number): readonly string[] => arrived.get(digests[index] ?? '') ?? [];
  const rest = files.filter((_, index) => idsOf(index).length === 0);
  const there = files.length - rest.length;
  report.onProgress(there);
  const result = rest.length > 0 ? await line.send(rest, (part) => report.onProgress(there + part * rest.length)) : none;
  return { imageIds: [...files.flatMap((_, index) => idsOf(index)), ...result.images.map(({ id }) => id)], refused: result.refused };
}

const none: UploadResult = { images: [], refused: [] };
