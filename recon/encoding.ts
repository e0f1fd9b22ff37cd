/**
 * The textbook relations of spatial encoding, SI units: gradients in tesla per metre, frequencies in hertz, phases in radians.
 * γ̄ = γ/2π of the proton, CODATA 2018. The relations themselves are common practice.
 */

/** Hertz per tesla. */
export const gyromagneticRatio = 42.577478518e6;

/** The main peak of fat lies this part of the field below water: 3.5 ppm, common practice (3.3 to 3.5 are in use). */
export const fatShift = 3.5e-6;

/** Readout gradient from bandwidth and size of a pixel, G = BW/(γ̄·Δx). */
export const readoutGradient = (bandwidthPerPixel: number, pixelSize: number): number =>
  bandwidthPerPixel / (gyromagneticRatio * pixelSize);

/** Hertz that lie on a metre along the readout, BW/Δx. */
export const hertzPerMetre = (bandwidthPerPixel: number, pixelSize: number): number => bandwidthPerPixel / pixelSize;

/** Offset of a spin at x from the centre frequency under a gradient, γ̄·G·x. */
export const frequencyAt = (gradient: number, x: number): number => gyromagneticRatio * gradient * x;

/** Phase that a spin at x gathers under a gradient of area A = ∫G dt, in T·s/m: −2πγ̄·A·x, the sign of the Fourier kernel. */
export const phaseOfArea = (area: number, x: number): number => -2 * Math.PI * gyromagneticRatio * area * x;

/** Slice thickness Δz = BW/(γ̄·G) of a pulse of bandwidth BW under a slice gradient G. */
export const sliceThickness = (pulseBandwidth: number, gradient: number): number => pulseBandwidth / (gyromagneticRatio * gradient);

/** Pixels between fat and water along the readout, 3.5 ppm · f0 / BW per pixel. */
export const fatShiftPixels = (imagingFrequency: number, bandwidthPerPixel: number): number =>
  (fatShift * imagingFrequency) / bandwidthPerPixel;

/** Seconds to read one line: to tell frequencies of one bandwidth per pixel apart takes the time 1/BW, whatever the matrix. */
export const readoutTime = (bandwidthPerPixel: number): number => 1 / bandwidthPerPixel;

/** Where the first ghost of a motion falls, as a part of the phase field of view from −½ to ½: frac(TR·averages·f).
 *  Source: Wood & Henkelman, Med Phys 1985;12:143. */
export function ghostPosition(repetitionTime: number, averages: number, frequency: number): number {
  const cycles = repetitionTime * averages * frequency;
  return cycles - Math.round(cycles);
}

/** A small sample: signal `amount` at x metres. */
export interface Vial {
  readonly amount: number;
  readonly x: number;
}

/** What the receiver hears from `vials` under a readout gradient, at times of `dwell` apart, time 0 at index floor(n/2):
 *  s(t) = Σ amount·exp(−i2πγ̄·G·x·t). Throws for fewer than one sample. */
export function vialSignal(
  vials: readonly Vial[],
  gradient: number,
  dwell: number,
  nSamples: number,
): { re: Float64Array; im: Float64Array } {
  if (!(nSamples >= 1)) throw RangeError(`nSamples must be at least 1, got ${nSamples}`);
  const re = new Float64Array(nSamples);
  const im = new Float64Array(nSamples);
  for (let i = 0; i < nSamples; i++) {
    const area = gradient * (i - Math.floor(nSamples / 2)) * dwell;
    for (const { amount, x } of vials) {
      const phase = phaseOfArea(area, x);
      re[i] = (re[i] as number) + amount * Math.cos(phase);
      im[i] = (im[i] as number) + amount * Math.sin(phase);
    }
  }
  return { re, im };
}
