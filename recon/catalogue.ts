/** The catalogue as plain objects, in the shape that goes over the wire: what forms, swatches and recipes are built from. */
import type { Acquisition } from './acquisition';
import type { Cause, Driver, Reconstruction, Remedy, Sighting, Source } from './cause';
import { initialOf } from './initial';
import type { Parameter, Parameters } from './parameter';
import { strengthOf, swatchPhantom } from './swatch';

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

export interface DescribedReconstruction {
  id: string;
  title: string;
  parameters: DescribedParameter[];
  looks: { image: string; kspace: string };
  sources: Source[];
}

export interface DescribedCause extends DescribedReconstruction {
  stage: Cause['stage'];
  seen: Sighting[];
  runsAlong: Cause['runsAlong'];
  formula: string;
  drivers: Driver[];
  needsObjectPhase: boolean;
  /** What the swatch is of. */
  phantom: { title: string; fieldOfViewMm: number };
  strength: Record<string, [mild: number, strong: number]>;
  remedies: Remedy[];
}

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

function describePhantom(cause: Cause): DescribedCause['phantom'] {
  const { title, fieldOfView } = swatchPhantom(cause);
  return { title, fieldOfViewMm: Math.round(1000 * fieldOfView) };
}

/** A cause; with `acquisition`, initial values come from the scan facts where they say one. */
export const describeCause = (cause: Cause, acquisition?: Acquisition): DescribedCause => ({
  id: cause.id,
  title: cause.title,
  stage: cause.stage,
  seen: [...cause.seen],
  runsAlong: cause.runsAlong,
  formula: cause.formula,
  drivers: cause.drivers.map((driver) => ({ ...driver })),
  parameters: describeParameters(cause.parameters, acquisition),
  looks: { ...cause.looks },
  needsObjectPhase: cause.needsObjectPhase === true,
  phantom: describePhantom(cause),
  strength: Object.fromEntries(
    Object.entries(strengthOf(cause))
      .filter(([, [mild, strong]]) => mild !== strong)
      .map(([id, [mild, strong]]) => [id, [mild, strong]]),
  ),
  remedies: cause.remedies.map((remedy) => ({ ...remedy })),
  sources: cause.sources.map((source) => ({ ...source })),
});

/** A reconstruction, in the same way. */
export const describeReconstruction = (method: Reconstruction, acquisition?: Acquisition): DescribedReconstruction => ({
  id: method.id,
  title: method.title,
  parameters: describeParameters(method.parameters, acquisition),
  looks: { ...method.looks },
  sources: method.sources.map((source) => ({ ...source })),
});
