/** The catalogue in a real browser: found by words and by what is seen, a swatch that follows its slider, a page that prints. */
import type { Browser, Page } from 'playwright-core';
import { accessibilityFaults } from './accessibility';
import { openBrowser, takePicture, visitAs, type Visit } from './browser';

let browser: Browser;
let opened: Visit;

beforeAll(async () => {
  browser = await openBrowser();
});
afterEach(async () => {
  const problems = [...opened.problems];
  await opened.close();
  expect(problems).toEqual([]);
});
afterAll(() => browser.close());

/** Waits until every swatch in sight is drawn. */
const drawn = (page: Page) =>
  page.waitForFunction(() => {
    const pictures = [...document.querySelectorAll<HTMLImageElement>('img[src*="/swatch"]')];
    const inSight = pictures.filter((picture) => picture.getBoundingClientRect().top < window.innerHeight);
    return inSight.length > 0 && inSight.every(({ complete, naturalWidth }) => complete && naturalWidth > 0);
  });

/** Digest of the grey levels that a picture shows. */
const levelsOf = (page: Page, alt: RegExp) =>
  page.getByAltText(alt).evaluate(async (picture) => {
    if (!(picture instanceof HTMLImageElement)) throw new Error('not a picture');
    await picture.decode();
    const canvas = new OffscreenCanvas(picture.naturalWidth, picture.naturalHeight);
    const context = canvas.getContext('2d');
    if (context === null) throw new Error('no canvas');
    context.drawImage(picture, 0, 0);
    const digest = await crypto.subtle.digest('SHA-256', context.getImageData(0, 0, canvas.width, canvas.height).data);
    return Array.from(new Uint8Array(digest), (byte) => byte.toString(16)).join('');
  });

test('on a desk, what does not fit stays in its place as an outline, and the address keeps the filters', async () => {
  opened = await visitAs(browser, 'technologist', '/causes');
  const { page } = opened;
  await drawn(page);
  await takePicture(page, 'causes-desk');
  const wrap = page.getByRole('link', { name: /^Wrap-around: / });
  const motion = page.getByRole('link', { name: /^Periodic motion: / });
  const before = await motion.boundingBox();
  await page.getByRole('tab', { name: /^ghosts/ }).click();
  await wrap.locator('img').waitFor({ state: 'detached' });
  expect(await motion.boundingBox()).toEqual(before);
  expect(await motion.locator('img').count()).toBe(1);

  await page.getByRole('searchbox', { name: 'search the causes' }).fill('respiratory');
  await page.waitForURL(/seen=ghosts.*q=respiratory|q=respiratory.*seen=ghosts/);
  await page.reload();
  await drawn(page);
  expect(await page.getByRole('tab', { name: /^ghosts/ }).getAttribute('aria-selected')).toBe('true');
  await takePicture(page, 'causes-desk-filtered');
  expect(await accessibilityFaults(page)).toEqual([]);
});

test('on a phone, what does not fit becomes a line of names', async () => {
  opened = await visitAs(browser, 'technologist', '/causes?seen=ghosts', 'phone');
  const { page } = opened;
  await drawn(page);
  const encoding = page.getByRole('region', { name: 'encoding' });
  await encoding.getByText(/^\d+ of \d+$/).waitFor();
  expect(await page.getByRole('link', { name: /^Wrap-around: / }).count()).toBe(0);
  await encoding
    .getByText(/wrap-around/i)
    .first()
    .waitFor();
  await takePicture(page, 'causes-phone');
  const overhang = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  expect(overhang).toBeLessThanOrEqual(0);
  expect(await accessibilityFaults(page)).toEqual([]);
});

