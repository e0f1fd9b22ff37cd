/** Between samples [column, row] and pixels of the picture as it is shown. A whole number is the centre of a sample. */
import type { Point } from './overlay-strokes';
import type { Region } from './region';

export interface Size {
  readonly width: number;
  readonly height: number;
}

export const pointOf = ([column, row]: readonly [number, number], size: Size, region: Region): Point => ({
  x: ((column + 0.5 - region.left) / region.columns) * size.width,
  y: ((row + 0.5 - region.top) / region.rows) * size.height,
});

/** Rounded to a tenth of a sample: finer than any hand. */
export const sampleOf = ({ x, y }: Point, size: Size, region: Region): [column: number, row: number] => {
  const tenth = (value: number) => Math.round(value * 10) / 10;
  return [tenth(region.left + (x / size.width) * region.columns - 0.5), tenth(region.top + (y / size.height) * region.rows - 0.5)];
};
