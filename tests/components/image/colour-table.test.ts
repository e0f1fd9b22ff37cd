/**
 * Colour tables. Grey: the linear window of DICOM PS3.3 C.7.6.3 in spirit, worked out by hand. Oklab: white and the grey axis are fixed
 * points of the transform (Ottosson 2020).
 */
import { cyclicTable, divergingTable, greyTable, packColour, tableLength } from '@/components/image/colour-table';
import { srgbFromOklch } from '@/components/image/oklab';
import { paintPixels } from '@/components/image/paint-pixels';

const red = (colour: number | undefined) => (colour ?? 0) & 0xff;
const green = (colour: number | undefined) => ((colour ?? 0) >> 8) & 0xff;
const blue = (colour: number | undefined) => ((colour ?? 0) >> 16) & 0xff;
/** Relative luminance of sRGB, IEC 61966-2-1. */
const luminance = (colour: number | undefined) => {
  const linear = (byte: number) => (byte / 255 <= 0.04045 ? byte / 255 / 12.92 : ((byte / 255 + 0.055) / 1.055) ** 2.4);
  return 0.2126 * linear(red(colour)) + 0.7152 * linear(green(colour)) + 0.0722 * linear(blue(colour));
};

describe('the grey table', () => {
  const table = greyTable({ width: 100, level: 50 }, 0, 65535 / 100);

  it('has one opaque grey for each 16-bit sample', () => {
    expect(table).toHaveLength(tableLength);
    expect(table.every((colour) => red(colour) === green(colour) && green(colour) === blue(colour) && colour >>> 24 === 255)).toBe(true);
  });

  it('is black at the lower end of the window, white at the upper end, mid-grey at the level', () => {
    expect(red(table[0])).toBe(0);
    expect(red(table[10_000])).toBe(255);
    // 127.5 falls between two bytes.
    expect([127, 128]).toContain(red(table[5_000]));
  });

  it('never grows darker with a larger value', () => {
    expect(table.every((colour, i) => i === 0 || red(colour) >= red(table[i - 1]))).toBe(true);
  });

  it('reads the same values whatever the range that carries them', () => {
    const wide = greyTable({ width: 100, level: 50 }, -1000, 1000);
    // The value 25 is sample 33,587 of −1000 … 1000 within half a step, 0.015 of 100.
    expect(Math.abs(red(wide[33_587]) - 64)).toBeLessThanOrEqual(1);
  });
});

describe('the phase table', () => {
  const table = cyclicTable(-Math.PI, Math.PI);

  it('closes: −π and π have the same colour', () => {
    expect(table[0]).toBe(table[65535]);
  });

  it('shows no phase brighter than another', () => {
    const all = [0, 8192, 16384, 24576, 32768, 40960, 49152, 57344].map((i) => luminance(table[i]));
    // Equal Oklab lightness is equal luminance within 15 % at this chroma; a grey ramp would differ without bound.
    expect(Math.max(...all) / Math.min(...all)).toBeLessThan(1.3);
  });

  it('gives quarter turns four different colours', () => {
    expect(new Set([0, 16384, 32768, 49152].map((i) => table[i])).size).toBe(4);
  });
});

describe('the difference table', () => {
  const table = divergingTable(10, -20, 20);

  it('is black where the pictures agree', () => {
    expect(luminance(table[32768])).toBeLessThan(0.001);
  });

  it('is blue below zero and orange above it, equally light at equal distance', () => {
    expect(blue(table[20_000])).toBeGreaterThan(red(table[20_000]));
    expect(red(table[45_535])).toBeGreaterThan(blue(table[45_535]));
    // The same Oklab lightness; clipping to sRGB moves luminance by less than a fifth.
    expect(Math.abs(luminance(table[20_000]) / luminance(table[45_535]) - 1)).toBeLessThan(0.2);
  });

  it('saturates at the ends of its own scale', () => {
    expect(table[65535]).toBe(table[Math.round(65535 * 0.75) + 1]);
  });
});

describe('Oklab', () => {
  it('has white, black and a neutral axis', () => {
    expect(srgbFromOklch(1, 0, 0)).toEqual([255, 255, 255]);
    expect(srgbFromOklch(0, 0, 0)).toEqual([0, 0, 0]);
    const [r, g, b] = srgbFromOklch(0.5, 0, 1);
    expect([g, b]).toEqual([r, r]);
  });
});

describe('painting', () => {
  const grid = { rows: 1, columns: 3, spacing: [1, 1], origin: [0, 0] } as const;
  const plane = { ...grid, name: 'image', low: 0, high: 1, samples: Uint16Array.of(0, 1, 65535) };

  it('writes red, green, blue, alpha in that order', () => {
    const table = new Uint32Array(tableLength);
    table[1] = packColour(1, 2, 3);
    expect([...paintPixels(plane, table)].slice(4, 8)).toEqual([1, 2, 3, 255]);
  });

  it('keeps samples that were never taken black, whatever their phase', () => {
    const table = new Uint32Array(tableLength).fill(packColour(9, 9, 9));
    const mask = { ...plane, samples: Uint16Array.of(5, 0, 5) };
    expect([...paintPixels(plane, table, mask)]).toEqual([9, 9, 9, 255, 0, 0, 0, 255, 9, 9, 9, 255]);
  });
});
