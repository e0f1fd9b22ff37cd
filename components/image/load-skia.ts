/**
 * CanvasKit, Skia compiled to WebAssembly: 3 MB that a page without pictures never loads. Fetched from our own origin when the
 * first pane appears; until it is there, and where it cannot run, the panes draw the same pixels on a plain canvas.
 */
import { useSyncExternalStore } from 'react';

export type Skia = typeof globalThis.CanvasKit;

let skia: Skia | null = null;
let loading: Promise<void> | undefined;
const listeners = new Set<() => void>();

async function load(): Promise<void> {
  try {
    const { LoadSkiaWeb } = await import('@shopify/react-native-skia/lib/module/web/LoadSkiaWeb');
    await LoadSkiaWeb({ locateFile: (file) => `/${file}` });
    skia = globalThis.CanvasKit;
    listeners.forEach((listener) => listener());
  } catch (reason) {
    console.warn('Skia could not be loaded; pictures are drawn on a plain canvas, with the same pixels.', reason);
  }
}

function subscribe(listener: () => void): () => void {
  loading ??= load();
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Skia, or null while it is not there. */
export const useSkia = (): Skia | null => useSyncExternalStore(subscribe, () => skia);
