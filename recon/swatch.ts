/**
 * The swatch of a cause: its own model on the phantom that shows it best, from mild to strong. Strength s runs from 0 to 1. One rule for every cause:
 * each quantity q goes along the line from its identity value (no effect) through its initial value, q(s) = identity + f·(initial −
 * identity), f from 1/4 at s = 0 to 5/2 at s = 1, kept within its range and on its step. A quantity that starts at its identity stays
 * there. A cause without an identity, or one that this line does not suit, states its two ends in `strength`.
 */
import type { Acquisition } from './acquisition';
import type { Cause } from './cause';
import type { Plane } from './grid';
import { onStep } from './initial';
import type { Quantity } from './parameter';
import { phantomOf } from './phantoms';
import { phantomGrid, phantomImage, type Phantom, type Scan } from './phantoms/phantom';
import type { ParameterValues, Recipe } from './recipe';

/** A T1-weighted spin echo at 1.5 T (times: common practice). */
const scan: Scan = { sequence: { kind: 'spin-echo', repetitionTime: 0.6, echoTime: 0.015 }, fieldStrength: 1.5 };

/** How a swatch is taken: phase encoding runs left and right; bandwidth: common practice. */
export const swatchAcquisition: Acquisition = {
  phaseEncode: 'row',
  repetitionTime: scan.sequence.repetitionTime,
  echoTime: scan.sequence.echoTime,
  flipAngle: Math.PI / 2,
  fieldStrength: scan.fieldStrength,
  bandwidthPerPixel: 130,
  acquisitionType: '2D',
  sliceThickness: 0.005,
};

/** The phantom of the swatch of a cause. */
export const swatchPhantom = ({ phantom = 'head' }: Pick<Cause, 'phantom'>): Phantom => phantomOf(phantom);

/** The phantom as the swatches scan it, on `side` × `side` pixels of its own field of view; the brightest is 1. */
export function swatchObject(phantom: Phantom, side: number): Plane {
  const { re: values, rows, columns, spacing, origin } = phantomImage(phantom, phantomGrid(phantom, side), scan);
  const brightest = values.reduce((most, value) => Math.max(most, value), 0);
  // Mixed pixels may fall a little below 0 where shapes cross; a magnitude does not.
  return { rows, columns, spacing, origin, values: values.map((value) => Math.max(0, value) / brightest) };
}

/** Parts of the way from identity to the initial value, and beyond, at which a swatch is mild and strong. */
const mildPart = 0.25;
const strongPart = 2.5;
/** The seed of what is random in a swatch, and of its object phase: the same picture every time. */
const seed = 7;
/** Total range of the object phase, radians, of causes that need one: as the bench starts with. */
const objectPhaseRange = 1.6;

/** The values of a quantity at both ends. */
export type Ends = readonly [mild: number, strong: number];

function endsOf(quantity: Quantity, identity: number): Ends {
  const way = quantity.initial - identity;
  const [mild, strong] = [mildPart, strongPart].map((part) => onStep(identity + part * way, quantity)) as [number, number];
  // A step coarser than the mild part of the way would end where nothing happens.
  return [mild === identity ? onStep(identity + Math.sign(way) * quantity.step, quantity) : mild, strong];
}

/** The quantities that strength moves, with their ends; the others stay at their initial values. */
export function strengthOf({ parameters, identity, strength }: Cause): Record<string, Ends> {
  const moved: Record<string, Ends> = {};
  for (const [id, parameter] of Object.entries(parameters)) {
    if (parameter.kind === 'choice') continue;
    const stated = strength?.[id];
    const still = identity?.[id];
    if (stated) moved[id] = stated;
    else if (!strength && typeof still === 'number' && still !== parameter.initial) moved[id] = endsOf(parameter, still);
  }
  return moved;
}

/** Every parameter of the cause at `strength`, 0 to 1. */
export function valuesAt(cause: Cause, strength: number): ParameterValues {
  const moved = strengthOf(cause);
  return Object.fromEntries(
    Object.entries(cause.parameters).map(([id, parameter]) => {
      const ends = moved[id];
      if (parameter.kind === 'choice' || !ends) return [id, parameter.initial];
      return [id, onStep(ends[0] + strength * (ends[1] - ends[0]), parameter)];
    }),
  );
}

/** The recipe of the swatch at `strength`, 0 to 1. */
export const swatchRecipe = (cause: Cause, strength: number): Recipe => ({
  steps: [{ cause: cause.id, parameters: valuesAt(cause, strength) }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  ...(cause.needsObjectPhase ? { objectPhase: { range: objectPhaseRange, seed } } : {}),
  seed,
});
