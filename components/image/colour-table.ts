/**
 * Colour tables: one packed colour for each of the 65,536 samples of a display plane. Grey for magnitude, cyclic for phase,
 * diverging for a signed difference. A colour is 0xAABBGGRR: the bytes red, green, blue, alpha in memory, little-endian.
 */
import { fullScale } from './display-plane';
import { srgbFromOklch } from './oklab';
import type { Window } from './window-level';

export type ColourTable = Uint32Array;
export const tableLength = fullScale + 1;

const opaque = 255 << 24;

export const packColour = (red: number, green: number, blue: number): number => ((255 << 24) | (blue << 16) | (green << 8) | red) >>> 0;

/** Values between `low` (sample 0) and `high` (sample 65535), black below the window, white above it, linear within. */
export function greyTable(window: Window, low: number, high: number): ColourTable {
  const table = new Uint32Array(tableLength);
  // Signed words of the same bytes stay small integers in every engine: this runs for each picture while a slider moves.
  const words = new Int32Array(table.buffer);
  const black = window.level - window.width / 2;
  const slope = ((high - low) / fullScale / window.width) * 255;
  const start = ((low - black) / window.width) * 255 + 0.5;
  for (let sample = 0; sample < tableLength; sample++) {
    const level = start + slope * sample;
    const grey = level <= 0 ? 0 : level >= 255 ? 255 : level | 0;
    words[sample] = opaque | (grey << 16) | (grey << 8) | grey;
  }
  return table;
}

const nHues = 1024;
const phaseLightness = 0.72;
const phaseChroma = 0.12;
let wheel: Uint32Array | undefined;

/** The hue circle at one lightness: −π and π are the same colour, and no phase looks brighter than another. */
function hueWheel(): Uint32Array {
  wheel ??= Uint32Array.from({ length: nHues }, (_, i) =>
    packColour(...srgbFromOklch(phaseLightness, phaseChroma, (2 * Math.PI * i) / nHues)),
  );
  return wheel;
}

/** Phase in radians, `low` at sample 0 and `high` at sample 65535; the hue angle is the phase. */
export function cyclicTable(low: number, high: number): ColourTable {
  const hues = hueWheel();
  const table = new Uint32Array(tableLength);
  const turnsLow = low / (2 * Math.PI);
  const turnsStep = (high - low) / (2 * Math.PI) / fullScale;
  for (let sample = 0; sample < tableLength; sample++) {
    const turns = turnsLow + turnsStep * sample;
    table[sample] = hues[Math.round((turns - Math.floor(turns)) * nHues) % nHues] ?? 0;
  }
  return table;
}

/** Hues of less and of more than zero: blue and orange, apart for every common kind of colour vision. */
const negativeHue = (255 * Math.PI) / 180;
const positiveHue = (60 * Math.PI) / 180;
const nShades = 256;

/** A difference: black at zero, blue to −`span`, orange to +`span`, equally light at equal distance from zero. */
export function divergingTable(span: number, low: number, high: number): ColourTable {
  const shades = (hue: number) =>
    Array.from({ length: nShades }, (_, i) => {
      const distance = i / (nShades - 1);
      return packColour(...srgbFromOklch(0.86 * distance, 0.13 * Math.sqrt(distance) * Math.min(1, 4 * distance), hue));
    });
  const negative = shades(negativeHue);
  const positive = shades(positiveHue);
  const table = new Uint32Array(tableLength);
  for (let sample = 0; sample < tableLength; sample++) {
    const value = low + ((high - low) * sample) / fullScale;
    const shade = Math.round(Math.min(1, Math.abs(value) / span) * (nShades - 1));
    table[sample] = (value < 0 ? negative : positive)[shade] ?? 0;
  }
  return table;
}
