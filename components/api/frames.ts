/** Pictures of the frames of an image. */
import { readThumbnail } from '@/server/contract/images';
import { addressOf } from './call';

/** Address of the small picture of one frame, or of its log-magnitude k-space. */
export const frameThumbnailOf = (imageId: string, frame: number, domain: 'image' | 'kspace' = 'image'): string =>
  addressOf(readThumbnail.path, { imageId }, { ...(frame === 0 ? {} : { frame }), ...(domain === 'image' ? {} : { domain }) });
