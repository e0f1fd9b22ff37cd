/**
 * The DICOM node as the server sees it: a thread that listens, asked for signs of life and started again when it ends or gives none. Who
 * knocks is looked up here, what comes is read and stored here, and the thread is told what to answer.
 */
import { Worker, type WorkerOptions } from 'node:worker_threads';
import type { Logger } from 'pino';
import { noteRefused } from '../../db/queries/push';
import type { WorkerFiles } from '../../workers/pool';
import type { Env } from '../env';
import { acceptedTransferSyntaxes } from './accepted-syntaxes';
import type { FromNode, NodeSettings, ToNode } from './node/messages';
import { receiveObject, type PushDependencies } from './receive';
import { recognise } from './senders';
import { commentOf, processingFailure, statusOf, success } from './status';
import type { SendingScanner } from './tokens';

export interface DicomNode {
  readonly port: number;
  close(): Promise<void>;
}

type NodeDependencies = PushDependencies & { readonly log: Logger };

/** Objects on their way or being read at once: with the limit of one object, what the node may take of memory. */
const objects = 4;
const connections = 32;
/** Between two images of an association a scanner may have to make the next one first. */
const patienceMs = 120_000;
/** A thread that answers nothing for so long hangs; the machine may be busy for a while. */
const lifeSignMs = 30_000;
const pauseBeforeRestartMs = 1000;

/** Starts listening. Resolves once it does, or throws because it cannot. */
export async function openDicomNode(
  deps: NodeDependencies,
  listenAt: NonNullable<Env['dicomNode']>,
  files: WorkerFiles,
): Promise<DicomNode> {
  let closing = false;
  let thread = startThread(deps, listenAt, files);
  const port = await thread.port;
  const watch = (watched: RunningThread): void => {
    void watched.ended.then(async () => {
      if (closing) return;
      deps.log.warn('the DICOM node ended by itself and is started again');
      await new Promise((resolve) => setTimeout(resolve, pauseBeforeRestartMs));
      if (closing) return;
      thread = startThread(deps, { ...listenAt, port }, files);
      thread.port.catch((error: unknown) => deps.log.error({ err: error }, 'the DICOM node cannot listen'));
      watch(thread);
    });
  };
  watch(thread);
  return {
    port,
    async close() {
      closing = true;
      await thread.stop();
    },
  };
}

interface RunningThread {
  readonly port: Promise<number>;
  readonly ended: Promise<void>;
  stop(): Promise<void>;
}

function startThread(deps: NodeDependencies, { host, port, aeTitle }: NonNullable<Env['dicomNode']>, files: WorkerFiles): RunningThread {
  const settings: NodeSettings = {
    ...{ host, port, objects, connections, patienceMs, objectBytes: deps.env.upload.fileBytes },
    accepts: { transferSyntaxes: acceptedTransferSyntaxes },
  };
  // What the protocol library prints holds what senders sent: its output ends here. Its environment holds no secret.
  const worker = new Worker(...entryOf(files.dicomNode, { workerData: settings, env: {}, stdout: true, stderr: true }));
  worker.stdout.resume();
  worker.stderr.resume();
  const tell = (message: ToNode) => worker.postMessage(message);
  const senders = new Map<number, SendingScanner>();
  let lastSign = Date.now();
  const pulse = setInterval(() => {
    if (Date.now() - lastSign > lifeSignMs) void worker.terminate();
    else tell({ kind: 'live' });
  }, lifeSignMs / 6);

  const ended = new Promise<void>((resolve) => {
    // The error may quote bytes that were sent; that there was one is told by the end that follows it.
    worker.on('error', () => undefined);
    worker.once('exit', () => {
      clearInterval(pulse);
      resolve();
    });
  });
  const listening = new Promise<number>((resolve, reject) => {
    worker.on('message', (message: FromNode) => {
      lastSign = Date.now();
      if (message.kind === 'listens') resolve(message.port);
      else if (message.kind === 'cannot-listen') reject(new Error(`the DICOM node cannot listen on ${host}:${port} (${message.code})`));
      else if (message.kind === 'leaves') senders.delete(message.association);
      else if (message.kind === 'knocks') void answerKnock(deps, { aeTitle, senders, tell }, message);
      else if (message.kind === 'object') void answerObject(deps, { senders, tell }, message);
    });
    void ended.then(() => reject(new Error('the DICOM node ended before it listened')));
  });
  return {
    port: listening,
    ended,
    async stop() {
      tell({ kind: 'close' });
      await ended;
    },
  };
}

/** A bundle is started as it is. A source is not compiled as the entry of a thread (tsx 4.23 on Node 20), but it is when it is required. */
const entryOf = (file: string, options: WorkerOptions): [string, WorkerOptions] =>
  file.endsWith('.mjs')
    ? [file, options]
    : [`require(${JSON.stringify(file)})`, { ...options, eval: true, execArgv: ['--require', 'tsx/cjs'] }];

interface Conversation {
  readonly senders: Map<number, SendingScanner>;
  readonly tell: (message: ToNode) => void;
}

async function answerKnock(
  { db, log }: NodeDependencies,
  { aeTitle, senders, tell }: Conversation & { readonly aeTitle: string },
  { association, ...knock }: Extract<FromNode, { kind: 'knocks' }>,
): Promise<void> {
  try {
    const { scanner, refused } = await recognise(db, aeTitle, knock);
    if (refused === null && scanner !== undefined) senders.set(association, scanner);
    tell({ kind: 'admit', association, refused });
    if (refused === null) return;
    log.info({ refused, scannerId: scanner?.scannerId }, 'a DICOM sender was not let in');
    if (scanner !== undefined) await noteRefused(db, scanner.scannerId, refused);
  } catch (error) {
    log.warn({ err: error }, 'a DICOM sender could not be looked up');
    tell({ kind: 'admit', association, refused: 'not-now' });
  }
}

async function answerObject(
  deps: NodeDependencies,
  { senders, tell }: Conversation,
  { association, bytes }: Extract<FromNode, { kind: 'object' }>,
): Promise<void> {
  const scanner = senders.get(association);
  if (scanner === undefined) return;
  try {
    const received = await receiveObject(deps, scanner, bytes, 'scanner');
    const answer =
      received === null ? { status: success, comment: '' } : { status: statusOf(received.refused), comment: commentOf(received.refused) };
    tell({ kind: 'answer', association, ...answer });
    if (received !== null) deps.log.info({ refused: received.refused, scannerId: scanner.scannerId }, 'an object was refused');
  } catch (error) {
    deps.log.error({ err: error, scannerId: scanner.scannerId }, 'an object could not be stored');
    tell({ kind: 'answer', association, status: processingFailure, comment: 'not stored' });
  }
}
