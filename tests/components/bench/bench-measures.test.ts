/** Sizes on the bench: the look's own measures, worked out by hand. */
import { nearestStep, pictureSize, proportionOf, sheetHeight } from '@/components/bench/bench-measures';

describe('a picture on the bench', () => {
  it('keeps the proportions of the field of view, not of the matrix', () => {
    expect(proportionOf({ rows: 128, columns: 256, spacing: [2, 1] })).toBe(1);
  });

  it('is as large as the room allows, on the 4-pixel grid', () => {
    expect(pictureSize({ width: 403, height: 500 }, 1)).toEqual({ width: 400, height: 400 });
    expect(pictureSize({ width: 403, height: 300 }, 1.5)).toEqual({ width: 200, height: 300 });
  });
});

describe('the sheet of a phone', () => {
  it('closes to its tabs and the compare footer', () => {
    expect(sheetHeight('closed', 844)).toBe(142);
  });

  it('reaches up to the header when it is full', () => {
    expect(sheetHeight('full', 844)).toBe(800);
  });

  it('settles at the step nearest to where the hand let it go', () => {
    expect([150, 400, 700].map((height) => nearestStep(height, 844))).toEqual(['closed', 'half', 'full']);
  });
});
