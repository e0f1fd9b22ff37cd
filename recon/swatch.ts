/**
 * The swatch of a cause or a reconstruction: its own model on the phantom that shows it best, from mild to strong. Strength s runs from 0 to 1. One rule for every cause:
 * each quantity q goes along the line from its identity value (no effect) through its initial value, q(s) = identity + f·(initial −
 * identity), f from 1/4 at s = 0 to 5/2 at s = 1, kept within its range and on its step. A quantity that starts at its identity stays
 * there. A cause without an identity, or one that this line does not suit, states its two ends in `strength`. A reconstruction is shown on
 * the steps that it names, whose quantities may be moved as well.
 */
import type { Acquisition } from './acquisition';
import type { Cause, Ends, Reconstruction } from './cause';
import type { Plane } from './grid';
import { onStep } from './initial';
import type { Parameters, Quantity } from './parameter';
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
export const swatchPhantom = ({ phantom = 'head' }: Pick<Entry, 'phantom'>): Phantom => phantomOf(phantom);

/** Samples of the phantom along a side, as a part of the pixels of the picture. */
export const swatchSamples = (entry: Entry): number => ('shownOn' in entry ? (entry.shownOn.samples ?? 1) : 1);

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

function endsOf(quantity: Quantity, identity: number): Ends {
  const way = quantity.initial - identity;
  const [mild, strong] = [mildPart, strongPart].map((part) => onStep(identity + part * way, quantity)) as [number, number];
  // A step coarser than the mild part of the way would end where nothing happens.
  return [mild === identity ? onStep(identity + Math.sign(way) * quantity.step, quantity) : mild, strong];
}

/** A cause or a reconstruction. */
type Entry = Cause | Reconstruction;

/** The quantities that strength moves or holds, with their ends; the others stay at their initial values. */
function strengthOf({ parameters, identity, strength }: Pick<Entry, 'parameters' | 'identity' | 'strength'>): Record<string, Ends> {
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

/** Every parameter at `strength`, 0 to 1. */
function valuesAt(parameters: Parameters, ends: Readonly<Record<string, Ends>>, strength: number): ParameterValues {
  return Object.fromEntries(
    Object.entries(parameters).map(([id, parameter]) => {
      const [mild, strong] = ends[id] ?? [];
      if (parameter.kind === 'choice' || mild === undefined || strong === undefined) return [id, parameter.initial];
      return [id, onStep(mild + strength * (strong - mild), parameter)];
    }),
  );
}

/** A part of a swatch, a step or the reconstruction, with the values that it holds and the ends of those that strength moves. */
interface Part {
  readonly id: string;
  readonly parameters: Parameters;
  readonly held: ParameterValues;
  readonly ends: Readonly<Record<string, Ends>>;
}

/** What a swatch is made of: a cause stands alone and is zero-filled, a reconstruction acts on the steps that show it. */
function partsOf(entry: Entry): { steps: Part[]; reconstruction: Part } {
  if ('apply' in entry) {
    return {
      steps: [{ ...entry, held: {}, ends: strengthOf(entry) }],
      reconstruction: { id: 'zero-filled', parameters: {}, held: {}, ends: {} },
    };
  }
  const { steps, parameters = {} } = entry.shownOn;
  return {
    steps: steps.map(({ cause, strength = {} }) => ({ ...cause, held: {}, ends: strength })),
    reconstruction: { ...entry, held: parameters as ParameterValues, ends: strengthOf(entry) },
  };
}

const recipePart = ({ parameters, held, ends }: Part, strength: number): ParameterValues => ({
  ...valuesAt(parameters, ends, strength),
  ...held,
});

/** The quantities that strength moves, each with both ends. */
export function movedBy(entry: Entry): { quantity: Quantity; ends: Ends }[] {
  const { steps, reconstruction } = partsOf(entry);
  return [...steps, reconstruction].flatMap(({ parameters, ends }) =>
    Object.entries(ends).flatMap(([id, [mild, strong]]) => {
      const quantity = parameters[id];
      return quantity?.kind === 'quantity' && mild !== strong ? [{ quantity, ends: [mild, strong] as const }] : [];
    }),
  );
}

/** The recipe of the swatch at `strength`, 0 to 1. */
export function swatchRecipe(entry: Entry, strength: number): Recipe {
  const { steps, reconstruction } = partsOf(entry);
  return {
    steps: steps.map((step) => ({ cause: step.id, parameters: recipePart(step, strength) })),
    reconstruction: { method: reconstruction.id, parameters: recipePart(reconstruction, strength) },
    ...(entry.needsObjectPhase ? { objectPhase: { range: objectPhaseRange, seed } } : {}),
    seed,
  };
}
