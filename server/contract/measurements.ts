/** Measurements on an image: a line profile with its spectrum, statistics of a region. Places are [row, column] in pixels. */
import { z } from 'zod';
import { everyMember, identifier, route } from './route';

const imageParams = z.object({ imageId: identifier });
const frame = z.coerce.number().int().min(0).default(0);
const place = z.coerce.number().min(-8192).max(8192);

/** A line of numbers, not an image: it travels as JSON. */
export const profileSchema = z.object({
  /** Millimetres from the start; pixels of 1 mm where the header gives no spacing. */
  distanceMm: z.array(z.number()),
  values: z.array(z.number()),
  /** Cycles per metre, from 0 to half the sampling rate. */
  frequency: z.array(z.number()),
  /** Modulus of the transform of the profile less its mean, over the number of samples. */
  amplitude: z.array(z.number()),
  /** The highest peak of the spectrum at two cycles along the line or more; null where there is none. Anatomy has one too. */
  strongest: z.object({ frequency: z.number(), periodMm: z.number(), amplitude: z.number() }).nullable(),
});
export type MeasuredProfile = z.infer<typeof profileSchema>;

export const measureProfile = route({
  method: 'get',
  path: '/api/images/:imageId/profile',
  summary: 'Values along a line, about one a pixel, and their spectrum',
  access: everyMember,
  params: imageParams,
  query: z.object({ frame, fromRow: place, fromColumn: place, toRow: place, toColumn: place }),
  output: profileSchema,
});

export const regionShapes = ['rectangle', 'ellipse'] as const;
export const statisticsSchema = z.object({
  pixels: z.number().int(),
  mean: z.number(),
  /** Of the sample. */
  standardDeviation: z.number(),
  min: z.number(),
  max: z.number(),
  median: z.number(),
});
export type MeasuredStatistics = z.infer<typeof statisticsSchema>;

export const measureRegion = route({
  method: 'get',
  path: '/api/images/:imageId/statistics',
  summary: 'Statistics of the pixels whose centres lie in a rectangle, or in the ellipse within it, given by two corners',
  access: everyMember,
  params: imageParams,
  query: z.object({
    frame,
    shape: z.enum(regionShapes).default('rectangle'),
    fromRow: place,
    fromColumn: place,
    toRow: place,
    toColumn: place,
  }),
  output: statisticsSchema,
});