describe.each(['phone', 'desk'] as const)('the page of a cause on a %s', (size) => {
  test('one slider moves picture and k-space from mild to strong', async () => {
    opened = await visitAs(browser, 'technologist', '/causes/partial-fourier', size);
    const { page } = opened;
    const slider = page.getByRole('slider', { name: 'mild to strong' });
    await slider.waitFor();
    await page.locator('.formula math').first().waitFor();
    await drawn(page);
    const before = { image: await levelsOf(page, /: picture$/), kspace: await levelsOf(page, /: k-space$/) };
    const answered = page.waitForResponse((response) => /swatch\?strength=1&domain=kspace/.test(response.url()));
    await slider.fill('100');
    await answered;
    await drawn(page);
    expect(await levelsOf(page, /: picture$/)).not.toBe(before.image);
    expect(await levelsOf(page, /: k-space$/)).not.toBe(before.kspace);
    await takePicture(page, `cause-${size}`);
    expect(await accessibilityFaults(page)).toEqual([]);
  });
});

test('from its page a cause is opened on the bench of an open case, as a step', async () => {
  opened = await visitAs(browser, 'technologist', '/causes/periodic-motion');
  const { page } = opened;
  await page.getByRole('button', { name: 'try it on the bench' }).click();
  await page.getByRole('dialog').getByRole('link').first().click();
  await page.waitForURL(/\/bench\?add=periodic-motion$/);
  await page.getByText('Periodic motion').first().waitFor();
});

test('a reconstruction has a page as causes have, and opens on the bench with a step that shows it', async () => {
  opened = await visitAs(browser, 'technologist', '/causes');
  const { page } = opened;
  await page
    .getByRole('region', { name: 'reconstruction' })
    .getByRole('link', { name: /^Homodyne: / })
    .click();
  await page.getByRole('slider', { name: 'mild to strong' }).waitFor();
  await page.getByRole('table', { name: 'what I can change now' }).getByRole('columnheader', { name: 'SAR' }).waitFor();
  await drawn(page);
  await takePicture(page, 'reconstruction-desk');
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole('button', { name: 'try it on the bench' }).click();
  await page.getByRole('dialog').getByRole('link').first().click();
  await page.waitForURL(/\/bench\?add=homodyne$/);
  await page.getByText('Partial Fourier').first().waitFor();
});

test('the form of a step shows what matters at its choices', async () => {
  opened = await visitAs(browser, 'technologist', '/causes/periodic-motion');
  const { page } = opened;
  await page.getByRole('button', { name: 'try it on the bench' }).click();
  await page.getByRole('dialog').getByRole('link').first().click();
  await page.getByRole('slider', { name: 'Phase swing' }).waitFor();
  expect(await page.getByRole('slider', { name: 'Displacement' }).count()).toBe(0);
  await page.getByRole('button', { name: /^What moves: / }).click();
  await page.getByRole('menuitemradio', { name: 'Place along readout' }).click();
  await page.getByRole('slider', { name: 'Displacement' }).waitFor();
  expect(await page.getByRole('slider', { name: 'Phase swing' }).count()).toBe(0);
  await takePicture(page, 'bench-form-desk');
});

test('on paper a cause is light, whole, and without rail, buttons and slider', async () => {
  opened = await visitAs(browser, 'technologist', '/causes/periodic-motion');
  const { page } = opened;
  await page.getByRole('button', { name: /^theme: light/ }).click();
  await page.locator('.formula math').first().waitFor();
  await drawn(page);
  await page.emulateMedia({ media: 'print' });
  expect(await page.getByRole('navigation').isVisible()).toBe(false);
  expect(await page.getByRole('slider').isVisible()).toBe(false);
  const title = page.getByRole('heading', { level: 1, name: 'Periodic motion' });
  // The ink of the light theme.
  expect(await title.evaluate((heading) => getComputedStyle(heading).color)).toBe('rgb(34, 32, 27)');
  const grounds = await title.evaluate((heading) => {
    const above: string[] = [];
    for (let element = heading.parentElement; element; element = element.parentElement)
      above.push(getComputedStyle(element).backgroundColor);
    return [...new Set(above)];
  });
  // The last is the root, which is the paper.
  expect(grounds).toEqual(['rgba(0, 0, 0, 0)', 'rgb(255, 255, 255)']);
  const { page: paper, content } = await page.evaluate(() => ({
    page: document.documentElement.scrollHeight,
    content: document.querySelector('main, [role=main]')?.scrollHeight ?? Infinity,
  }));
  expect(paper).toBeGreaterThanOrEqual(content);
  await takePicture(page, 'cause-paper');
});
