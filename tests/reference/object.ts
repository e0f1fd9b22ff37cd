/**
 * Outside values for causes that act on the object, and where each comes from. Computed ones were made with numpy and scipy, float64, apart
 * from this project, with the recipes that stand beside them.
 */
export const objectReference = {
  /** px. 3.5 ppm · γ̄B0 · ESP · N/R at 3 T, echo spacing 0.5 ms, 64 lines, R = 1 and 2; γ̄ of CODATA 2018. */
  echoPlanarFatShift: { full: 14.306033, halved: 7.153016 },
  /** px. 3.5 ppm · γ̄B0 / BW at 1.5 T and 32 kHz over 256 samples, 125 Hz/px. */
  fatShift125: 1.788254,
  /** Hz. 3.5 ppm · γ̄B0 at 1.5 T. Hood et al., RadioGraphics 1999;19:357, figure 1, print 224 Hz. */
  fatShiftHertz: { at1T5: 223.531762, at3T: 447.063524, printedAt1T5: 224 },
  /** ms. First TE out of phase 1/(2Δf) and in phase 1/Δf at 1.5 T, 3.5 ppm. */
  firstOpposed: 2.236819,
  firstInPhase: 4.473637,
  /** px. 100 Hz at 200 Hz/px; 50 Hz · 0.59 ms · 90 lines. */
  displacement: { readout: 0.5, echoPlanar: 2.655 },
  /** |sinc| of half a cycle across the slice, 2/π. */
  halfCycle: 0.636619772,
  /** Of the profile area, both neighbours: Gaussian profile, full width at half maximum one thickness, gap in thicknesses; ∫ of the smaller of
   *  two profiles, scipy.integrate.quad, to 1e-4. */
  sliceOverlap: [
    [0, 0.478064],
    [0.1, 0.390536],
    [0.25, 0.28217],
    [0.5, 0.154753],
    [1, 0.037063],
  ],
  /** (1 − exp(−250/800))/(1 − exp(−500/800)). */
  saturationRatio: 0.577495365,
  /** |sin(πf·TR·A)/(A·sin(πf·TR))| at 0.25 Hz, TR 0.5 s, four averages, three digits. */
  innerLoopAttenuation: 0.653,
  /** Ghost over parent of a brightness that changes by 20 %, m/2, simulated: 16 cycles over 128 lines. */
  brightnessGhost: 0.1,
  /** Degrees. arccos(1/√3). */
  magicAngleDegrees: 54.735610317,
  /** ms. T2* of Achilles tendon at 3 T, mean of five specimens, along the field and at 55° to it: Du et al., Magn Reson Imaging 2009;27:557,
   *  as its abstract prints them (1.94 ± 0.28 and 15.25 ± 2.13). */
  tendonT2: { alongTheField: 1.94, atMagicAngle: 15.25 },
  /** ms. TE beyond which tendon at 55° was no brighter than along the field, at 1 T and 1.5 T: Br J Radiol 1998;71:31, as its abstract
   *  prints it. */
  criticalEchoTime: 37,
} as const;
