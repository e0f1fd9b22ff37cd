/**
 * Draws overlay strokes on a transparent canvas above the picture: Skia on the GPU where there is one, Skia on a software surface
 * where there is none, a plain canvas while Skia is not there. The same strokes in the same order in all three.
 */
import type { Capability } from './capability';
import type { Skia } from './load-skia';
import type { OverlayStroke } from './overlay-strokes';

export interface OverlaySurface {
  draw(strokes: readonly OverlayStroke[]): void;
  dispose(): void;
}

type SkiaSurface = NonNullable<ReturnType<Skia['MakeSWCanvasSurface']>>;
type SkiaCanvas = ReturnType<SkiaSurface['getCanvas']>;

function drawWithSkia(skia: Skia, canvas: SkiaCanvas, strokes: readonly OverlayStroke[]): void {
  for (const { path, colour, width, casing, dash } of strokes) {
    const outline = skia.Path.MakeFromSVGString(path);
    if (!outline) continue;
    const paint = new skia.Paint();
    const dashes = dash ? skia.PathEffect.MakeDash([...dash]) : null;
    paint.setAntiAlias(true);
    paint.setStyle(skia.PaintStyle.Stroke);
    paint.setStrokeWidth(casing);
    paint.setColor(skia.BLACK);
    canvas.drawPath(outline, paint);
    paint.setStrokeWidth(width);
    paint.setColor(skia.parseColorString(colour));
    if (dashes) paint.setPathEffect(dashes);
    canvas.drawPath(outline, paint);
    dashes?.delete();
    paint.delete();
    outline.delete();
  }
}

/** `ratio`: pixels of the screen for a pixel of the page. Null where Skia gets no surface on this canvas. */
export function skiaOverlay(skia: Skia, canvas: HTMLCanvasElement, ratio: number, capability: Capability): OverlaySurface | null {
  const surface = capability === 'gpu' ? skia.MakeWebGLCanvasSurface(canvas) : skia.MakeSWCanvasSurface(canvas);
  if (!surface) return null;
  return {
    draw(strokes) {
      const target = surface.getCanvas();
      target.clear(skia.TRANSPARENT);
      target.save();
      target.scale(ratio, ratio);
      drawWithSkia(skia, target, strokes);
      target.restore();
      surface.flush();
    },
    dispose: () => surface.dispose(),
  };
}

export function plainOverlay(canvas: HTMLCanvasElement, ratio: number): OverlaySurface {
  return {
    draw(strokes) {
      const context = canvas.getContext('2d');
      if (!context) return;
      context.setTransform(ratio, 0, 0, ratio, 0, 0);
      context.clearRect(0, 0, canvas.width, canvas.height);
      for (const { path, colour, width, casing, dash } of strokes) {
        const outline = new Path2D(path);
        context.setLineDash([]);
        context.lineWidth = casing;
        context.strokeStyle = '#000000';
        context.stroke(outline);
        context.setLineDash(dash ? [...dash] : []);
        context.lineWidth = width;
        context.strokeStyle = colour;
        context.stroke(outline);
      }
    },
    dispose: () => canvas.getContext('2d')?.clearRect(0, 0, canvas.width, canvas.height),
  };
}
