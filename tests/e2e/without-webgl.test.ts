/**
 * The panes where WebGL is switched off, as on a machine whose graphics driver is not trusted: they draw the same pixels as with it.
 * Both browsers look at the first case of the demo department with the same recipe on it.
 */
import type { Browser } from 'playwright-core';
import { openBrowser, takePicture, visitAs } from './browser';
import { imagePane, kspacePane, settledDigest } from './pane-pixels';

interface Seen {
  readonly hasWebgl: boolean;
  readonly image: string;
  readonly kspace: string;
  readonly problems: readonly string[];
}

async function lookAtTrial(browser: Browser, picture: string): Promise<Seen> {
  const { page, problems, close } = await visitAs(browser, 'physicist');
  await page.getByRole('link', { name: 'Ghosts on every T1 head' }).click();
  await page.getByRole('link', { name: 'open trial 1 on the bench' }).click();
  await imagePane(page).waitFor();
  await page
    .getByText(/^NRMSE/)
    .first()
    .waitFor();
  const hasWebgl = await page.evaluate(() => document.createElement('canvas').getContext('webgl2') !== null);
  const image = await settledDigest(imagePane(page));
  const kspace = await settledDigest(kspacePane(page));
  await takePicture(page, picture);
  await close();
  return { hasWebgl, image, kspace, problems };
}

test('without WebGL both panes draw the same pixels as with it', async () => {
  const withIt = await openBrowser({ webgl: true });
  const usual = await lookAtTrial(withIt, 'bench-webgl');
  await withIt.close();
  const without = await openBrowser({ webgl: false });
  const bare = await lookAtTrial(without, 'bench-no-webgl');
  await without.close();
  expect([usual.hasWebgl, bare.hasWebgl]).toEqual([true, false]);
  expect(bare.image).toBe(usual.image);
  expect(bare.kspace).toBe(usual.kspace);
  expect(usual.image).not.toBe(usual.kspace);
  expect([...usual.problems, ...bare.problems]).toEqual([]);
});
