/** Every modelled cause, in the order of the signal chain. */
import type { Cause } from '../cause';
import { banding } from './banding';
import { chemicalShift } from './chemical-shift';
import { clipping } from './clipping';
import { crossTalk } from './cross-talk';
import { cuspArtefact } from './cusp-artefact';
import { dcOffset } from './dc-offset';
import { deadCoilElement } from './dead-coil-element';
import { echoTrainDecay } from './echo-train-decay';
import { eddyCurrents } from './eddy-currents';
import { ellipticalCoverage } from './elliptical-coverage';
import { failedFatSuppression } from './failed-fat-suppression';
import { fieldOfViewReduction } from './field-of-view-reduction';
import { gradientNonLinearity } from './gradient-non-linearity';
import { halfFieldGhost } from './half-field-ghost';
import { lineDropOut } from './line-drop-out';
import { linePhaseErrors } from './line-phase-errors';
import { magicAngle } from './magic-angle';
import { moire } from './moire';
import { noise } from './noise';
import { offResonance } from './off-resonance';
import { parallelImagingResidual } from './parallel-imaging-residual';
import { partialFourier } from './partial-fourier';
import { periodicMotion } from './periodic-motion';
import { pulsatileFlow } from './pulsatile-flow';
import { quadratureImbalance } from './quadrature-imbalance';
import { radialUndersampling } from './radial-undersampling';
import { randomUndersampling } from './random-undersampling';
import { readoutWrap } from './readout-wrap';
import { receiveShading } from './receive-shading';
import { rfInterference } from './rf-interference';
import { rigidMotion } from './rigid-motion';
import { spikes } from './spikes';
import { susceptibility } from './susceptibility';
import { transmitInhomogeneity } from './transmit-inhomogeneity';
import { truncation } from './truncation';
import { uniformUndersampling } from './uniform-undersampling';

export const causes: readonly Cause[] = [
  magicAngle,
  failedFatSuppression,
  transmitInhomogeneity,
  crossTalk,
  banding,
  chemicalShift,
  offResonance,
  susceptibility,
  eddyCurrents,
  gradientNonLinearity,
  receiveShading,
  deadCoilElement,
  parallelImagingResidual,
  moire,
  fieldOfViewReduction,
  readoutWrap,
  rigidMotion,
  pulsatileFlow,
  uniformUndersampling,
  randomUndersampling,
  partialFourier,
  truncation,
  ellipticalCoverage,
  periodicMotion,
  echoTrainDecay,
  halfFieldGhost,
  linePhaseErrors,
  cuspArtefact,
  lineDropOut,
  radialUndersampling,
  noise,
  rfInterference,
  spikes,
  quadratureImbalance,
  dcOffset,
  clipping,
];
