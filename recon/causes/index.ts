/** Every modelled cause, in the order of the signal chain. */
import type { Cause } from '../cause';
import { clipping } from './clipping';
import { dcOffset } from './dc-offset';
import { deadCoilElement } from './dead-coil-element';
import { fieldOfViewReduction } from './field-of-view-reduction';
import { gradientNonLinearity } from './gradient-non-linearity';
import { noise } from './noise';
import { partialFourier } from './partial-fourier';
import { periodicMotion } from './periodic-motion';
import { quadratureImbalance } from './quadrature-imbalance';
import { receiveShading } from './receive-shading';
import { rfInterference } from './rf-interference';
import { rigidMotion } from './rigid-motion';
import { spikes } from './spikes';
import { transmitInhomogeneity } from './transmit-inhomogeneity';
import { uniformUndersampling } from './uniform-undersampling';

export const causes: readonly Cause[] = [
  transmitInhomogeneity,
  gradientNonLinearity,
  receiveShading,
  deadCoilElement,
  fieldOfViewReduction,
  rigidMotion,
  uniformUndersampling,
  partialFourier,
  periodicMotion,
  noise,
  rfInterference,
  spikes,
  quadratureImbalance,
  dcOffset,
  clipping,
];
