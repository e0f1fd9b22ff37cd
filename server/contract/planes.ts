/**
 * Planes: typed arrays on the wire, little-endian, row-major, one after the other. Never JSON.
 *
 * `spacing` and `origin` are millimetres for images and cycles per metre for k-space, [row, column].
 *
 * Exact form (default): `image` and real planes are float32, k-space is complex64 (interleaved re, im).
 * Display form (`Accept: application/vnd.pickglass.display`): every plane is uint16 with `low` and `high`, the values of 0 and
 * 65535; a k-space plane comes as two: `<name>.log` (log10 of the magnitude over its maximum, clamped at −8) and
 * `<name>.phase` (radians, −π to π).
 */
import { z } from 'zod';

export const displayMediaType = 'application/vnd.pickglass.display';
export const planesHeader = 'Pickglass-Planes';
export const metricsHeader = 'Pickglass-Metrics';

export const planeHeaderSchema = z.object({
  name: z.string(),
  rows: z.number().int(),
  columns: z.number().int(),
  type: z.enum(['float32', 'complex64', 'uint16']),
  spacing: z.tuple([z.number(), z.number()]),
  origin: z.tuple([z.number(), z.number()]),
  low: z.number().optional(),
  high: z.number().optional(),
});
export type PlaneHeader = z.infer<typeof planeHeaderSchema>;

const region = z.object({ kind: z.enum(['object', 'ghost', 'air']), pixels: z.number().int(), mean: z.number() });

export const metricsSchema = z.object({
  /** ‖g·s − b‖ / ‖b‖ with the least-squares gain g. */
  nrmse: z.number().nullable(),
  gain: z.number().nullable(),
  ssim: z.number().nullable(),
  /** Mean of the ghost region over the mean of the object; null, with the reason, where there is no such region. */
  ghostRatio: z.number().nullable(),
  ghostRatioOfBad: z.number().nullable(),
  ghostRegions: z.array(region).optional(),
  reason: z.string().optional(),
  /** Time spent computing, milliseconds. */
  computedInMs: z.number().optional(),
});
export type Metrics = z.infer<typeof metricsSchema>;
