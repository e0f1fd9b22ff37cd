/** The door of the product, in a real browser on the production build. */
import type { Browser } from 'playwright-core';
import { accessibilityFaults } from './accessibility';
import { demoAccount, openBrowser, productUrl, signIn, sizes, takePicture, visit, type Size } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

test('the start script serves a product whose database and worker threads are up', async () => {
  const response = await fetch(`${productUrl()}/api/health`);
  expect(response.status).toBe(200);
  const health = await response.json();
  expect(health).toMatchObject({ status: 'ok', database: 'ok' });
  expect(health.workers).toBeGreaterThanOrEqual(1);
});

test('CanvasKit comes compressed from our own origin, as WebAssembly', async () => {
  const response = await fetch(`${productUrl()}/canvaskit.wasm`, { headers: { 'Accept-Encoding': 'br, gzip' } });
  expect(response.headers.get('content-type')).toBe('application/wasm');
  expect(response.headers.get('content-encoding')).toMatch(/^(br|gzip)$/);
  // Every WebAssembly module begins with these four bytes (WebAssembly Core Specification 2.0, 5.5.16).
  expect([...new Uint8Array(await response.arrayBuffer()).subarray(0, 4)]).toEqual([0x00, 0x61, 0x73, 0x6d]);
});

describe.each(Object.keys(sizes) as Size[])('on a %s', (size) => {
  test('the sign-in page stands, in the fonts that are shipped', async () => {
    const { page, problems, close } = await visit(browser, '/', size);
    await page.waitForURL('**/sign-in**');
    await page.getByRole('button', { name: 'sign in' }).waitFor();
    const loaded = await page.evaluate(() => [...document.fonts].filter((font) => font.status === 'loaded').map((font) => font.family));
    expect(loaded).toEqual(expect.arrayContaining(['AtkinsonHyperlegible_400Regular', 'JetBrainsMono_400Regular']));
    const families = await page.getByRole('button', { name: 'sign in' }).evaluate((button) => {
      const text = button.querySelector('div, span') ?? button;
      return getComputedStyle(text).fontFamily;
    });
    expect(families).toMatch(/JetBrainsMono|AtkinsonHyperlegible/);
    await takePicture(page, `sign-in-${size}`);
    expect(problems).toEqual([]);
    await close();
  });

  test('the sign-in page does not scroll sideways', async () => {
    const { page, close } = await visit(browser, '/sign-in', size);
    await page.getByRole('button', { name: 'sign in' }).waitFor();
    const overhang = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect(overhang).toBeLessThanOrEqual(0);
    await close();
  });

  test('axe finds no fault on the sign-in page', async () => {
    const { page, close } = await visit(browser, '/sign-in', size);
    await page.getByRole('button', { name: 'sign in' }).waitFor();
    expect(await accessibilityFaults(page)).toEqual([]);
    await close();
  });
});

test('a wrong password says so at the form, and lets nobody in', async () => {
  const { page, close } = await visit(browser, '/sign-in');
  await page.getByLabel('e-mail').fill(demoAccount('technologist').email);
  await page.getByLabel('password').fill('not the password of anybody');
  await page.getByRole('button', { name: 'sign in' }).click();
  await page.getByRole('alert').waitFor();
  expect(new URL(page.url()).pathname).toBe('/sign-in');
  expect((await page.request.get('/api/session')).status()).toBe(401);
  await close();
});

test('a member signs in, is still in after a reload, and signs out', async () => {
  const { page, problems, close } = await visit(browser, '/sign-in');
  await signIn(page, 'physicist');
  await page.reload();
  await page.getByRole('heading', { name: 'Cases' }).waitFor();
  const session = await (await page.request.get('/api/session')).json();
  expect(session).toMatchObject({ member: { role: 'physicist', email: demoAccount('physicist').email } });
  expect(problems).toEqual([]);
  await close();
});
