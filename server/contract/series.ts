/** Series: the slices around an image, in the order of space, and what of a series has been sent already. */
import { z } from 'zod';
import { everyMember, identifier, route } from './route';

/** One picture of a series: a frame of an image. */
export const sliceSchema = z.object({
  imageId: identifier,
  frame: z.number().int(),
  /** Along the normal of the plane, in mm, from the isocentre; null where the header is silent. */
  positionMm: z.number().nullable(),
  timeOfDay: z.string().nullable(),
  label: z.string().nullable(),
});
export type Slice = z.infer<typeof sliceSchema>;

export const readSlices = route({
  method: 'get',
  path: '/api/images/:imageId/slices',
  summary: 'The slices of the series that this image belongs to, in the order of space: frames of one image, or images of one series',
  access: everyMember,
  params: z.object({ imageId: identifier }),
  output: z.array(sliceSchema),
});

/** SHA-256 of a file, in hexadecimal. */
const digestSchema = z.string().regex(/^[0-9a-f]{64}$/, 'is 64 hexadecimal digits');

/** After a lost connection a client asks what has arrived, and sends the rest. Only what the caller sent counts, and what is on no case. */
export const findSentFiles = route({
  method: 'post',
  path: '/api/images/sent',
  summary: 'Which of these files, by the SHA-256 of their bytes, the caller has sent already, with the images made of each',
  access: everyMember,
  body: z.object({ digests: z.array(digestSchema).min(1).max(2000) }),
  output: z.array(z.object({ digest: digestSchema, imageIds: z.array(identifier) })),
});
