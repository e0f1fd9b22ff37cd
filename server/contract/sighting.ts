/** What was seen on a bad image: the words that cases and the catalogue share. */
import { z } from 'zod';

export const sightings = ['ghosts', 'fold-in', 'lines', 'shading', 'distortion', 'blur', 'noise', 'signal-loss', 'other'] as const;
export const sightingSchema = z.enum(sightings);
export type Sighting = z.infer<typeof sightingSchema>;
