/** Outlines drawn in millimetres from the image centre, x to the right and y downwards, angles in degrees clockwise. */
import type { Polygon } from './polygon';
import type { Outline } from './shape';

export type Pair = readonly [number, number];

const radians = (degrees: number): number => (degrees * Math.PI) / 180;
const point = (x: number, y: number) => ({ x: x / 1000, y: y / 1000 });

/** An ellipse of semi-axes `a` and `b`. */
export const oval = ([a, b]: Pair, [x, y]: Pair, degrees = 0): Outline => ({
  a: a / 1000,
  b: b / 1000,
  ...point(x, y),
  angle: radians(degrees),
});

export const disc = (radius: number, centre: Pair): Outline => oval([radius, radius], centre);

/** A rectangle about its centre. */
export function rectangle([width, height]: Pair, [x, y]: Pair, degrees = 0): Omit<Polygon, 'density'> {
  const cosine = Math.cos(radians(degrees));
  const sine = Math.sin(radians(degrees));
  const corners: Pair[] = [
    [-width / 2, -height / 2],
    [width / 2, -height / 2],
    [width / 2, height / 2],
    [-width / 2, height / 2],
  ];
  return { vertices: corners.map(([u, v]) => point(x + u * cosine - v * sine, y + u * sine + v * cosine)) };
}

/** Straight edges between the points. */
export const outlineOf = (points: readonly Pair[]): Outline => ({ vertices: points.map(([x, y]) => point(x, y)) });

/**
 * A smooth closed curve through points given as x, y, x, y …: Catmull & Rom's spline (1974, from memory), as a polygon with
 * `edgesPerSpan` edges between two of the points.
 */
export function closedCurve(coordinates: readonly number[], edgesPerSpan = 6): Outline {
  const nPoints = coordinates.length / 2;
  const at = (i: number, axis: 0 | 1): number => coordinates[2 * ((i + nPoints) % nPoints) + axis] as number;
  const vertices = Array.from({ length: nPoints * edgesPerSpan }, (_, vertex) => {
    const i = Math.floor(vertex / edgesPerSpan);
    const t = (vertex % edgesPerSpan) / edgesPerSpan;
    const along = (axis: 0 | 1): number => {
      const [before, from, to, after] = [at(i - 1, axis), at(i, axis), at(i + 1, axis), at(i + 2, axis)];
      const slope = to - before;
      const bend = 2 * before - 5 * from + 4 * to - after;
      const twist = 3 * (from - to) + after - before;
      return from + (t / 2) * (slope + t * (bend + t * twist));
    };
    return point(along(0), along(1));
  });
  return { vertices };
}

/** The outline on the other side of the middle of the picture. */
export const mirrored = (outline: Outline): Outline =>
  'vertices' in outline
    ? { vertices: outline.vertices.map(({ x, y }) => ({ x: -x, y })) }
    : { ...outline, x: -outline.x, angle: -outline.angle };
