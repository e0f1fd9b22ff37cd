/**
 * STOW-RS, Store Instances: DICOM PS3.18 section 10.5. The answer names each object by the identifiers that its sender gave it, which are read
 * from the file meta information for this answer alone and kept nowhere.
 */
import type { Request } from 'express';
import dicomParser from 'dicom-parser';
import type { z } from 'zod';
import type { storeInstances } from '../contract/push';
import { invalidAt } from '../errors';
import { boundaryOf, partsOf, type Part } from './multipart-related';
import { receiveObject, type PushDependencies } from './receive';
import { statusOf } from './status';
import type { SendingScanner } from './tokens';

type Answer = z.output<typeof storeInstances.output>;

/** PS3.18 annex F.2: an attribute with its VR and values. */
const attribute = (vr: string, ...Value: unknown[]) => ({ vr, Value });

interface Outcome {
  readonly reference: Record<string, ReturnType<typeof attribute>> | undefined;
  readonly failure: number | undefined;
}

/** Takes the objects of a request one after the other. An object that is refused does not stop the next. */
export async function storeSent(deps: PushDependencies, scanner: SendingScanner, request: Request): Promise<Answer> {
  const { upload } = deps.env;
  const limits = { partBytes: upload.fileBytes, parts: upload.files, totalBytes: upload.totalBytes };
  const outcomes: Outcome[] = [];
  for await (const part of partsOf(request, boundaryOf(request.headers['content-type']), limits)) {
    outcomes.push(await storePart(deps, scanner, part));
  }
  if (outcomes.length === 0) throw invalidAt([], 'no object was sent');
  return answerOf(outcomes);
}

async function storePart(deps: PushDependencies, scanner: SendingScanner, { mediaType, bytes }: Part): Promise<Outcome> {
  const isDicom = mediaType === undefined || mediaType === 'application/dicom';
  const received = isDicom
    ? await receiveObject(deps, scanner, bytes, 'web-push')
    : ({ refused: 'not-dicom', reason: 'the part is of another media type' } as const);
  return {
    reference: bytes === null ? undefined : referenceOf(bytes),
    failure: received === null ? undefined : statusOf(received.refused),
  };
}

/** SOP class and instance of a file; undefined where it does not say them. */
function referenceOf(bytes: Buffer): Outcome['reference'] {
  const sopClass = metaUid(bytes, 'x00020002');
  const instance = metaUid(bytes, 'x00020003');
  if (sopClass === undefined || instance === undefined) return undefined;
  return { '00081150': attribute('UI', sopClass), '00081155': attribute('UI', instance) };
}

/** This is the event loop: what is read here of a stranger's file is short. */
const longestMeta = 4096;

function metaUid(bytes: Buffer, tag: string): string | undefined {
  try {
    const uid = dicomParser.readPart10Header(bytes.subarray(0, longestMeta), { untilTag: '' }).string(tag);
    return uid !== undefined && /^[0-9.]{1,64}$/.test(uid) ? uid : undefined;
  } catch {
    // What is no DICOM file has no identifiers; the door has said so.
    return undefined;
  }
}

/** Failed SOP Sequence, Referenced SOP Sequence and Other Failures Sequence: PS3.18 table I.1-1. */
function answerOf(outcomes: readonly Outcome[]): Answer {
  const stored = outcomes.flatMap(({ reference, failure }) => (failure === undefined ? [reference ?? {}] : []));
  const named = outcomes.flatMap(({ reference, failure }) =>
    failure === undefined || reference === undefined ? [] : [{ ...reference, '00081197': attribute('US', failure) }],
  );
  const nameless = outcomes.flatMap(({ reference, failure }) =>
    failure === undefined || reference !== undefined ? [] : [{ '00081197': attribute('US', failure) }],
  );
  return {
    ...(named.length > 0 ? { '00081198': attribute('SQ', ...named) } : {}),
    ...(stored.length > 0 ? { '00081199': attribute('SQ', ...stored) } : {}),
    ...(nameless.length > 0 ? { '0008119A': attribute('SQ', ...nameless) } : {}),
  };
}
