/** A robust range of values for the first window: percentiles by counting, so that it takes two passes and no sorting. */

const rangePercentiles = [0.01, 0.998] as const;
/** As many as 16 bits have: integers that span no more levels than these fall one into each, and the percentile is exact. */
const nLevels = 1 << 16;

/** 1st and 99.8th percentile; values that `leftOut` marks do not count. The two ends are kept apart, so that a window can be made of them. */
export function rangeOf(values: Float32Array, leftOut?: Uint8Array): readonly [number, number] {
  const { low, high, counted } = extremes(values, leftOut);
  if (counted === 0 || !(high > low)) return counted === 0 ? [0, 1] : [low, low + 1];
  const counts = new Uint32Array(nLevels);
  const valueAt = new Float32Array(nLevels);
  const perLevel = (nLevels - 1) / (high - low);
  for (let i = 0; i < values.length; i++) {
    if (leftOut?.[i] === 1) continue;
    const level = Math.round(((values[i] as number) - low) * perLevel);
    counts[level] = (counts[level] as number) + 1;
    valueAt[level] = values[i] as number;
  }
  const [from, to] = rangePercentiles.map((fraction) => valueAt[levelAt(counts, counted * fraction)] as number);
  if (from === undefined || to === undefined) return [low, high];
  return to > from ? [from, to] : [from, from + 1];
}

function extremes(values: Float32Array, leftOut: Uint8Array | undefined) {
  let low = Infinity;
  let high = -Infinity;
  let counted = 0;
  for (let i = 0; i < values.length; i++) {
    if (leftOut?.[i] === 1) continue;
    const value = values[i] as number;
    if (value < low) low = value;
    if (value > high) high = value;
    counted++;
  }
  return { low, high, counted };
}

/** The level at which more than `rank` values have been passed, or the last that has one. */
function levelAt(counts: Uint32Array, rank: number): number {
  let seen = 0;
  let last = 0;
  for (let level = 0; level < counts.length; level++) {
    const count = counts[level] as number;
    if (count === 0) continue;
    seen += count;
    last = level;
    if (seen > rank) break;
  }
  return last;
}
