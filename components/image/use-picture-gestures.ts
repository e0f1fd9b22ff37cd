/**
 * What a hand does on a picture. One finger or the left button: a press puts the cursor there, a drag sets window and level, or draws
 * where a mark is being drawn. Two fingers, the wheel, or a drag with the middle button or Alt: zoom and pan.
 */
import { useEffect, useEffectEvent, useRef, type PointerEvent, type RefObject } from 'react';
import type { PlaneGrid } from './display-plane';
import type { Point } from './overlay-strokes';
import { panRegion, zoomRegion, type Region } from './region';

export interface PictureHand {
  onPress(at: Point): void;
  /** Fractions of the picture since the drag began. */
  onDragStart(): void;
  onDrag(right: number, down: number): void;
  onDragEnd(): void;
  /** Where a mark is being drawn, a drag goes here instead, in pixels of the picture. */
  onDraw?: ((from: Point, to: Point, done: boolean) => void) | undefined;
  onRegion(region: Region): void;
}

interface Gesture {
  from: Point;
  last: Point;
  kind: 'undecided' | 'window' | 'draw' | 'pan' | 'pinch';
  /** Distance of two fingers. */
  spread: number;
}

const steadyHand = 4;
const wheelZoom = 0.0015;

const distance = (a: Point, b: Point): number => Math.sqrt((a.x - b.x) ** 2 + (a.y - b.y) ** 2);
const middle = (a: Point, b: Point): Point => ({ x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 });

export function usePictureGestures(picture: RefObject<HTMLDivElement | null>, region: Region, grid: PlaneGrid, hand: PictureHand) {
  const fingers = useRef(new Map<number, Point>());
  const gesture = useRef<Gesture | null>(null);

  const at = (event: { clientX: number; clientY: number }): Point => {
    const box = picture.current?.getBoundingClientRect();
    return { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) };
  };
  const size = () => ({ width: picture.current?.clientWidth ?? 1, height: picture.current?.clientHeight ?? 1 });
  const fraction = (point: Point): Point => ({ x: point.x / size().width, y: point.y / size().height });

  const zoom = useEffectEvent((event: WheelEvent) => {
    event.preventDefault();
    hand.onRegion(zoomRegion(region, Math.exp(-event.deltaY * wheelZoom), fraction(at(event)), grid));
  });
  useEffect(() => {
    const element = picture.current;
    // React's wheel listeners are passive: the page would scroll beneath the picture.
    const onWheel = (event: WheelEvent) => zoom(event);
    element?.addEventListener('wheel', onWheel, { passive: false });
    return () => element?.removeEventListener('wheel', onWheel);
  }, [picture]);

  const pinch = (current: Gesture): void => {
    const [first, second] = [...fingers.current.values()];
    if (!first || !second) return;
    const centre = middle(first, second);
    const spread = distance(first, second);
    const zoomed = zoomRegion(region, spread / current.spread, fraction(centre), grid);
    const moved = fraction({ x: centre.x - current.last.x, y: centre.y - current.last.y });
    hand.onRegion(panRegion(zoomed, moved.x, moved.y, grid));
    gesture.current = { ...current, last: centre, spread };
  };

  const drag = (current: Gesture, to: Point): void => {
    if (current.kind === 'undecided') {
      if (distance(current.from, to) < steadyHand) return;
      current.kind = hand.onDraw ? 'draw' : 'window';
      if (current.kind === 'window') hand.onDragStart();
    }
    const moved = fraction({ x: to.x - current.from.x, y: to.y - current.from.y });
    if (current.kind === 'draw') hand.onDraw?.(current.from, to, false);
    else if (current.kind === 'window') hand.onDrag(moved.x, moved.y);
    else {
      const step = fraction({ x: to.x - current.last.x, y: to.y - current.last.y });
      hand.onRegion(panRegion(region, step.x, step.y, grid));
    }
    current.last = to;
  };

  return {
    onPointerDown(event: PointerEvent<HTMLDivElement>) {
      event.currentTarget.setPointerCapture(event.pointerId);
      const point = at(event);
      fingers.current.set(event.pointerId, point);
      const [first, second] = [...fingers.current.values()];
      if (first && second) {
        gesture.current = { from: point, last: middle(first, second), kind: 'pinch', spread: Math.max(1, distance(first, second)) };
      } else {
        gesture.current = { from: point, last: point, kind: event.button === 1 || event.altKey ? 'pan' : 'undecided', spread: 1 };
      }
    },
    onPointerMove(event: PointerEvent<HTMLDivElement>) {
      if (!fingers.current.has(event.pointerId)) return;
      const point = at(event);
      fingers.current.set(event.pointerId, point);
      const current = gesture.current;
      if (current?.kind === 'pinch') pinch(current);
      else if (current) drag(current, point);
    },
    onPointerUp(event: PointerEvent<HTMLDivElement>) {
      const point = at(event);
      fingers.current.delete(event.pointerId);
      const current = gesture.current;
      if (fingers.current.size > 0 || !current) return;
      gesture.current = null;
      if (current.kind === 'undecided') hand.onPress(point);
      else if (current.kind === 'draw') hand.onDraw?.(current.from, point, true);
      else if (current.kind === 'window') hand.onDragEnd();
    },
    onPointerCancel(event: PointerEvent<HTMLDivElement>) {
      fingers.current.delete(event.pointerId);
      if (fingers.current.size === 0) gesture.current = null;
    },
  };
}
