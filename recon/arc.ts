/**
 * A strip along an arc of a circle: how far a place lies from it, and which way it runs there. Angles are from the first axis of a place
 * towards the second; along the strip its direction grows by `turn` from one end to the other. A turn of 0 is a straight strip.
 */
export interface Arc {
  /** Metres. */
  readonly middle: readonly [number, number];
  readonly length: number;
  readonly thickness: number;
  /** Radians: direction at the middle, and the turn from end to end, 0 or more. */
  readonly direction: number;
  readonly turn: number;
}

/** Metres from the edge of the strip, negative inside, and the direction of the strip at the nearest point of its middle line. */
export function alongArc(arc: Arc, [p, q]: readonly [number, number]): { distance: number; direction: number } {
  const { middle, length, thickness, direction, turn } = arc;
  const [cosine, sine] = [Math.cos(direction), Math.sin(direction)];
  const [dp, dq] = [p - middle[0], q - middle[1]];
  const forwards = dp * cosine + dq * sine;
  const sideways = dq * cosine - dp * sine;
  // The angle at the centre of the circle, which lies 1/curvature to the side.
  const curvature = turn / length;
  const turned = Math.atan2(curvature * forwards, 1 - curvature * sideways);
  const reached = curvature === 0 ? forwards : turned / curvature;
  const fromLine = curvature === 0 ? sideways : 1 / curvature - Math.sqrt(forwards ** 2 + (1 / curvature - sideways) ** 2);
  const distance = Math.max(Math.abs(reached) - length / 2, Math.abs(fromLine) - thickness / 2);
  return { distance, direction: direction + Math.min(turn / 2, Math.max(-turn / 2, turned)) };
}
