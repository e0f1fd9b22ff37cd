/**
 * Outside values that the checks assert, each with where it comes from. Computed ones were made with numpy and scipy, float64, apart from
 * this project, with the recipes that stand beside them. F is the centred transform fftshift(fft2(ifftshift(I))).
 */
export const reference = {
  /** MHz/T. CODATA 2018, proton gyromagnetic ratio over 2π. */
  gyromagneticRatio: 42.577478518,
  /** px. N·frac(TR·averages·f), Wood & Henkelman, Med Phys 1985;12:143: N 256, TR 0.5 s, one average, 0.25 Hz. */
  ghostShift256: 32,
  /** px. The same: N 192, TR 2.3 s, 1.2 Hz is 2.76 cycles a line, 0.76 of the field of view, 145.92 px or −46.08 px. */
  ghostShift192: -46.08,
  /** px. The same: N 256, TR 30 ms, 1.1 Hz. */
  ghostShiftHeart: 8.448,
  /** J0 … J3(a), Jacobi–Anger: exp(i·a·sin ωt) = Σ J_n(a) exp(i·n·ωt). scipy.special.jv. */
  bessel: {
    0.25: [0.984435929, 0.124025977, 0.007771889, 0.000324251],
    0.5: [0.938469807, 0.242268458, 0.030604023, 0.00256373],
    1: [0.765197687, 0.440050586, 0.114903485, 0.019563354],
    2: [0.223890779, 0.576724808, 0.352834029, 0.128943249],
  },
  /** J1/J0 at 0.5, simulated: 20 rows of 128, 16 cycles over the lines; ghost 16 px away over its parent. */
  phaseGhostRatio: 0.258152626,
  /** Object 8 of 64 rows; every second, every fourth line kept, the centre line among them: amplitude at 0, N/R, 2N/R … */
  undersampled: { 2: [0.5, 0.5], 4: [0.25, 0.25, 0.25, 0.25] },
  /** Of N. Width of the band taken on both sides, 2f − 1. */
  symmetricBand: { 0.625: 0.25, 0.75: 0.5, 0.875: 0.75 },
  /** ‖ |estimate| − |object| ‖/‖object‖ of the two-ellipse object, 128 × 128, 5/8 of the lines; numpy, six digits. */
  partialFourier: {
    real: { zeroFilled: 0.057971, homodyne: 0.0095 },
    smoothPhase: { zeroFilled: 0.057804, homodyne: 0.02367 },
  },
  /** S(0.8, −1.3) of an ellipse a 0.3, b 0.5 at (0.1, −0.2), 25°, density 1: Van de Walle, IEEE Trans Med Imaging 2000;19:1160 and Koay,
   *  Magn Reson Med 2007;58:430; the formula agreed with a numerical quadrature over the disc to 3e-16. */
  ellipse: { re: 0.031088448, im: 0.0489875554 },
  /** 1/unit. First dark ring of a disc of radius 0.25: j(1,1)/(2π·0.25), scipy.special.jn_zeros. */
  discFirstZero: 2.439339783,
  /** Head phantom of Shepp & Logan, IEEE Trans Nucl Sci 1974;21:21, ten ellipses: density, a, b, x0, y0, degrees; y upwards. */
  sheppLogan: [
    [2, 0.69, 0.92, 0, 0, 0],
    [-0.98, 0.6624, 0.874, 0, -0.0184, 0],
    [-0.02, 0.11, 0.31, 0.22, 0, -18],
    [-0.02, 0.16, 0.41, -0.22, 0, 18],
    [0.01, 0.21, 0.25, 0, 0.35, 0],
    [0.01, 0.046, 0.046, 0, 0.1, 0],
    [0.01, 0.046, 0.046, 0, -0.1, 0],
    [0.01, 0.046, 0.023, -0.08, -0.605, 0],
    [0.01, 0.023, 0.023, 0, -0.606, 0],
    [0.01, 0.023, 0.046, 0.06, -0.605, 0],
  ],
  /** Its signal at k = 0 and at (1.5, 2.25), the same formula. */
  sheppLoganSignal: { zero: { re: 2.2017566919, im: 0 }, away: { re: 0.0807903822, im: -0.0068651692 } },
  /** px. Fat shift Δf/BW at 1.5 T and 130 Hz/px, at 3 T and 440 Hz/px; 3.5 ppm is common practice. */
  fatShift: { at1T5: 1.719475, at3T: 1.016053 },
  /** Hz. 3.5 ppm of 123.25 MHz: a "3 T" magnet at 2.895 T. */
  fatShiftHertz: 431.375,
  /** Mean and standard deviation of a magnitude over σ, signal A: exact moments of the Rician distribution, scipy.special, with the formulas
   *  of Gudbjartsson & Patz, Magn Reson Med 1995;34:910. A 0 is Rayleigh. */
  rician: {
    0: { mean: 1.253314137, standardDeviation: 0.655136378 },
    1: { mean: 1.548572461, standardDeviation: 0.775837183 },
    2: { mean: 2.272383428, standardDeviation: 0.914479937 },
    3: { mean: 3.172577288, standardDeviation: 0.966826433 },
    5: { mean: 5.101069639, standardDeviation: 0.989489026 },
    10: { mean: 10.050126937, standardDeviation: 0.997471081 },
  },
  /** The same of root sum of squares of n coils without signal: χ of 2n degrees of freedom, scipy; Constantinides, Magn Reson Med
   *  1997;38:852. */
  centralChi: {
    1: { mean: 1.253314137, standardDeviation: 0.655136378 },
    2: { mean: 1.879971206, standardDeviation: 0.682428212 },
    4: { mean: 2.741624675, standardDeviation: 0.695337428 },
    8: { mean: 3.938025622, standardDeviation: 0.701394469 },
    16: { mean: 5.612839389, standardDeviation: 0.704296806 },
    32: { mean: 7.968812222, standardDeviation: 0.70571366 },
  },
  /** px. Period of the stripes of a spike at (30, 40) of 256 × 256, N/|k|. */
  spikePeriod: 5.12,
  /** |K2/K1|, K1 = (1 + g·e^{iψ})/2, K2 = (1 − g·e^{−iψ})/2; numpy. gain, ψ in degrees, ratio. */
  quadratureGhost: [
    [1.1, 0, 0.047619047619],
    [1, 5, 0.043660942909],
    [1.05, 3, 0.035785275794],
    [1.1, 5, 0.064605213],
  ],
  /** px from the centre: 3.2 kHz and 40 kHz at 200 Hz/px, the second folded into 256 px. */
  interferencePlace: { inside: 16, folded: -56 },
  /** sin³(90° · 0.8): 90° and 180° pulses both at 80 %. */
  spinEchoAt80Percent: 0.8602387,
  /** m. c/(f0·√ε_r) without losses: ε_r 58 at 3 T, ε_r 80 at 1.5 T, f0 from the gyromagnetic ratio above. */
  wavelength: { tissueAt3T: 0.308181, waterAt1T5: 0.524813 },
  /** %. 100·(1 − (950 − 850)/(950 + 850)): percent integral uniformity as the ACR phantom tests define it. */
  integralUniformity: 94.444444444,
  /** Fat against water at 3.5 ppm (common practice): hertz, and milliseconds of the first opposed and the first in-phase echo. */
  fatWater: {
    1.5: { hertz: 223.531762, opposedMs: 2.236819, inPhaseMs: 4.473637 },
    3: { hertz: 447.063524, opposedMs: 1.118409, inPhaseMs: 2.236819 },
  },
  /** (1 − exp(−250/800))/(1 − exp(−500/800)): recovery with TR halved by a neighbouring slice. */
  saturationRatio: 0.577495365,
  /** Degrees. arccos exp(−TR/T1), Ernst & Anderson, Rev Sci Instrum 1966;37:93 (from memory). */
  ernstAngleDegrees: { tr20t1800: 12.758410913, tr500t1350: 76.134054826 },
} as const;
