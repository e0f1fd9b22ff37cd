/** Units of headers and screens to SI and back: recon works in SI alone, and the edge of it converts here. */

export const fromMilliseconds = (milliseconds: number): number => milliseconds / 1000;
export const fromMillimetres = (millimetres: number): number => millimetres / 1000;
export const fromMegahertz = (megahertz: number): number => megahertz * 1e6;
export const fromDegrees = (degrees: number): number => (degrees * Math.PI) / 180;
export const fromPercent = (percent: number): number => percent / 100;
