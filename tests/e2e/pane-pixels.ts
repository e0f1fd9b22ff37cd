/** What a pane shows, as a digest of the pixels of its planes, read back in the browser. */
import type { Locator, Page } from 'playwright-core';

/** The two panes, by the names that a screen reader speaks. */
export const imagePane = (page: Page): Locator => page.getByRole('application', { name: /^bad image|^simulated image|^comparison/ });
export const kspacePane = (page: Page): Locator => page.getByRole('application', { name: /^k-space of/ });

/**
 * Digest of every pixel plane in `pane`, in order. The planes are those with as many pixels as the picture has; the overlay, whose
 * size follows the screen and on which the cursor moves, is left out.
 */
export async function paneDigest(pane: Locator): Promise<string> {
  const planes = pane.locator('canvas[style*="pixelated"]');
  await planes.first().waitFor();
  const digests = await planes.evaluateAll((canvases) =>
    Promise.all(
      canvases
        .filter((canvas) => canvas instanceof HTMLCanvasElement)
        .map(async (canvas) => {
          const pixels = canvas.getContext('2d')?.getImageData(0, 0, canvas.width, canvas.height);
          const digest = new Uint8Array(await crypto.subtle.digest('SHA-256', pixels?.data ?? new Uint8Array()));
          return `${canvas.width}×${canvas.height} ${Array.from(digest, (byte) => byte.toString(16)).join('')}`;
        }),
    ),
  );
  return digests.join('; ');
}

/** Waits until the pane shows something else than `before`, and resolves to the digest of it. */
export async function changedDigest(pane: Locator, before: string, seconds = 15): Promise<string> {
  const end = Date.now() + seconds * 1000;
  while (Date.now() < end) {
    const now = await paneDigest(pane);
    if (now !== before) return now;
    await pane.page().waitForTimeout(100);
  }
  throw new Error(`the pane shows the same picture after ${seconds} s`);
}

/** Waits until two looks, a moment apart, see the same. */
export async function settledDigest(pane: Locator): Promise<string> {
  let before = await paneDigest(pane);
  for (;;) {
    await pane.page().waitForTimeout(700);
    const now = await paneDigest(pane);
    if (now === before) return now;
    before = now;
  }
}
