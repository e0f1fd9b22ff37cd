/** One plane of a picture on its own canvas, as many canvas pixels as there are samples, placed and clipped by CSS. */
import { useLayoutEffect, useRef, type CSSProperties } from 'react';
import type { ColourTable } from './colour-table';
import type { DisplayPlane } from './display-plane';
import { useSkia } from './load-skia';
import { paintPixels } from './paint-pixels';
import { plainPixelSurface, skiaPixelSurface, type PixelSurface } from './pixel-surface';

interface PixelPlaneProps {
  plane: DisplayPlane;
  table: ColourTable;
  /** Samples that are zero in the mask stay black. */
  mask?: DisplayPlane | undefined;
  style?: CSSProperties | undefined;
  name?: string;
}

export function PixelPlane({ plane, table, mask, style, name }: PixelPlaneProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const surface = useRef<PixelSurface | null>(null);
  const skia = useSkia();
  useLayoutEffect(() => {
    if (!canvas.current) return undefined;
    const made = skia ? skiaPixelSurface(skia, canvas.current) : plainPixelSurface(canvas.current);
    surface.current = made;
    return () => {
      made.dispose();
      surface.current = null;
    };
  }, [skia]);
  useLayoutEffect(() => {
    surface.current?.show({ rows: plane.rows, columns: plane.columns, bytes: paintPixels(plane, table, mask) });
  }, [plane, table, mask, skia]);
  return (
    <canvas ref={canvas} aria-hidden data-plane={name ?? plane.name} style={{ ...style, imageRendering: 'pixelated', display: 'block' }} />
  );
}
