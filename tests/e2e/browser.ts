/**
 * A real browser on the production build: Debian's Chromium, a fresh profile each time, no GPU but a software driver for WebGL. A page remembers everything that
 * went wrong on it, and a test that opened one asks at its end that nothing did.
 */
import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { chromium, type Browser, type ConsoleMessage, type Page } from 'playwright-core';
import { z } from 'zod';
import { roleSchema } from '../../server/contract/route';

/** A phone, a tablet and a desk, in CSS pixels. */
export const sizes = {
  phone: { width: 390, height: 844 },
  tablet: { width: 820, height: 1180 },
  desk: { width: 1440, height: 900 },
} as const;
export type Size = keyof typeof sizes;

export type Role = z.infer<typeof roleSchema>;

const accountsSchema = z.array(z.object({ role: roleSchema, email: z.string(), password: z.string() }));

const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];
/** Chromium's own software driver: WebGL on any machine. */
const withWebgl = ['--use-angle=swiftshader', '--enable-unsafe-swiftshader'];
/** What a machine does whose driver is not trusted: no WebGL context at all. */
const withoutWebgl = ['--disable-webgl', '--disable-3d-apis'];

const programs = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];
const shots = join(__dirname, 'shots');

/** Where the product under test is. */
export function productUrl(): string {
  const url = process.env.PICKGLASS_URL;
  if (url === undefined) throw new Error('PICKGLASS_URL is not set: tests/e2e/start-product.mjs sets it');
  return url;
}

export function openBrowser({ webgl = true }: { webgl?: boolean } = {}): Promise<Browser> {
  const executablePath = programs.find(existsSync);
  if (executablePath === undefined) throw new Error('Chromium is missing. As root: apt-get install -y --no-install-recommends chromium');
  return chromium.launch({ executablePath, args: [...flags, ...(webgl ? withWebgl : withoutWebgl)] });
}

export interface Visit {
  readonly page: Page;
  /** Errors of the console and uncaught exceptions, in order. Expected to be empty. */
  readonly problems: readonly string[];
  close(): Promise<void>;
}

/** Opens a page with a profile of its own at a path of the product. */
export async function visit(browser: Browser, path: string, size: Size = 'desk'): Promise<Visit> {
  const context = await browser.newContext({ baseURL: productUrl(), viewport: sizes[size], locale: 'en-GB', timezoneId: 'UTC' });
  const page = await context.newPage();
  const problems: string[] = [];
  page.on('pageerror', (error) => problems.push(String(error)));
  page.on('console', (message) => {
    if (message.type() === 'error' && !isAskingWhoIsThere(message)) problems.push(`${message.text()} at ${message.location().url}`);
  });
  await page.goto(path);
  return { page, problems, close: () => context.close() };
}

/** The client asks once who is signed in; where nobody is, Chromium logs the 401 as an error, which it is not. */
const isAskingWhoIsThere = (message: ConsoleMessage): boolean =>
  message.text().includes('401') && new URL(message.location().url).pathname === '/api/session';

/** E-mail and password of the demo account with `role`. */
export function demoAccount(role: Role): { email: string; password: string } {
  const file = join(process.env.PICKGLASS_DATA ?? '.pickglass', 'demo-accounts.json');
  const account = accountsSchema.parse(JSON.parse(readFileSync(file, 'utf8'))).find((one) => one.role === role);
  if (account === undefined) throw new Error(`the demo department has no ${role}`);
  return account;
}

/** Fills the sign-in form as a person would, and waits until the cases are there. */
export async function signIn(page: Page, role: Role): Promise<void> {
  const { email, password } = demoAccount(role);
  await page.getByLabel('e-mail').fill(email);
  await page.getByLabel('password').fill(password);
  await page.getByRole('button', { name: 'sign in' }).click();
  await page.waitForURL('**/cases');
}

/** Opens the product signed in as `role`, at a path. */
export async function visitAs(browser: Browser, role: Role, path = '/cases', size: Size = 'desk'): Promise<Visit> {
  const opened = await visit(browser, '/sign-in', size);
  await signIn(opened.page, role);
  if (path !== '/cases') await opened.page.goto(path);
  return opened;
}

/** Keeps a picture of the page for people to look at, under tests/e2e/shots. */
export async function takePicture(page: Page, name: string): Promise<void> {
  mkdirSync(shots, { recursive: true });
  await page.screenshot({ path: join(shots, `${name}.png`) });
}
