/**
 * Oklab to sRGB: a colour space in which equal steps look equal, so that a colour table has no false edges.
 * B. Ottosson, 'A perceptual color space for image processing', 2020 (constants from memory; the grey axis and white are tested).
 */

const encode = (linear: number): number => {
  const bounded = Math.min(1, Math.max(0, linear));
  return bounded <= 0.0031308 ? 12.92 * bounded : 1.055 * bounded ** (1 / 2.4) - 0.055;
};

/** `lightness` 0 to 1, `chroma` 0 to about 0.3, `hue` in radians. Returns 8-bit red, green, blue; colours outside sRGB are clipped. */
export function srgbFromOklch(lightness: number, chroma: number, hue: number): [red: number, green: number, blue: number] {
  const a = chroma * Math.cos(hue);
  const b = chroma * Math.sin(hue);
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  const linear = [
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ] as const;
  return [Math.round(255 * encode(linear[0])), Math.round(255 * encode(linear[1])), Math.round(255 * encode(linear[2]))];
}
