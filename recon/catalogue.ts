/** The catalogue as plain objects, in the shape that goes over the wire: what forms, swatches and recipes are built from. */
import type { Acquisition } from './acquisition';
import type { Cause, Driver, Reconstruction, Remedy, Sighting, Source } from './cause';
import { initialOf } from './initial';
import type { Parameter, Parameters, Quantity } from './parameter';
import { movedBy, swatchPhantom, swatchRecipe } from './swatch';

export type DescribedParameter =
  | {
      id: string;
      label: string;
      unit: string;
      min: number;
      max: number;
      step: number;
      initial: number;
      /** The scan fact that filled `initial`, in words. */
      fromHeader?: string;
      when?: Record<string, string[]>;
    }
  | { id: string; label: string; options: { value: string; label: string }[]; initial: string; when?: Record<string, string[]> };

/** A quantity that a swatch moves with its strength. */
type MovedQuantity = Pick<Quantity, 'label' | 'unit' | 'min' | 'max' | 'step'> & { mild: number; strong: number };

/** What is said of causes and reconstructions alike. */
export interface DescribedEntry {
  id: string;
  title: string;
  seen: Sighting[];
  runsAlong: Cause['runsAlong'];
  formula: string;
  drivers: Driver[];
  parameters: DescribedParameter[];
  looks: { image: string; kspace: string };
  needsObjectPhase: boolean;
  /** What the swatch is of. */
  phantom: { title: string; fieldOfViewMm: number };
  strength: MovedQuantity[];
  remedies: Remedy[];
  sources: Source[];
}

export interface DescribedCause extends DescribedEntry {
  stage: Cause['stage'];
}

export interface DescribedReconstruction extends DescribedEntry {
  stage: 'reconstruction';
  /** The steps on which its swatch is shown. */
  shownOn: { cause: string; parameters: Record<string, number | string> }[];
}

/** How strong the steps are with which the bench shows a reconstruction: at the middle of the swatch's slider. */
const shownStrength = 0.5;

const describeWhen = ({ when }: Parameter) =>
  when ? { when: Object.fromEntries(Object.entries(when).map(([id, values]) => [id, [...values]])) } : {};

function describeParameter(id: string, parameter: Parameter, acquisition?: Acquisition): DescribedParameter {
  if (parameter.kind === 'choice') {
    const { label, options, initial } = parameter;
    return { id, label, options: options.map((option) => ({ ...option })), initial, ...describeWhen(parameter) };
  }
  const { label, unit, min, max, step } = parameter;
  const { value, fact } = initialOf(parameter, acquisition);
  const described = { id, label, unit, min, max, step, initial: Number(value), ...describeWhen(parameter) };
  return fact === undefined ? described : { ...described, fromHeader: `${fact} in the header` };
}

const describeParameters = (parameters: Parameters, acquisition?: Acquisition): DescribedParameter[] =>
  Object.entries(parameters).map(([id, parameter]) => describeParameter(id, parameter, acquisition));

function describePhantom(entry: Cause | Reconstruction): DescribedEntry['phantom'] {
  const { title, fieldOfView } = swatchPhantom(entry);
  return { title, fieldOfViewMm: Math.round(1000 * fieldOfView) };
}

/** With `acquisition`, initial values come from the scan facts where they say one. */
const describeEntry = (entry: Cause | Reconstruction, acquisition?: Acquisition): DescribedEntry => ({
  id: entry.id,
  title: entry.title,
  seen: [...entry.seen],
  runsAlong: entry.runsAlong,
  formula: entry.formula,
  drivers: entry.drivers.map((driver) => ({ ...driver })),
  parameters: describeParameters(entry.parameters, acquisition),
  looks: { ...entry.looks },
  needsObjectPhase: entry.needsObjectPhase === true,
  phantom: describePhantom(entry),
  strength: movedBy(entry).map(({ quantity: { label, unit, min, max, step }, ends: [mild, strong] }) => ({
    ...{ label, unit, min, max, step, mild, strong },
  })),
  remedies: entry.remedies.map((remedy) => ({ ...remedy })),
  sources: entry.sources.map((source) => ({ ...source })),
});

export const describeCause = (cause: Cause, acquisition?: Acquisition): DescribedCause => ({
  ...describeEntry(cause, acquisition),
  stage: cause.stage,
});

export const describeReconstruction = (method: Reconstruction, acquisition?: Acquisition): DescribedReconstruction => ({
  ...describeEntry(method, acquisition),
  stage: 'reconstruction',
  shownOn: swatchRecipe(method, shownStrength).steps.map(({ cause, parameters }) => ({ cause, parameters: { ...parameters } })),
});
