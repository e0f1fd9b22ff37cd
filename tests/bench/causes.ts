/**
 * The slowest model of the catalogue: every cause and every reconstruction at its initial values, and the courses of motion that turn the
 * object in every line. Each call has another seed, so that nothing but the transform of the object is kept. Goal: 100 ms, within which
 * an answer is felt as coming at once (Miller, AFIPS Fall Joint Computer Conference 1968;33:267, from memory).
 */
import type { Acquisition } from '../../recon/acquisition';
import { causes } from '../../recon/causes';
import { asComplex } from '../../recon/grid';
import { headGrid, headImage } from '../../recon/phantoms/head';
import type { Step } from '../../recon/recipe';
import { reconstructions } from '../../recon/reconstructions';
import { prepare, simulate } from '../../recon/simulate';
import { type Figure, medianMs } from './figure';

const side = 256;
const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5, averages: 1 };

interface Tried {
  readonly name: string;
  readonly step: Step;
  readonly method: string;
}

const tried: readonly Tried[] = [
  ...causes.map(({ id }) => ({ name: id, step: { cause: id, parameters: {} }, method: 'zero-filled' })),
  ...['random-walk', 'drift'].map((course) => ({
    name: `rigid-motion, ${course}`,
    step: { cause: 'rigid-motion', parameters: { course } },
    method: 'zero-filled',
  })),
  ...reconstructions.map(({ id }) => ({ name: id, step: { cause: 'partial-fourier', parameters: {} }, method: id })),
];

export async function causeFigures(): Promise<Figure[]> {
  const prepared = prepare(asComplex(headImage(headGrid(side))));
  const times: { name: string; value: number }[] = [];
  for (const { name, step, method } of tried) {
    let seed = 1;
    const run = () =>
      simulate(prepared, { steps: [step], reconstruction: { method, parameters: {} }, seed: seed++ }, acquisition).giveBack();
    times.push({ name, value: await medianMs(run, { calls: 7, warmUp: 3 }) });
  }
  times.sort((a, b) => b.value - a.value);
  const [slowest, ...others] = times;
  if (!slowest) throw new Error('the catalogue is empty');
  const next = others.slice(0, 4).map(({ name, value }) => `${name} ${value.toFixed(0)}`);
  return [
    {
      id: `slowest-cause-${side}`,
      value: slowest.value,
      unit: 'ms',
      goal: 100,
      better: 'lower',
      note: `${slowest.name}; then ${next.join(', ')}`,
    },
  ];
}
