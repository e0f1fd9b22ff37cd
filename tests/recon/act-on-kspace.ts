/** A cause of k-space by itself, with parameters that need not lie in the range of its form. */
import type { Acquisition } from '../../recon/acquisition';
import type { Cause, Encoded } from '../../recon/cause';
import { transform } from '../../recon/fourier';
import type { ComplexPlane } from '../../recon/grid';
import { fullyTaken } from '../../recon/lines';
import type { ParameterValues } from '../../recon/recipe';
import { randomOf } from '../../recon/random';
import { initialValues } from '../laws/samples';

export const columnEncoded: Acquisition = { phaseEncode: 'column' };

/** What the cause makes of `kspace`; parameters left out are initial. */
export function actOnKspace(cause: Cause, kspace: Encoded, values: ParameterValues, acquisition = columnEncoded, seed = 1): Encoded {
  if (cause.domain === 'image') throw Error(`${cause.id} acts on the image`);
  return cause.apply(kspace, { ...initialValues(cause.parameters), ...values }, { acquisition, random: randomOf(seed, cause.id) });
}

/** The same for the transform of `object`. */
export const actOnObject = (cause: Cause, object: ComplexPlane, values: ParameterValues, acquisition = columnEncoded, seed = 1): Encoded =>
  actOnKspace(cause, fullyTaken(transform(object)), values, acquisition, seed);
