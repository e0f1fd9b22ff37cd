/**
 * The threads that do the work a hand is waiting on: reading files, transforms, simulations, small pictures.
 *
 * Worker files lie in one folder. In development and tests they are the `.ts` files of this folder, run through tsx. For production
 * the build bundles each `workers/*.worker.ts` to `<name>.worker.mjs` beside the server's bundle, with `piscina` left external
 * (it finds its own thread script by its place in node_modules); `workersIn(folder, '.mjs')` then finds them. `server/index.ts`
 * chooses by the extension it runs under itself, so nothing has to be configured.
 */
import { join } from 'node:path';
import { Piscina } from 'piscina';
import type { Read } from '../server/dicom/read';
import type {
  ExportJob,
  ExportResult,
  MeasureJob,
  MeasureResult,
  PairJob,
  PairResult,
  PixelsJob,
  Planes,
  SimulateJob,
  SimulateResult,
  SwatchJob,
  ThumbnailJob,
  ThumbnailResult,
  TrialJob,
  TrialResult,
} from './job';
import type { ReadDicomJob } from './read-dicom.worker';
import { openReadingThread } from './reading-thread';

export interface WorkerFiles {
  readonly simulate: string;
  readonly readDicom: string;
  /** Not of the pool: the thread that listens for scanners. */
  readonly dicomNode: string;
  readonly execArgv: string[];
}

/** Where the worker files are: sources through tsx, or bundles. */
export const workersIn = (folder: string, extension: '.ts' | '.mjs'): WorkerFiles => ({
  simulate: join(folder, `simulate.worker${extension}`),
  readDicom: join(folder, `read-dicom.worker${extension}`),
  dicomNode: join(folder, `dicom-node.worker${extension}`),
  execArgv: extension === '.ts' ? ['--import', 'tsx'] : [],
});

export interface WorkerPool {
  /** Every job ends early, with an AbortError, once `gone` aborts. */
  simulate(job: SimulateJob, gone?: AbortSignal): Promise<SimulateResult>;
  trial(job: TrialJob, gone?: AbortSignal): Promise<TrialResult>;
  exported(job: ExportJob, gone?: AbortSignal): Promise<ExportResult>;
  pixels(job: PixelsJob, gone?: AbortSignal): Promise<Planes>;
  thumbnail(job: ThumbnailJob, gone?: AbortSignal): Promise<ThumbnailResult>;
  swatch(job: SwatchJob, gone?: AbortSignal): Promise<ThumbnailResult>;
  measure(job: MeasureJob, gone?: AbortSignal): Promise<MeasureResult>;
  pair(job: PairJob, gone?: AbortSignal): Promise<PairResult>;
  /** Reads one file; `undefined` when it took longer than its size allows, or than `mostMs`, and was stopped. */
  readDicom(job: ReadDicomJob, mostMs: number): Promise<Read | undefined>;
  /** Threads that are up. */
  threads(): number;
  close(): Promise<void>;
}

/** A preview usually ends by itself sooner than a new thread starts; only one that goes on this long after its caller left is stopped. */
const graceMs = 500;
/** More jobs than this waiting means that nobody is served in time: the next one is refused. */
const longestQueue = 256;

export function openWorkers(files: WorkerFiles, threads: number): WorkerPool {
  // The environment of the server holds its secrets; a worker needs none of it.
  const { simulate: filename, execArgv } = files;
  const pool = new Piscina({ filename, execArgv, env: {}, minThreads: threads, maxThreads: threads, maxQueue: longestQueue });
  const reader = openReadingThread(files.readDicom, files.execArgv);
  const run = async <Result>(
    job: SimulateJob | TrialJob | ExportJob | PixelsJob | ThumbnailJob | SwatchJob | MeasureJob | PairJob,
    gone?: AbortSignal,
  ): Promise<Result> => {
    gone?.throwIfAborted();
    const stop = gone && afterGrace(gone);
    try {
      return (await pool.run(job, stop ? { signal: stop.signal } : {})) as Result;
    } finally {
      stop?.release();
    }
  };
  return {
    simulate: run<SimulateResult>,
    trial: run<TrialResult>,
    exported: run<ExportResult>,
    pixels: run<Planes>,
    thumbnail: run<ThumbnailResult>,
    swatch: run<ThumbnailResult>,
    measure: run<MeasureResult>,
    pair: run<PairResult>,
    readDicom: reader.read,
    threads: () => pool.threads.length + reader.threads(),
    async close() {
      await Promise.all([pool.destroy(), reader.close()]);
    },
  };
}

/** A signal that aborts a while after `gone` does. */
function afterGrace(gone: AbortSignal): { signal: AbortSignal; release: () => void } {
  const controller = new AbortController();
  let timer: NodeJS.Timeout | undefined;
  const onGone = () => {
    timer = setTimeout(() => controller.abort(), graceMs);
  };
  gone.addEventListener('abort', onGone, { once: true });
  return {
    signal: controller.signal,
    release: () => {
      clearTimeout(timer);
      gone.removeEventListener('abort', onGone);
    },
  };
}

/** Whether a job was refused because too many are waiting. */
export const isQueueFull = (error: unknown): boolean => error instanceof Error && /queue is at limit/i.test(error.message);
