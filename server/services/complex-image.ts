/**
 * Complex images of two that were stored apart. They must be parts of one signal: the same exam, size, plane, places and echo times; what the
 * header does not say is not assumed, for a phase laid over another slice looks like a fault of the scanner.
 */
import type { z } from 'zod';
import { addImages, listPartners, type ImageRow, type NewImage } from '../../db/queries/images';
import type { Parts } from '../../recon/complex-image';
import { frameFactsSchema } from '../contract/facts';
import type { Image, makeComplexImage as makeComplexImageRoute, readPairs } from '../contract/images';
import type { Dependencies } from '../dependencies';
import { unknownUnitCode } from '../dicom/pixel-warnings';
import { AppError } from '../errors';
import { currentFacts, describeImage, requireImage, requireNamedImage } from './image-source';
import type { Caller } from './sessions';

type Wish = z.output<typeof makeComplexImageRoute.body>;
type Needs = Pick<Dependencies, 'db' | 'objects' | 'values' | 'workers'>;

const partnerOf: Partial<Record<ImageRow['component'], ImageRow['component']>> = {
  magnitude: 'phase',
  phase: 'magnitude',
  real: 'imaginary',
  imaginary: 'real',
};

/** The images with which this one makes a complex image, those of the nearest series first. */
export async function pairsOf(
  { db }: Pick<Dependencies, 'db'>,
  caller: Caller,
  imageId: string,
): Promise<z.output<typeof readPairs.output>> {
  const row = await requireImage(db, caller, imageId);
  const component = partnerOf[row.component];
  if (component === undefined || row.studyKey === null) return [];
  const partners = await listPartners(db, row, component);
  const seriesOf = (image: ImageRow) => currentFacts(image).seriesNumber.value ?? 0;
  const away = (image: ImageRow) => Math.abs(seriesOf(image) - seriesOf(row));
  return partners
    .filter((partner) => pairFault(row, partner) === undefined)
    .sort((a, b) => away(a) - away(b))
    .map(({ id }) => ({ imageId: id, component }));
}

export async function makeComplexImage(deps: Needs, caller: Caller, wish: Wish, gone: AbortSignal): Promise<Image> {
  const isPolar = 'magnitudeId' in wish;
  const [firstId, secondId] = isPolar ? [wish.magnitudeId, wish.phaseId] : [wish.realId, wish.imaginaryId];
  const [firstPath, secondPath] = isPolar ? (['magnitudeId', 'phaseId'] as const) : (['realId', 'imaginaryId'] as const);
  const first = await requireNamedImage(deps.db, caller, firstId, [firstPath]);
  const second = await requireNamedImage(deps.db, caller, secondId, [secondPath]);
  const isFirst = first.component === (isPolar ? 'magnitude' : 'real');
  if (!isFirst) throw notAPair(firstPath, `this image is not the ${isPolar ? 'magnitude' : 'real part'}`);
  const fault = pairFault(first, second);
  if (fault !== undefined) throw notAPair(secondPath, fault);
  return storeComplex(deps, caller, { first, second, parts: isPolar ? 'polar' : 'cartesian' }, gone);
}

const notAPair = (path: string, message: string) =>
  new AppError('not-computable', { detail: `The two images make no complex image: ${message}`, issues: [{ path: [path], message }] });

/** Positions are written in tenths or hundredths of a millimetre; slices lie further apart. */
const sameMm = 0.05;
/** Direction cosines are written with few digits. */
const sameCosine = 1e-3;
const sameMs = 0.01;

/** Why two images are not parts of one signal. */
function pairFault(one: ImageRow, other: ImageRow): string | undefined {
  if (partnerOf[one.component] !== other.component) return 'a complex image is made of magnitude and phase, or of real and imaginary part';
  if (one.use === 'look-only' || other.use === 'look-only') return 'one of them was captured, computed or reformatted';
  if ([one, other].some(({ warnings }) => warnings.some(({ code }) => code === unknownUnitCode)))
    return 'the header does not say what the phase counts in';
  if (one.studyKey === null || one.studyKey !== other.studyKey) return 'they are not of the same exam, as far as the headers say';
  if (one.rows !== other.rows || one.columns !== other.columns || one.frames !== other.frames)
    return 'they differ in size or number of frames';
  return geometryFault(one, other);
}

function geometryFault(one: ImageRow, other: ImageRow): string | undefined {
  if (!areNear(one.spacingMm, other.spacingMm, sameMm)) return 'their pixels differ in size, or the header gives none';
  const [a, b] = [currentFacts(one), currentFacts(other)];
  if (!areNear(a.imageOrientation.value, b.imageOrientation.value, sameCosine))
    return 'they lie in different planes, or the header is silent';
  const [framesOfOne, framesOfOther] = [one, other].map(({ frameFacts }) => frameFactsSchema.array().parse(frameFacts));
  const pairs = (framesOfOne ?? []).map((frame, i) => [frame, framesOfOther?.[i]] as const);
  if (!pairs.every(([frame, partner]) => areNear(frame.positionMm, partner?.positionMm, sameMm)))
    return 'their slices lie in different places, or the header does not say where';
  const echoes = pairs.filter(([frame, partner]) => frame.echoTimeMs !== null && (partner?.echoTimeMs ?? null) !== null);
  return echoes.every(([frame, partner]) => areNear([frame.echoTimeMs ?? NaN], [partner?.echoTimeMs ?? NaN], sameMs))
    ? undefined
    : 'they are of different echoes';
}

/** Numbers that are all there and differ by no more than `most`. */
function areNear(a: readonly number[] | null | undefined, b: readonly number[] | null | undefined, most: number): boolean {
  if (!a || !b || a.length !== b.length) return false;
  return a.every((value, i) => Math.abs(value - (b[i] ?? NaN)) <= most);
}

interface Pair {
  readonly first: ImageRow;
  readonly second: ImageRow;
  readonly parts: Parts;
}

async function storeComplex(deps: Needs, caller: Caller, { first, second, parts }: Pair, gone: AbortSignal): Promise<Image> {
  const sources = { first: await deps.values.read(first.valuesDigest), second: await deps.values.read(second.valuesDigest) };
  const { values, range } = await deps.workers.pair({ kind: 'pair', parts, ...sources }, gone);
  const { id: _id, uploadedAt: _at, ...ofFirst } = first;
  const kept: NewImage = {
    ...ofFirst,
    ...{ uploaderId: caller.memberId, arrival: 'made-here', component: 'complex', scannerId: first.scannerId },
    valuesDigest: await deps.objects.put(values),
    ...{ rangeLow: range[0], rangeHigh: range[1], imageKey: null, fileKey: null },
    warnings: [pairedWarning(parts), ...first.warnings.filter(({ code }) => code !== 'magnitude-only' && code !== 'one-component')],
    removedTags: union(first.removedTags, second.removedTags),
    replacedTags: union(first.replacedTags, second.replacedTags),
  };
  const [row] = await addImages(deps.db, [kept]);
  if (row === undefined) throw new RangeError('one image was added, got none');
  return describeImage(row);
}

const pairedWarning = (parts: Parts) => ({
  code: 'made-of-two',
  text: `This complex image was made here of ${parts === 'polar' ? 'magnitude and phase' : 'real and imaginary part'}. Its k-space has a phase of its own; it is derived from the images all the same, and is not the scanner’s raw data.`,
});

const union = (a: readonly string[], b: readonly string[]): string[] => [...new Set([...a, ...b])].sort();
