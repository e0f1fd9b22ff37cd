/**
 * A preview while a slider moves: one cause on an object whose transform is kept, zero-filled reconstruction, magnitude. Every
 * call has another parameter, as under a hand. Goals: 5 and 20 ms leave a frame of 55 and 90 ms to the network and the screen.
 */
import type { Acquisition } from '../../recon/acquisition';
import { asComplex } from '../../recon/grid';
import { headGrid, headImage } from '../../recon/phantoms/head';
import { prepare, simulate } from '../../recon/simulate';
import { type Figure, medianMs } from './figure';

const goals = { 256: 5, 512: 20 } as const;
const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5, averages: 1 };

export async function previewFigures(): Promise<Figure[]> {
  const figures: Figure[] = [];
  for (const size of [256, 512] as const) {
    const prepared = prepare(asComplex(headImage(headGrid(size))));
    let call = 0;
    const preview = () => {
      const parameters = { phaseSwing: 0.2 + (call++ % 50) / 100 };
      const steps = [{ cause: 'periodic-motion', parameters }];
      simulate(prepared, { steps, reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 }, acquisition);
    };
    const value = await medianMs(preview, { calls: 40 });
    figures.push({ id: `preview-one-step-${size}`, value, unit: 'ms', goal: goals[size], better: 'lower', note: 'periodic motion' });
  }
  return figures;
}
