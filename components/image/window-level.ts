/**
 * Window and level: which values are shown from black to white. A drag to the right widens the window, a drag upwards lowers
 * the level, so that the picture grows brighter (common practice on viewing stations). Applied in the client, never by a round trip.
 */

export interface Window {
  /** Difference between the value shown white and the value shown black; greater than zero. */
  readonly width: number;
  /** The value shown mid-grey. */
  readonly level: number;
}

/** The window that shows `low` black and `high` white. An empty range gets a width of one, so that it can be shown at all. */
export function windowOfRange(low: number, high: number): Window {
  const width = high - low;
  return width > 0 ? { width, level: low + width / 2 } : { width: 1, level: low };
}

/** The smallest width that a drag reaches, as a fraction of the width at its start: it never turns the picture inside out. */
const narrowest = 0.01;

/** One picture width of drag doubles the window; one picture height moves the level by one window. Fractions of the picture. */
export function dragWindow(start: Window, right: number, down: number): Window {
  return { width: start.width * Math.max(narrowest, 1 + right), level: start.level + start.width * down };
}

/** The same grey for values that differ by a gain: `gain · value` under `window` looks as `value` under the result. */
export function windowUnderGain(window: Window, gain: number | null): Window {
  if (gain === null || !(gain > 0)) return window;
  return { width: window.width / gain, level: window.level / gain };
}
