/**
 * How time grows from 128² to 1024² pixels, against N log N of the number of pixels, and how many complex planes (re and im in float64) a
 * six-step simulation leaves standing: the object, its transform, what is kept between steps, and the result.
 */
import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import type { Acquisition } from '../../recon/acquisition';
import { asComplex } from '../../recon/grid';
import { headGrid, headImage } from '../../recon/phantoms/head';
import { prepare, simulate } from '../../recon/simulate';
import { type Figure, medianMs } from './figure';
import { recipeOf } from './pipeline';

const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5, averages: 1 };
const sides = [128, 256, 512, 1024] as const;

export async function growthFigures(): Promise<Figure[]> {
  const times: number[] = [];
  for (const side of sides) {
    const source = asComplex(headImage(headGrid(side)));
    times.push(await medianMs(() => simulate(source, recipeOf(0.8), acquisition).giveBack(), { calls: 9, warmUp: 3 }));
  }
  const work = sides.map((side) => side * side * Math.log2(side * side));
  const ratio = (of: readonly number[]): number => (of.at(-1) ?? NaN) / (of[0] ?? NaN);
  return [
    {
      id: 'growth-128-1024',
      value: ratio(times) / ratio(work),
      unit: '× N log N',
      goal: 2,
      better: 'lower',
      note: sides.map((side, i) => `${side}²: ${times[i]?.toFixed(1)} ms`).join(', '),
    },
    { id: 'memory-kept-six-steps', value: keptPlanes(), unit: 'planes', goal: 12, better: 'lower', note: '512², after collecting garbage' },
  ];
}

/** Complex planes held after two runs of six steps of which the last moved, with both results still in hand. */
function keptPlanes(): number {
  const side = 512;
  setFlagsFromString('--expose-gc');
  const collect = runInNewContext('gc') as () => void;
  const held = () => {
    collect();
    return process.memoryUsage().arrayBuffers;
  };
  const before = held();
  const prepared = prepare(asComplex(headImage(headGrid(side))));
  const results = [0.8, 0.7].map((level) => simulate(prepared, recipeOf(level), acquisition));
  const planes = (held() - before) / (2 * Float64Array.BYTES_PER_ELEMENT * side * side);
  if (results.some(({ image }) => image.rows !== side)) throw new Error('the pictures have another size than the object');
  return planes;
}
