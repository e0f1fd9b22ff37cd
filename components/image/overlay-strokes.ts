/**
 * What is drawn on a picture, and nothing else is: the cursor, the divider, marks. Each stroke is a path with a casing, so that it
 * is seen on black and on white. Pixels of the picture as it is shown; paths are SVG path data, which every painter reads.
 */
import { onImage } from '@/components/ui/theme';

export interface OverlayStroke {
  readonly path: string;
  readonly colour: string;
  readonly width: number;
  /** Width of the casing beneath, in total. */
  readonly casing: number;
  readonly dash?: readonly [on: number, off: number];
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

const stroke = (path: string): OverlayStroke => ({ path, colour: onImage.mark, width: onImage.width, casing: onImage.width + 2 });
const cursorSide = 13;

/** An open square around the sample; no lines across the picture. It grows with the sample when that is magnified beyond it. */
export function cursorStroke(centre: Point, sampleSize: number): OverlayStroke {
  const side = Math.max(cursorSide, sampleSize + 5);
  const [x, y] = [centre.x - side / 2, centre.y - side / 2];
  return stroke(`M${x} ${y}H${x + side}V${y + side}H${x}Z`);
}

/** The edge between two pictures. */
export const dividerStroke = (x: number, height: number): OverlayStroke => ({
  path: `M${x} 0V${height}`,
  colour: '#FFFFFF',
  width: 1.5,
  casing: 4,
  dash: [4, 3],
});

export type MarkKind = 'arrow' | 'ellipse' | 'rectangle' | 'polyline' | 'text' | 'ruler' | 'profile';

const arrowHead = 9;
const rulerEnd = 7;

function arrowPath(from: Point, to: Point): string {
  const angle = Math.atan2(to.y - from.y, to.x - from.x);
  const barb = (turn: number) =>
    `M${to.x} ${to.y}L${to.x - arrowHead * Math.cos(angle + turn)} ${to.y - arrowHead * Math.sin(angle + turn)}`;
  return `M${from.x} ${from.y}L${to.x} ${to.y}${barb(0.45)}${barb(-0.45)}`;
}

function rulerPath(from: Point, to: Point): string {
  const length = Math.sqrt((to.x - from.x) ** 2 + (to.y - from.y) ** 2) || 1;
  const across = { x: (-(to.y - from.y) / length) * rulerEnd, y: ((to.x - from.x) / length) * rulerEnd };
  const end = (at: Point) => `M${at.x - across.x} ${at.y - across.y}L${at.x + across.x} ${at.y + across.y}`;
  return `M${from.x} ${from.y}L${to.x} ${to.y}${end(from)}${end(to)}`;
}

function ellipsePath(from: Point, to: Point): string {
  const [rx, ry] = [Math.abs(to.x - from.x) / 2, Math.abs(to.y - from.y) / 2];
  const [left, middle] = [Math.min(from.x, to.x), (from.y + to.y) / 2];
  return `M${left} ${middle}A${rx} ${ry} 0 1 1 ${left + 2 * rx} ${middle}A${rx} ${ry} 0 1 1 ${left} ${middle}Z`;
}

/** The strokes of a mark whose points are given in pixels of the picture. A text is words only; they stand beside its point. */
export function markStrokes(kind: MarkKind, points: readonly Point[]): OverlayStroke[] {
  const [from, to = from] = points;
  if (!from || !to) return [];
  switch (kind) {
    case 'arrow':
      return [stroke(arrowPath(from, to))];
    case 'ruler':
      return [stroke(rulerPath(from, to))];
    case 'ellipse':
      return [stroke(ellipsePath(from, to))];
    case 'rectangle':
      return [stroke(`M${from.x} ${from.y}H${to.x}V${to.y}H${from.x}Z`)];
    case 'polyline':
      return [stroke(points.map(({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${x} ${y}`).join(''))];
    case 'profile':
      return [{ ...stroke(`M${from.x} ${from.y}L${to.x} ${to.y}`), dash: [4, 3] }];
    case 'text':
      return [];
  }
}
