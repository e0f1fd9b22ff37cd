/**
 * Bandwidth per pixel. Some GE files hold half the receiver bandwidth in kilohertz under this tag (31.25 for ±31.25 kHz), which
 * is not hertz per pixel: such a value is doubtful until a person confirms it.
 * Source: DICOM PS3.3 C.8.3.1, Pixel Bandwidth (0018,0095), hertz per pixel; ranges from common practice.
 */
import type { Header } from '../header';
import { doubtful, fromHeader, quantity, type Fact } from './fact';
import { acquisitionMatrix } from './phase-encode';

const plausible = { from: 20, to: 10_000, unit: 'Hz per pixel' };
/** Half receiver bandwidths of GE scanners of that era, in kilohertz, are 4 to 62.5: all below this. */
const looksLikeKilohertz = 65;

export function bandwidthFact(header: Header): Fact<number> {
  const value = header.number('pixelBandwidth');
  const isGe = /^GE\b/i.test(header.text('manufacturer') ?? '');
  if (value !== undefined && isGe && value > 0 && value < looksLikeKilohertz) return doubtful(value, kilohertzNote(value, header));
  if (value !== undefined && value > 0 && value < plausible.from)
    return doubtful(value, `Below ${plausible.from} Hz per pixel, which is rare: confirm it.`);
  const fact = quantity(header, 'pixelBandwidth', plausible);
  return fact.value === null ? fact : fromHeader(fact.value);
}

/** ±b kHz over n readout samples is 2·b·1000/n hertz per pixel. */
function kilohertzNote(value: number, header: Header): string {
  const samples = acquisitionMatrix(header)?.readout;
  const perPixel =
    samples === undefined ? '' : `, which over ${samples} readout samples would be ${((2000 * value) / samples).toFixed(2)} Hz per pixel`;
  return `This looks like a receiver bandwidth of ±${value} kHz${perPixel}: confirm the bandwidth per pixel.`;
}
