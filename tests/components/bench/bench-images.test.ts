/** Which images of a case the bench takes. */
import { imagesOf } from '@/components/bench/bench-images';

const image = (imageId: string, role: 'bad' | 'comparison' | 'phantom') => ({ imageId, role, addedAt: '2026-01-01T00:00:00Z' });

describe('the bench of a case', () => {
  it('runs the recipe on the comparison image and holds it against the bad one', () => {
    expect(imagesOf({ images: [image('c', 'comparison'), image('b', 'bad')], pictureImageId: 'b' })).toEqual({ badId: 'b', sourceId: 'c' });
  });

  it('prefers a comparison image to a phantom', () => {
    expect(imagesOf({ images: [image('b', 'bad'), image('p', 'phantom'), image('c', 'comparison')], pictureImageId: null })?.sourceId).toBe(
      'c',
    );
  });

  it('runs on the bad image itself where there is nothing to compare with', () => {
    expect(imagesOf({ images: [image('b', 'bad')], pictureImageId: 'b' })).toEqual({ badId: 'b', sourceId: 'b' });
  });

  it('has nothing to work on without an image', () => {
    expect(imagesOf({ images: [], pictureImageId: null })).toBeNull();
  });
});
