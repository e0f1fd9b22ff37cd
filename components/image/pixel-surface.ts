/**
 * Puts finished RGBA pixels on a canvas of exactly that many pixels; the browser scales the canvas, and nothing here does, so that
 * no value is ever smoothed or re-coloured. Skia draws on a software surface: the same bytes with a GPU, without, and without WebGL.
 */
import type { Skia } from './load-skia';

export interface Pixels {
  readonly rows: number;
  readonly columns: number;
  /** [row, column, red green blue alpha], opaque. */
  readonly bytes: Uint8ClampedArray<ArrayBuffer>;
}

export interface PixelSurface {
  show(pixels: Pixels): void;
  /** Gives back what the surface holds outside the reach of the garbage collector. */
  dispose(): void;
}

function fit(canvas: HTMLCanvasElement, { rows, columns }: Pixels): boolean {
  if (canvas.width === columns && canvas.height === rows) return false;
  canvas.width = columns;
  canvas.height = rows;
  return true;
}

export function plainPixelSurface(canvas: HTMLCanvasElement): PixelSurface {
  return {
    show(pixels) {
      fit(canvas, pixels);
      canvas.getContext('2d')?.putImageData(new ImageData(pixels.bytes, pixels.columns, pixels.rows), 0, 0);
    },
    // A plain canvas is collected with its element.
    dispose: () => undefined,
  };
}

export function skiaPixelSurface(skia: Skia, canvas: HTMLCanvasElement): PixelSurface {
  let surface: ReturnType<Skia['MakeSWCanvasSurface']> = null;
  const ofSize = (pixels: Pixels) => {
    if (fit(canvas, pixels) || !surface) {
      surface?.dispose();
      surface = skia.MakeSWCanvasSurface(canvas);
    }
    return surface;
  };
  return {
    show(pixels) {
      const target = ofSize(pixels);
      const { rows, columns, bytes } = pixels;
      const info = {
        width: columns,
        height: rows,
        colorType: skia.ColorType.RGBA_8888,
        alphaType: skia.AlphaType.Opaque,
        colorSpace: skia.ColorSpace.SRGB,
      };
      const image = target && skia.MakeImage(info, bytes, 4 * columns);
      if (!target || !image) return;
      target.getCanvas().drawImage(image, 0, 0);
      target.flush();
      image.delete();
    },
    dispose() {
      surface?.dispose();
      surface = null;
    },
  };
}
