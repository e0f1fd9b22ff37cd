/** The strokes above a picture: cursor, divider, marks. Redrawn when they change, never when the picture does. */
import { useLayoutEffect, useRef } from 'react';
import { detectCapability } from './capability';
import { useSkia } from './load-skia';
import type { OverlayStroke } from './overlay-strokes';
import { plainOverlay, skiaOverlay, type OverlaySurface } from './overlay-surface';

interface OverlayPlaneProps {
  width: number;
  height: number;
  strokes: readonly OverlayStroke[];
}

const pixelRatio = (): number => Math.min(2, Math.max(1, window.devicePixelRatio));

export function OverlayPlane(props: OverlayPlaneProps) {
  const skia = useSkia();
  // A canvas keeps the kind of its first context for life: another painter or another size is another canvas.
  return <Overlay key={`${skia ? 'skia' : 'plain'} ${props.width} ${props.height}`} {...props} />;
}

function Overlay({ width, height, strokes }: OverlayPlaneProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const surface = useRef<OverlaySurface | null>(null);
  const skia = useSkia();
  const ratio = pixelRatio();
  useLayoutEffect(() => {
    if (!canvas.current) return undefined;
    const made = (skia && skiaOverlay(skia, canvas.current, ratio, detectCapability())) ?? plainOverlay(canvas.current, ratio);
    surface.current = made;
    return () => {
      made.dispose();
      surface.current = null;
    };
  }, [skia, ratio]);
  useLayoutEffect(() => surface.current?.draw(strokes), [strokes, skia]);
  return (
    <canvas
      ref={canvas}
      aria-hidden
      data-plane="overlay"
      width={Math.round(width * ratio)}
      height={Math.round(height * ratio)}
      style={{ position: 'absolute', left: 0, top: 0, width, height, pointerEvents: 'none' }}
    />
  );
}
