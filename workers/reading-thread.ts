/**
 * The thread that reads files, one at a time, so that a long upload holds up no slider. What comes from outside may be made to do harm: a
 * file has a time by its size and the thread has a limit of memory; one that goes over either is refused, and a new thread takes the next.
 */
import { Piscina } from 'piscina';
import type { Read } from '../server/dicom/read';
import { refuse } from '../server/dicom/refusal';
import { hdf5Signature, isHdf5 } from '../server/mrd/signature';
import type { ReadDicomJob } from './read-dicom.worker';

export interface ReadingThread {
  /** Reads one file; `undefined` when it took longer than its time, and never more than `mostMs`. */
  read(job: ReadDicomJob, mostMs: number): Promise<Read | undefined>;
  threads(): number;
  close(): Promise<void>;
}

/** A head slice takes 10 ms, the largest picture that is read about a second on an idle core; the sender is to have an answer within two. */
const leastMs = 1800;
/** Compressed or not, a megabyte took 0.1 s at most; the rest is for a machine that has other work. */
const perMebibyteMs = 500;
const mebibyte = 1 << 20;
const nothing = new Uint8Array(0);

/** Of objects of the language, which a header becomes. Pixels lie outside and have limits of their own (server/dicom). */
const heapMebibytes = 192;

const outOfMemory = refuse('too-large', 'Reading the file takes more memory than one file may have. Export the series in parts.');

/** Milliseconds that reading a file may take: a small file that takes long is made to. */
const timeOf = ({ bytes, packed }: ReadDicomJob): number =>
  leastMs + perMebibyteMs * Math.floor((packed?.entry.size ?? bytes.byteLength) / mebibyte);

export function openReadingThread(filename: string, execArgv: string[]): ReadingThread {
  const pool = new Piscina({
    ...{ filename, execArgv, env: {}, minThreads: 1, maxThreads: 1 },
    resourceLimits: { maxOldGenerationSizeMb: heapMebibytes },
  });
  // A thread that ends without a job has harmed nobody; the pool starts another.
  pool.on('error', () => undefined);
  const ready = new Map<Uint8Array, Promise<unknown>>();
  let last: Promise<unknown> = Promise.resolve();

  /** Once the beginning of a file has been refused, a thread is up and has opened what reads its kind: no file pays for that with its time. */
  const whenReady = (beginning: Uint8Array, key: Uint8Array): Promise<unknown> => {
    const opened = ready.get(beginning) ?? pool.run({ bytes: beginning, key } satisfies ReadDicomJob);
    ready.set(beginning, opened);
    return opened.catch((error: unknown) => {
      ready.clear();
      throw error;
    });
  };
  const readNow = async (job: ReadDicomJob, mostMs: number): Promise<Read | undefined> => {
    await whenReady(nothing, job.key);
    if (isHdf5(job.bytes)) await whenReady(hdf5Signature, job.key);
    const signal = AbortSignal.timeout(Math.min(mostMs, timeOf(job)));
    try {
      return (await pool.run(job, { signal })) as Read;
    } catch (error) {
      ready.clear();
      if (signal.aborted) return undefined;
      if (isOutOfMemory(error)) return outOfMemory;
      throw error;
    }
  };

  return {
    read(job, mostMs) {
      const reading = last.then(() => readNow(job, mostMs));
      // What becomes of one file is told to its own caller; the next one only waits for its end.
      last = reading.then(
        () => undefined,
        () => undefined,
      );
      return reading;
    },
    threads: () => pool.threads.length,
    close: () => pool.destroy(),
  };
}

const isOutOfMemory = (error: unknown): boolean => error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY';
