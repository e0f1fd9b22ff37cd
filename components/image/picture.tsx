/**
 * A picture: planes in layers, each clipped to its part, and above them the cursor, the divider and the marks. It takes the focus:
 * arrows move the cursor (with Shift by ten), Home centres it, + and − magnify, 0 shows the whole picture.
 */
import { memo, useMemo, useRef, type KeyboardEvent } from 'react';
import { cursorAfterKey, cursorAt, type Cursor } from './cursor';
import type { PlaneGrid } from './display-plane';
import { EmptyWarp } from './empty-warp';
import type { Layer } from './layers';
import { MarkWords, type PictureMark } from './mark-words';
import { OverlayPlane } from './overlay-plane';
import { cursorStroke, dividerStroke, markStrokes, type Point } from './overlay-strokes';
import { pointOf, sampleOf } from './picture-points';
import { PixelPlane } from './pixel-plane';
import { placement, regionShowing, wholeRegion, zoomRegion, type Region } from './region';
import { usePictureGestures } from './use-picture-gestures';

export interface PictureProps {
  /** What it shows, spoken. */
  label: string;
  width: number;
  height: number;
  frame: PlaneGrid;
  layers: readonly Layer[];
  region: Region;
  onRegion: (region: Region) => void;
  cursor: Cursor;
  onCursor: (cursor: Cursor) => void;
  /** Fraction of the width, or null. */
  divider: number | null;
  marks: readonly PictureMark[];
  onWindowStart: () => void;
  onWindowDrag: (right: number, down: number) => void;
  onWindowEnd: () => void;
  /** Enter on the picture: the keyboard's way to set a point of a mark at the cursor. */
  onEnter?: (() => void) | undefined;
  /** Set while a mark is being drawn: both ends as [column, row]. */
  onDraw?: ((from: readonly [number, number], to: readonly [number, number], done: boolean) => void) | undefined;
}

const keyZoom = 1.25;

export function Picture(props: PictureProps) {
  const { label, width, height, frame, layers, region, cursor, divider, marks, onRegion, onCursor, onDraw } = props;
  const element = useRef<HTMLDivElement>(null);
  const size = useMemo(() => ({ width, height }), [width, height]);
  const handlers = usePictureGestures(element, region, frame, {
    onPress: (point) => onCursor(cursorAt(point, size, region, frame)),
    onDragStart: props.onWindowStart,
    onDrag: props.onWindowDrag,
    onDragEnd: props.onWindowEnd,
    onDraw: onDraw && ((from: Point, to: Point, done: boolean) => onDraw(sampleOf(from, size, region), sampleOf(to, size, region), done)),
    onRegion,
  });

  const onKeyDown = (event: KeyboardEvent): void => {
    const moved = cursorAfterKey(cursor, event.key, event.shiftKey, frame);
    const zoom = { '+': keyZoom, '=': keyZoom, '-': 1 / keyZoom }[event.key];
    if (moved) {
      onCursor(moved);
      onRegion(regionShowing(region, moved.row, moved.column, frame));
    } else if (zoom !== undefined) onRegion(zoomRegion(region, zoom, { x: 0.5, y: 0.5 }, frame));
    else if (event.key === 'Enter' && props.onEnter) props.onEnter();
    else if (event.key === '0') onRegion(wholeRegion(frame));
    else return;
    event.preventDefault();
  };

  const covered = layers.reduce((total, { from, to }) => total + to - from, 0);
  const strokes = useMemo(() => {
    const centre = pointOf([cursor.column, cursor.row], size, region);
    const ofMarks = marks.flatMap(({ kind, points }) =>
      markStrokes(
        kind,
        points.map((point) => pointOf(point, size, region)),
      ),
    );
    const edge = divider === null ? [] : [dividerStroke(Math.round(divider * size.width), size.height)];
    return [...edge, ...ofMarks, cursorStroke(centre, size.width / region.columns)];
  }, [cursor, divider, marks, region, size]);

  return (
    <div
      ref={element}
      role="application"
      aria-roledescription="picture"
      aria-label={`${label}. Arrow keys move the cursor.`}
      tabIndex={0}
      onKeyDown={onKeyDown}
      {...handlers}
      style={{
        position: 'relative',
        width,
        height,
        overflow: 'hidden',
        background: '#000',
        flex: 'none',
        touchAction: 'none',
        cursor: 'crosshair',
        userSelect: 'none',
      }}
    >
      {covered < 1 ? <EmptyWarp width={width} height={height} /> : null}
      {layers.map((layer) => (
        <LayerPlane key={layer.name} layer={layer} frame={frame} region={region} />
      ))}
      <OverlayPlane width={width} height={height} strokes={strokes} />
      <MarkWords marks={marks} size={size} region={region} />
    </div>
  );
}

const percent = (fraction: number): string => `${fraction * 100}%`;

const LayerPlane = memo(function LayerPlane({ layer, frame, region }: { layer: Layer; frame: PlaneGrid; region: Region }) {
  const { left, top, width, height } = placement(layer.plane, frame, region);
  const clip = `inset(0 ${percent(1 - layer.to)} 0 ${percent(layer.from)})`;
  return (
    <div style={{ position: 'absolute', inset: 0, clipPath: clip, background: '#000' }}>
      <PixelPlane
        name={layer.name}
        plane={layer.plane}
        table={layer.table}
        mask={layer.mask}
        style={{ position: 'absolute', left: percent(left), top: percent(top), width: percent(width), height: percent(height) }}
      />
    </div>
  );
});
