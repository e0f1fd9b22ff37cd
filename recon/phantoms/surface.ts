/** The surface of the brain without its folds, and ovals of its kind. Millimetres; turns are clockwise from the front. */
import type { Pair } from './outline';

/** Semi-axes, and how far its middle lies in front of that of the head. */
const axes: Pair = [61.8, 79.4];
const lift = -1.2;

/** A point of an oval that is narrower in front than behind, as a skull is. */
export const eggPoint = ([a, b]: Pair, turn: number, y = 0): { x: number; y: number } => ({
  x: a * Math.sin(turn) * (1 - 0.07 * Math.cos(turn)),
  y: y - b * Math.cos(turn),
});

/** The point of the surface at `turn`, `inset` beneath it. */
export const surfacePoint = (turn: number, inset: number): { x: number; y: number } =>
  eggPoint([axes[0] - inset, axes[1] - inset], turn, lift);

const step = 0.01;

/** Millimetres of surface for a radian, and the direction inwards. */
function slopeAt(turn: number): { speed: number; inwards: Pair } {
  const [before, after] = [surfacePoint(turn - step, 0), surfacePoint(turn + step, 0)];
  const [alongX, alongY] = [after.x - before.x, after.y - before.y];
  const length = Math.hypot(alongX, alongY);
  return { speed: length / (2 * step), inwards: [-alongY / length, alongX / length] };
}

export const surfaceSpeed = (turn: number): number => slopeAt(turn).speed;
export const inwardsAt = (turn: number): Pair => slopeAt(turn).inwards;

/** Millimetres along the surface. */
export function lengthBetween(from: number, to: number): number {
  const n = Math.ceil((to - from) / step);
  let length = 0;
  for (let i = 0; i < n; i++) length += (surfaceSpeed(from + ((i + 0.5) / n) * (to - from)) * (to - from)) / n;
  return length;
}
