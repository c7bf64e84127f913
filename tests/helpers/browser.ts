import { existsSync, mkdirSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import { type Browser, type BrowserContext, type Page, chromium } from 'playwright-core';

const candidates = [
  process.env['CHROMIUM'],
  '/usr/bin/chromium',
  '/usr/bin/chromium-browser',
  '/usr/bin/google-chrome',
];
const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export async function openBrowser(): Promise<Browser> {
  const executablePath = candidates.find((file) => file !== undefined && existsSync(file));
  if (executablePath === undefined) throw new Error('No browser found. Install Chromium, or set CHROMIUM to its path.');
  return chromium.launch({ executablePath, args: flags });
}

type Person = { email: string; password: string };

/** A window of one person, signed in through the sign-in screen. */
export async function signedIn(
  browser: Browser,
  url: string,
  { email, password }: Person,
): Promise<{ page: Page; context: BrowserContext }> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce' });
  const page = await context.newPage();
  page.setDefaultTimeout(30_000);
  await page.goto(`${url}/sign-in`);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((at) => !at.pathname.startsWith('/sign-in'));
  return { page, context };
}

/** What an accessibility scan finds that is serious; empty when all is well. */
export async function seriousFindings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`);
}

/** Keeps a picture of a screen when SCREENSHOTS names a folder. */
export async function keepPicture(page: Page, name: string): Promise<void> {
  const folder = process.env['SCREENSHOTS'];
  if (folder === undefined) return;
  mkdirSync(folder, { recursive: true });
  await page.screenshot({ path: `${folder}/${name}.png` });
}
