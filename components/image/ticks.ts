/** Ticks of the rulers and rungs of the ladder around a picture: where they stand, and which of them carry a number. */

export interface Tick {
  /** Pixels from the start of the edge. */
  readonly at: number;
  readonly value: number;
  readonly isMajor: boolean;
}

/** Linear scale of an edge: `first` is the value at its start, `last` at its end, `length` its pixels. */
export interface EdgeScale {
  readonly first: number;
  readonly last: number;
  readonly length: number;
}

export interface TickStep {
  readonly major: number;
  readonly nMinor: number;
}

/** The finest step 1, 2 or 5 times a power of ten whose numbers are at least `gap` pixels apart. */
export function decimalStep(span: number, length: number, gap: number): TickStep {
  const least = (Math.abs(span) * gap) / length;
  const power = 10 ** Math.floor(Math.log10(least));
  const leading = [1, 2, 5, 10].find((digit) => digit * power >= least * (1 - 1e-9)) ?? 10;
  return { major: leading * power, nMinor: leading === 2 ? 4 : 5 };
}

/** The same for lines of k-space: a power of two, four minor steps each. */
export function binaryStep(span: number, length: number, gap: number): TickStep {
  const least = Math.max(1, (Math.abs(span) * gap) / length);
  const major = 2 ** Math.ceil(Math.log2(least) - 1e-9);
  return { major, nMinor: major >= 4 ? 4 : 1 };
}

export const pixelOf = (value: number, scale: EdgeScale): number => ((value - scale.first) / (scale.last - scale.first)) * scale.length;

/** Every tick on the edge, from its start to its end. */
export function ticksOf(scale: EdgeScale, step: TickStep): Tick[] {
  const minor = step.major / step.nMinor;
  const [from, to] = scale.first < scale.last ? [scale.first, scale.last] : [scale.last, scale.first];
  const ticks: Tick[] = [];
  for (let count = Math.ceil(from / minor - 1e-9); count * minor <= to + minor * 1e-9; count++) {
    ticks.push({ at: pixelOf(count * minor, scale), value: count * minor, isMajor: count % step.nMinor === 0 });
  }
  return ticks;
}

/** Ticks whose number has room: clear of both ends and of the words in the middle of the edge. */
export function numbered(ticks: readonly Tick[], length: number, wordsWidth: number, numberWidth: number): Tick[] {
  const clearance = (wordsWidth + numberWidth) / 2 + 6;
  return ticks.filter(
    ({ at, isMajor }) => isMajor && at >= numberWidth / 2 && at <= length - numberWidth / 2 && Math.abs(at - length / 2) >= clearance,
  );
}

/** One rung for every eighth line of those visible, clear of the arrow heads. */
export function rungsOf(firstLine: number, nVisible: number, length: number, headLength: number): number[] {
  const every = 8;
  const rungs: number[] = [];
  for (let line = Math.ceil(firstLine / every) * every; line <= firstLine + nVisible; line += every) {
    const at = ((line - firstLine) / nVisible) * length;
    if (at >= headLength && at <= length - headLength) rungs.push(at);
  }
  return rungs;
}
