/** Series: its slices in the order of space, and which of its files have arrived. */
import type { z } from 'zod';
import type { Database } from '../../db/client';
import type { ImageRow } from '../../db/queries/images';
import { findSent, listSeriesOf } from '../../db/queries/series';
import { frameFactsSchema, type ScanFacts } from '../contract/facts';
import type { findSentFiles, Slice } from '../contract/series';
import type { Dependencies } from '../dependencies';
import { departmentKey, fileKeyOf } from '../dicom/unique-identifiers';
import { currentFacts, requireImage } from './image-source';
import type { Caller } from './sessions';

interface Placed extends Slice {
  readonly instanceNumber: number;
}

/** The slices around an image. Of two images that are the same slice, sent twice, the one asked for is taken, else the one sent first. */
export async function readSlices(db: Database, caller: Caller, imageId: string): Promise<Slice[]> {
  const asked = await requireImage(db, caller, imageId);
  const once = new Map<string, ImageRow>();
  for (const row of [asked, ...(await listSeriesOf(db, asked))]) {
    const name = row.imageKey ?? row.id;
    if (!once.has(name)) once.set(name, row);
  }
  const facts = currentFacts(asked);
  return [...once.values()]
    .filter((row) => isParallel(currentFacts(row), facts))
    .flatMap(placed)
    .sort(inOrder)
    .map(({ instanceNumber: _order, ...slice }) => slice);
}

function placed(row: ImageRow): Placed[] {
  const facts = currentFacts(row);
  return frameFactsSchema
    .array()
    .parse(row.frameFacts)
    .map(({ positionMm, timeOfDay, label }, frame) => ({
      ...{ imageId: row.id, frame, timeOfDay, label },
      positionMm: alongNormal(positionMm, facts),
      instanceNumber: facts.instanceNumber.value ?? 0,
    }));
}

type Vector = readonly [number, number, number];
const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

/** The normal of the plane: the direction of rows × that of columns (DICOM PS3.3 C.7.6.2.1.1). */
function normalOf({ imageOrientation }: ScanFacts): Vector | undefined {
  const [a, b, c, d, e, f] = imageOrientation.value ?? [];
  if (a === undefined || b === undefined || c === undefined || d === undefined || e === undefined || f === undefined) return undefined;
  return [b * f - c * e, c * d - a * f, a * e - b * d];
}

function alongNormal(position: Vector | null, facts: ScanFacts): number | null {
  const normal = normalOf(facts);
  return position === null || normal === undefined ? null : dot(position, normal);
}

/** Normals further apart than about three degrees are those of another stack, as in a scan for planning (common practice). */
const leastCosine = 0.9986;

function isParallel(one: ScanFacts, other: ScanFacts): boolean {
  const [a, b] = [normalOf(one), normalOf(other)];
  return a === undefined || b === undefined ? a === b : dot(a, b) >= leastCosine;
}

/** Places nearer than this, in mm, are one: rounding of the header. */
const samePlace = 1e-3;

/** By place, then as they were numbered; a place that is not known comes last. */
function inOrder(a: Placed, b: Placed): number {
  if ((a.positionMm === null) !== (b.positionMm === null)) return a.positionMm === null ? 1 : -1;
  const apart = (a.positionMm ?? 0) - (b.positionMm ?? 0);
  return Math.abs(apart) > samePlace ? apart : a.instanceNumber - b.instanceNumber || a.frame - b.frame;
}

/** What of these files the caller has sent. */
export async function findSentFilesOf(
  { db, identityKey }: Pick<Dependencies, 'db' | 'identityKey'>,
  caller: Caller,
  digests: string[],
): Promise<z.input<typeof findSentFiles.output>> {
  const key = departmentKey(identityKey, caller.departmentId);
  const digestOf = new Map(digests.map((digest) => [fileKeyOf(key, digest), digest]));
  const imageIds = new Map<string, string[]>();
  for (const { id, fileKey } of await findSent(db, caller.memberId, [...digestOf.keys()])) {
    const digest = digestOf.get(fileKey ?? '');
    if (digest !== undefined) imageIds.set(digest, [...(imageIds.get(digest) ?? []), id]);
  }
  return [...imageIds].map(([digest, ids]) => ({ digest, imageIds: ids }));
}
