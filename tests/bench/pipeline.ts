/**
 * Six steps from the object to the picture, beside the same six in numpy (`pipeline.py`) on the same machine in the same run; the pictures
 * are compared first, so that the same work is timed. And what is saved where only the last of the six moves, as under a hand.
 */
import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Acquisition } from '../../recon/acquisition';
import { asComplex, type Plane } from '../../recon/grid';
import { headGrid, headImage } from '../../recon/phantoms/head';
import type { Recipe } from '../../recon/recipe';
import { prepare, simulate } from '../../recon/simulate';
import { type Figure, medianMs } from './figure';

const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5, averages: 1 };

/** The six steps of pipeline.py, with its numbers; the last, clipping, at `level` of the largest sample. */
export const recipeOf = (level: number): Recipe => ({
  steps: [
    { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 32 } },
    { cause: 'elliptical-coverage', parameters: { size: 1 } },
    { cause: 'periodic-motion', parameters: { frequency: 0.3, phaseSwing: 0.6, start: 0 } },
    { cause: 'half-field-ghost', parameters: { phase: 0.15, shift: 0.5, imbalance: 0, shots: 1 } },
    { cause: 'quadrature-imbalance', parameters: { gain: 1.15, angle: 3 } },
    { cause: 'clipping', parameters: { level } },
  ],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});

const side = 256;
const calls = 20;

export async function pipelineFigures(): Promise<Figure[]> {
  const object = headImage(headGrid(side));
  const source = asComplex(object);
  const peer = inNumpy(object, simulate(source, recipeOf(0.8), acquisition).image);
  const full = await medianMs(() => simulate(source, recipeOf(0.8), acquisition).giveBack(), { calls });
  const prepared = prepare(source);
  let call = 0;
  const last = await medianMs(() => simulate(prepared, recipeOf(0.5 + (call++ % 9) / 20), acquisition).giveBack(), { calls });
  return [
    {
      id: `pipeline-six-steps-${side}`,
      value: full,
      unit: 'ms',
      goal: Number((peer / 1.5).toPrecision(3)),
      better: 'lower',
      peer: { name: 'numpy', value: peer },
      note: 'goal: numpy takes 1.5 times as long',
    },
    { id: `last-of-six-steps-${side}`, value: last / full, unit: 'of all', goal: 0.333, better: 'lower', note: 'only the last step moves' },
  ];
}

/** Median milliseconds of the same pipeline in numpy. Throws where its picture is another. */
function inNumpy(object: Plane, ours: Plane): number {
  const folder = mkdtempSync(join(tmpdir(), 'pickglass-bench-'));
  try {
    const [input, output] = [join(folder, 'object'), join(folder, 'picture')];
    writeFileSync(input, object.values);
    const script = join(__dirname, 'pipeline.py');
    const median = Number(execFileSync('/usr/bin/python3', [script, String(side), String(calls), input, output], { encoding: 'utf8' }));
    const bytes = readFileSync(output);
    const theirs = new Float64Array(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength));
    const worst = theirs.reduce((largest, value, i) => Math.max(largest, Math.abs(value - (ours.values[i] ?? NaN))), 0);
    // Rounding of transforms of values of about 1.
    if (!(worst < 1e-9)) throw new Error(`numpy's picture is another, by ${worst}`);
    return median;
  } finally {
    rmSync(folder, { recursive: true });
  }
}
