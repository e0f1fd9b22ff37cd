/**
 * The multipart reader. Each file is gathered in memory and handed to a worker thread as soon as it is whole; its bytes are gone
 * when its reading comes back. Nothing of an upload touches the disk here, and a file name lives only until the answer.
 */
import type { Request, RequestHandler } from 'express';
import multer, { type StorageEngine } from 'multer';
import type { Dependencies } from '../dependencies';
import type { Read } from '../dicom/read';
import { refuse } from '../dicom/refusal';
import { departmentKey } from '../dicom/unique-identifiers';
import { AppError, invalidAt } from '../errors';
import type { Caller } from './sessions';

/** What became of one file. */
export interface FileReading {
  readonly name: string;
  readonly outcome: Read;
}

/** A file that has come in; its outcome follows from the worker. */
interface Slot {
  readonly name: string;
  outcome?: Read;
}

type Limits = Dependencies['env']['upload'];

const mebibyte = 1024 * 1024;
const longestName = 255;

const slots = new WeakMap<Request, Slot[]>();

/** What the reader found in the files of a request, in the order in which they came. */
export const readingsOf = (request: Request): FileReading[] =>
  (slots.get(request) ?? []).flatMap(({ name, outcome }) => (outcome === undefined ? [] : [{ name, outcome }]));

type CallerOf = (request: Request) => Pick<Caller, 'departmentId'>;

/** Middleware that reads the files of the field `files` for the department of whoever sent them. */
export function fileReader(deps: Pick<Dependencies, 'env' | 'workers' | 'identityKey'>, callerOf: CallerOf): RequestHandler {
  const { upload } = deps.env;
  const reader = multer({
    storage: readingEngine(deps, callerOf),
    limits: { files: upload.files, fields: 16, fieldSize: 1024, parts: upload.files + 16 },
    defParamCharset: 'utf8',
  }).array('files');
  return (request, response, next) => {
    // Multipart framing adds little; a body that announces far more than the limit is not read at all.
    if (Number(request.headers['content-length'] ?? 0) > upload.totalBytes + mebibyte) throw tooMuch(upload);
    if (!request.is('multipart/form-data')) throw invalidAt(['files'], 'files are sent as multipart/form-data in the field `files`');
    slots.set(request, []);
    reader(request, response, (error: unknown) => {
      const empty = error === undefined && readingsOf(request).length === 0;
      next(empty ? invalidAt(['files'], 'no file was sent') : error);
    });
  };
}

const tooMuch = ({ totalBytes }: Limits) =>
  new AppError('too-large', { detail: `One upload may hold ${totalBytes / mebibyte} MB; send the files in several` });

/** A storage engine of multer that keeps readings instead of files. */
function readingEngine(
  { env, workers, identityKey }: Pick<Dependencies, 'env' | 'workers' | 'identityKey'>,
  callerOf: CallerOf,
): StorageEngine {
  const received = new WeakMap<Request, number>();
  return {
    _handleFile(request, file, done) {
      const chunks: Buffer[] = [];
      let size = 0;
      file.stream.on('data', (chunk: Buffer) => {
        size += chunk.length;
        received.set(request, (received.get(request) ?? 0) + chunk.length);
        // A file over the limit is read to its end, so that the others are still seen, but not kept.
        if (size <= env.upload.fileBytes) chunks.push(chunk);
        else chunks.length = 0;
      });
      file.stream.once('error', done);
      file.stream.once('end', () => {
        if ((received.get(request) ?? 0) > env.upload.totalBytes) {
          done(tooMuch(env.upload));
          return;
        }
        const slot: Slot = { name: file.originalname.slice(0, longestName) };
        slots.get(request)?.push(slot);
        readWhole(chunks, size, departmentKey(identityKey, callerOf(request).departmentId)).then((outcome) => {
          slot.outcome = outcome;
          done(null, {});
        }, done);
      });
    },
    _removeFile(_request, _file, done) {
      done(null);
    },
  };

  async function readWhole(chunks: Buffer[], size: number, key: Uint8Array): Promise<Read> {
    const { fileBytes } = env.upload;
    if (size > fileBytes)
      return refuse('too-large', `The file is larger than ${fileBytes / mebibyte} MB, the most that one file may have.`);
    const outcome = await workers.readDicom({ bytes: Buffer.concat(chunks), key }, env.readMilliseconds);
    return outcome ?? refuse('too-slow', `Reading the file took longer than ${env.readMilliseconds / 1000} s and was stopped.`);
  }
}
