/** Outlines about a line: of a sulcus that narrows, of a vessel that tapers. Millimetres. */
import type { Pair } from './outline';
import { closedCurve } from './outline';
import type { Outline } from './shape';

/**
 * Points on both sides of the line `course`, but for its first point, with one beyond its end between them. `reachAt` is the distance
 * from the line, by the part of it that lies behind.
 */
export function around(course: readonly Pair[], reachAt: (part: number) => number): Pair[] {
  const n = course.length - 1;
  const at = (i: number): Pair => course[Math.max(0, Math.min(n, i))] as Pair;
  const along = (i: number): Pair => {
    const [dx, dy] = [at(i + 1)[0] - at(i - 1)[0], at(i + 1)[1] - at(i - 1)[1]];
    return [dx / Math.hypot(dx, dy), dy / Math.hypot(dx, dy)];
  };
  const side = (i: number, sign: number): Pair => [
    at(i)[0] - sign * along(i)[1] * reachAt(i / n),
    at(i)[1] + sign * along(i)[0] * reachAt(i / n),
  ];
  const tip: Pair = [at(n)[0] + along(n)[0] * reachAt(1), at(n)[1] + along(n)[1] * reachAt(1)];
  const inwards = Array.from({ length: n }, (_, i) => i + 1);
  return [...inwards.map((i) => side(i, 1)), tip, ...inwards.reverse().map((i) => side(i, -1))];
}

/** A line drawn from its first point with `from` of half width to its last with `to`, both ends round. */
export function taper([first, ...rest]: readonly [Pair, ...Pair[]], from: number, to: number): Outline {
  const [second = first] = rest;
  const length = Math.hypot(second[0] - first[0], second[1] - first[1]);
  const behind: Pair = [first[0] - ((second[0] - first[0]) / length) * from, first[1] - ((second[1] - first[1]) / length) * from];
  const n = rest.length + 1;
  // `around` leaves out its first point: it becomes the round end.
  const sides = around([behind, first, ...rest], (part) => from + ((to - from) * (part * n - 1)) / (n - 1));
  return closedCurve([behind, ...sides].flat());
}
