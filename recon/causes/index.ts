/** Every modelled cause, in the order of the signal chain. */
import type { Cause } from '../cause';
import { fieldOfViewReduction } from './field-of-view-reduction';
import { partialFourier } from './partial-fourier';
import { periodicMotion } from './periodic-motion';
import { rigidMotion } from './rigid-motion';
import { uniformUndersampling } from './uniform-undersampling';

export const causes: readonly Cause[] = [fieldOfViewReduction, rigidMotion, uniformUndersampling, partialFourier, periodicMotion];
