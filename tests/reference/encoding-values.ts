/**
 * Outside values of sampling, echo trains and filters, each with where it comes from. Computed ones were made with numpy and scipy, float64,
 * apart from this project.
 */
export const encodingReference = {
  /** Of the jump, 1, 2 and 3 acquired pixels from an edge: Si(nπ)/π − ½, scipy.special.sici. The first is Wilbraham's and Gibbs's. */
  gibbsLobes: [0.089489872236, -0.04858833321, 0.033093237618],
  /** Of the jump, a box of half the field of view from n samples of k-space on a fine grid, numpy; tolerance 5e-4. */
  gibbsOvershoot: { 32: 0.090142, 64: 0.089653, 128: 0.089531, 256: 0.0895 },
  /** The same for 128 samples times 0.54 + 0.46 cos(πk/kmax), and times ½ + ½ cos(πk/kmax). */
  gibbsOvershootWindowed: { hamming: 0.00195, hann: 0.006352 },
  /** Of the peak: the first side lobe of the sinc, numpy. */
  pointSideLobe: -0.217233628,
  /** Acquired px. Full width at half maximum of the point spread: sinc, and the two windows; scipy.optimize.brentq. */
  pointWidth: { sinc: 1.206709129, hamming: 1.815225, hann: 2 },
  /** Acquired px. The same for exp(−t/T2) over a linear acquisition of 160 ms, T2 80 ms, in magnitude; tolerance 0.02. */
  pointWidthDecay: 1.39,
  /** exp(−16·10/80): what is left 16 echo spacings of 10 ms later at T2 80 ms. */
  sixteenEchoes: 0.135335283,
  /** cos φ, sin φ and tan φ: parent, ghost and ratio of the half-field ghost. */
  halfField: {
    0.05: { parent: 0.9987502604, ghost: 0.0499791693, ratio: 0.0500417084 },
    0.1: { parent: 0.9950041653, ghost: 0.0998334166, ratio: 0.1003346721 },
    0.2: { parent: 0.9800665778, ghost: 0.1986693308, ratio: 0.2027100355 },
  },
  /** cos π/6 and tan π/6: a ghost of half the brightness. */
  halfFieldStrong: { parent: 0.8660254038, ratio: 0.5773502692 },
  /** The ratio at φ = 0.1, simulated in numpy: 128 × 128, rows 40–60; tolerance 1e-9. */
  halfFieldSimulated: 0.100334672,
  /** Of the field of view. frac(TR·f) of 60 Hz at TR 33 ms: 0.98, which is −0.02. */
  mainsGhost: -0.02,
  /** Of the energy of white k-space: one line of 64. */
  lineEnergy: 0.015625,
  /** ‖ |estimate| − |object| ‖/‖object‖ after 50 rounds of POCS, two-ellipse object, 5/8 of the lines; numpy, six digits. */
  pocs: { real: 0.000097, smoothPhase: 0.003244 },
} as const;
