/** Measures of uniformity and SNR as phantom tests define them, and the disc that they are taken on. */
import type { ComplexPlane, Plane } from '../../recon/grid';
import { centredGrid, complexZeros } from '../../recon/grid';

/** 1 within `radius` pixels of the centre sample, 0 outside. */
export function disc(size: number, radius: number, spacing = 1e-3): ComplexPlane {
  const plane = complexZeros(centredGrid(size, size, [spacing, spacing]));
  const centre = Math.floor(size / 2);
  for (let i = 0; i < plane.re.length; i++) {
    if (Math.hypot(Math.floor(i / size) - centre, (i % size) - centre) <= radius) plane.re[i] = 1;
  }
  return plane;
}

/** Percent integral uniformity, 100·(1 − (high − low)/(high + low)); ACR large phantom, slice 7. */
export const integralUniformity = (high: number, low: number): number => 100 * (1 - (high - low) / (high + low));

/** Mean of the pixels within `radius` of (row, column), which must lie that far inside. */
export function meanAround({ values, columns }: Plane, row: number, column: number, radius: number): number {
  let sum = 0;
  let n = 0;
  for (let y = Math.ceil(row - radius); y <= row + radius; y++) {
    for (let x = Math.ceil(column - radius); x <= column + radius; x++) {
      if (Math.hypot(y - row, x - column) > radius) continue;
      sum += values[y * columns + x] ?? NaN;
      n++;
    }
  }
  return sum / n;
}

/** That of a disc of `radius` pixels about the centre: brightest and darkest small region, radius 2, that lies within it. */
export function uniformityOfDisc(image: Plane, radius: number): number {
  const [centreRow, centreColumn] = [Math.floor(image.rows / 2), Math.floor(image.columns / 2)];
  const means: number[] = [];
  for (let row = 0; row < image.rows; row++) {
    for (let column = 0; column < image.columns; column++) {
      if (Math.hypot(row - centreRow, column - centreColumn) > radius - 2) continue;
      means.push(meanAround(image, row, column, 2));
    }
  }
  return integralUniformity(Math.max(...means), Math.min(...means));
}
