/**
 * The multipart reader. Each file is gathered in memory and taken as soon as it is whole, while the next comes in; no more than a few are in
 * hand at once, and the rest of the upload waits in the network. A file name lives only until the answer.
 */
import type { Request, RequestHandler } from 'express';
import multer, { type StorageEngine } from 'multer';
import type { Readable } from 'node:stream';
import { discardUploaded } from '../../db/queries/inbox';
import type { UploadResult } from '../contract/images';
import type { Dependencies } from '../dependencies';
import { AppError, invalidAt } from '../errors';
import type { Caller } from './sessions';
import { takeFile, type ReceivedFile, type TakeDependencies } from './take-file';

type Limits = Dependencies['env']['upload'];

const mebibyte = 1024 * 1024;
const longestName = 255;
/** One that comes in, one that is read, one that is stored. */
const inHand = 3;

interface Upload {
  /** What became of each file, in the order in which they came. */
  readonly results: (UploadResult | undefined)[];
  /** When the files before have left a place free. */
  readonly places: Promise<void>[];
  received: number;
}

const uploads = new WeakMap<Request, Upload>();

/** What became of the files of a request. */
export function takenOf(request: Request): UploadResult {
  const results = (uploads.get(request)?.results ?? []).filter((result) => result !== undefined);
  return { images: results.flatMap(({ images }) => images), refused: results.flatMap(({ refused }) => refused) };
}

type CallerOf = (request: Request) => Pick<Caller, 'departmentId' | 'memberId'>;

/** Middleware that takes the files of the field `files` for whoever sent them. */
export function fileReader(deps: TakeDependencies, callerOf: CallerOf): RequestHandler {
  const { upload } = deps.env;
  const reader = multer({
    storage: takingEngine(deps, callerOf),
    limits: { files: upload.files, fields: 16, fieldSize: 1024, parts: upload.files + 16 },
    defParamCharset: 'utf8',
  }).array('files');
  return (request, response, next) => {
    // Multipart framing adds little; a body that announces far more than the limit is not read at all.
    if (Number(request.headers['content-length'] ?? 0) > upload.totalBytes + mebibyte) throw tooMuch(upload);
    if (!request.is('multipart/form-data')) throw invalidAt(['files'], 'files are sent as multipart/form-data in the field `files`');
    const begun: Upload = { results: [], places: [], received: 0 };
    uploads.set(request, begun);
    reader(request, response, (error: unknown) => {
      const empty = error === undefined && begun.results.length === 0;
      const fault = empty ? invalidAt(['files'], 'no file was sent') : error;
      const undone = error === undefined || request.socket.destroyed ? Promise.resolve() : undo(deps, callerOf(request), takenOf(request));
      undone.then(() => next(fault), next);
    });
  };
}

/**
 * An upload that is refused as a whole leaves nothing. One whose connection was lost leaves what had come in: its sender asks for that, and
 * sends the rest.
 */
async function undo({ db }: TakeDependencies, { memberId }: Pick<Caller, 'memberId'>, { images }: UploadResult): Promise<void> {
  await discardUploaded(
    db,
    memberId,
    images.map(({ id }) => id),
  );
}

const tooMuch = ({ totalBytes }: Limits) =>
  new AppError('too-large', { detail: `One upload may hold ${totalBytes / mebibyte} MB; send the files in several` });

/** A storage engine of multer that keeps what became of files instead of files. */
function takingEngine(deps: TakeDependencies, callerOf: CallerOf): StorageEngine {
  return {
    _handleFile(request, file, done) {
      const upload = uploads.get(request);
      if (upload === undefined) throw new Error('a file came in before its request');
      const place = upload.results.push(undefined) - 1;
      // A connection that is lost while the file waits for its place is an error of the reading below as well.
      file.stream.once('error', () => undefined);
      const free = upload.places.at(-inHand) ?? Promise.resolve();
      const taking = free.then(async () => {
        const received = await gather(file.stream, file.originalname.slice(0, longestName), upload, deps.env.upload);
        upload.results[place] = await takeFile(deps, callerOf(request), received);
      });
      upload.places.push(
        taking.then(
          () => undefined,
          () => undefined,
        ),
      );
      taking.then(() => done(null, {}), done);
    },
    _removeFile(_request, _file, done) {
      done(null);
    },
  };
}

async function gather(stream: Readable, name: string, upload: Upload, limits: Limits): Promise<ReceivedFile> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of stream as AsyncIterable<Buffer>) {
    size += chunk.length;
    upload.received += chunk.length;
    // A file over the limit is read to its end, so that the others are still seen, but not kept.
    if (size <= limits.fileBytes) chunks.push(chunk);
    else chunks.length = 0;
  }
  if (upload.received > limits.totalBytes) throw tooMuch(limits);
  return { name, size, bytes: size > limits.fileBytes ? null : Buffer.concat(chunks) };
}
