/** What the server measures under a mark: a line profile with its spectrum, statistics of a region. */
import { useQuery } from '@tanstack/react-query';
import { measureProfile, measureRegion, type regionShapes } from '@/server/contract/measurements';
import { call } from './call';

/** A point of a mark, [column, row] in pixels. */
type Point = readonly [column: number, row: number];

const cornersOf = ([fromColumn, fromRow]: Point, [toColumn, toRow]: Point) => ({ fromRow, fromColumn, toRow, toColumn });

/** Pixels of an image do not change: what was measured stays true. */
const forGood = { staleTime: Infinity } as const;

export const useProfile = (imageId: string, frame: number, from: Point, to: Point) =>
  useQuery({
    queryKey: ['profile', imageId, frame, from, to],
    queryFn: ({ signal }) => call(measureProfile, { params: { imageId }, query: { frame, ...cornersOf(from, to) } }, signal),
    ...forGood,
  });

export const useRegionStatistics = (imageId: string, frame: number, shape: (typeof regionShapes)[number], from: Point, to: Point) =>
  useQuery({
    queryKey: ['statistics', imageId, frame, shape, from, to],
    queryFn: ({ signal }) => call(measureRegion, { params: { imageId }, query: { frame, shape, ...cornersOf(from, to) } }, signal),
    ...forGood,
  });
