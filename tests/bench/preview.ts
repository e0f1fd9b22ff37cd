/**
 * A preview while a slider moves: one cause or three on an object whose transform is kept, zero-filled reconstruction, magnitude. Every
 * call has another parameter of the first cause to act, so that nothing between the steps can be kept, and hands its arrays on as a worker
 * does once its answer is written. Goals: 5, 8 and 20 ms leave
 * a frame of 55 to 90 ms to the network and the screen.
 */
import type { Acquisition } from '../../recon/acquisition';
import { asComplex } from '../../recon/grid';
import { headGrid, headImage } from '../../recon/phantoms/head';
import type { Step } from '../../recon/recipe';
import { prepare, simulate } from '../../recon/simulate';
import { type Figure, medianMs } from './figure';

const goals = { 256: 5, 320: 8, 512: 20 } as const;
const sides = [256, 320, 512] as const;
const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5, averages: 1 };

/** One cause; three of them: half the lines skipped, motion, a receiver out of balance. What moves is the first to act. */
const stepsOf = {
  one: (call: number): Step[] => [{ cause: 'periodic-motion', parameters: { phaseSwing: 0.2 + (call % 50) / 100 } }],
  three: (call: number): Step[] => [
    { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: call % 50 } },
    { cause: 'periodic-motion', parameters: { phaseSwing: 0.6 } },
    { cause: 'quadrature-imbalance', parameters: { gain: 1.15, angle: 3 } },
  ],
} as const;

export async function previewFigures(): Promise<Figure[]> {
  const figures: Figure[] = [];
  for (const size of sides) {
    const prepared = prepare(asComplex(headImage(headGrid(size))));
    for (const [count, steps] of Object.entries(stepsOf)) {
      let call = 0;
      const preview = () =>
        simulate(
          prepared,
          { steps: steps(call++), reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 },
          acquisition,
        ).giveBack();
      const value = await medianMs(preview, { calls: 40 });
      figures.push({
        id: `preview-${count}-step${count === 'one' ? '' : 's'}-${size}`,
        value,
        unit: 'ms',
        goal: goals[size],
        better: 'lower',
      });
    }
  }
  return figures;
}
