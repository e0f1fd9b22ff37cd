/** Measurements on one frame of an image: a line profile with its spectrum, statistics of a region. */
import type { z } from 'zod';
import type { MeasuredProfile, measureProfile, MeasuredStatistics, measureRegion } from '../contract/measurements';
import type { Dependencies } from '../dependencies';
import { AppError } from '../errors';
import { requireImage, sourceOf } from './image-source';
import type { Caller } from './sessions';

type Needs = Pick<Dependencies, 'db' | 'values' | 'workers'>;
type ProfileWish = z.output<typeof measureProfile.params> & z.output<typeof measureProfile.query>;
type RegionWish = z.output<typeof measureRegion.params> & z.output<typeof measureRegion.query>;

export async function profileOf(deps: Needs, caller: Caller, wish: ProfileWish, gone: AbortSignal): Promise<MeasuredProfile> {
  const { profile } = await run(deps, caller, { ...wish, shape: 'line' }, gone);
  if (profile === undefined) throw new AppError('not-computable', { detail: 'A profile needs two places' });
  return profile;
}

export async function statisticsOf(deps: Needs, caller: Caller, wish: RegionWish, gone: AbortSignal): Promise<MeasuredStatistics> {
  const { statistics } = await run(deps, caller, wish, gone);
  if (statistics === undefined) throw new AppError('not-computable', { detail: 'No pixel of the image lies in this region' });
  return statistics;
}

type Wish = ProfileWish & { readonly shape: 'line' | 'rectangle' | 'ellipse' };

async function run(deps: Needs, caller: Caller, { imageId, frame, shape, ...corners }: Wish, gone: AbortSignal) {
  const source = await sourceOf(deps, await requireImage(deps.db, caller, imageId), frame);
  const from = { row: corners.fromRow, column: corners.fromColumn };
  const to = { row: corners.toRow, column: corners.toColumn };
  return deps.workers.measure({ kind: 'measure', source, shape, from, to }, gone);
}
