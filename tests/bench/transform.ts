/**
 * The transform of one slice, forward, complex in and out. The peer is fft-js on the same values, rows and then columns, without
 * the scale and the shift of the origin, which ours includes. Goals: a transform well inside the preview's budget.
 */
import { fft } from 'fft-js';
import { transform } from '../../recon/fourier';
import { asComplex, type ComplexPlane } from '../../recon/grid';
import { headGrid, headImage } from '../../recon/phantoms/head';
import { type Figure, medianMs } from './figure';

const goals = { 256: 3, 512: 15 } as const;

export async function transformFigures(): Promise<Figure[]> {
  const figures: Figure[] = [];
  for (const size of [256, 512] as const) {
    const plane = asComplex(headImage(headGrid(size)));
    const value = await medianMs(() => transform(plane), { calls: 40 });
    const table = asPairs(plane);
    const peer = await medianMs(() => transformByPeer(table), { calls: 3, warmUp: 1 });
    figures.push({ id: `transform-${size}`, value, unit: 'ms', goal: goals[size], better: 'lower', peer: { name: 'fft-js', value: peer } });
  }
  return figures;
}

type Pair = readonly [number, number];

const asPairs = ({ rows, columns, re, im }: ComplexPlane): Pair[][] =>
  Array.from({ length: rows }, (_, row) =>
    Array.from({ length: columns }, (_, column) => [re[row * columns + column] ?? 0, im[row * columns + column] ?? 0]),
  );

function transformByPeer(table: readonly (readonly Pair[])[]): Pair[][] {
  const alongRows = table.map((row) => fft(row));
  const columns = alongRows[0]?.map((_, column) => fft(alongRows.map((row): Pair => row[column] ?? [0, 0]))) ?? [];
  return columns;
}
