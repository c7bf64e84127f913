import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '#shared/access/roles.ts';
import { block, doc, partsTable, text } from '#shared/document/documents.fixture.ts';
import { keepPicture, openBrowser, seriousFindings, signedIn } from '../helpers/browser.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type Caller, type TestServer, addressOf, password, startTestServer } from '../helpers/server.ts';

let server: TestServer;
let browser: Browser;
let editor: Caller;
let manualId: string;
let pageId: string;

const pageOf = (...words: string[]) =>
  doc(...words.map((each, at) => block('paragraph', { id: `p${at}` }, text(each))), partsTable());
const write = (baseRevision: number, ...words: string[]) =>
  editor.put(`/api/pages/${pageId}/document`, { baseRevision, document: pageOf(...words) });
const windowOf = async (role: Role): Promise<Page> =>
  (await signedIn(browser, server.url, { email: addressOf(role), password })).page;
const cell = (page: Page, label: string) => page.locator(`dt:text-is("${label}") + dd`);
/** A picture of the screen as a phone shows it in the dark. */
async function keepDarkPhone(page: Page, name: string): Promise<void> {
  if (process.env['SCREENSHOTS'] === undefined) return;
  await page.setViewportSize({ width: 390, height: 844 });
  await page.emulateMedia({ colorScheme: 'dark' });
  await keepPicture(page, `${name}-dark-phone`);
  await page.setViewportSize({ width: 1440, height: 900 });
  await page.emulateMedia({ colorScheme: 'light' });
}
const pageText = (page: Page) => page.getByLabel('Page text').first();

beforeAll(async () => {
  server = await startTestServer();
  editor = await server.as('editor');
  const archivist = await server.as('archivist');
  manualId = await archivist.newManual();
  await archivist.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(7)) }]);
  pageId = (await archivist.pagesOf(manualId))[0].id as string;
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await server.stop();
});

describe('an edition', () => {
  it('is corrected by one, signed by another, published, and read as it was', async () => {
    await write(0, 'Tune the core of L5.', 'Lock the core.');
    const first = await windowOf('editor');
    await first.goto(`${server.url}/pages/${pageId}/read`);
    await first.getByText('You wrote this text: another editor signs it off.').waitFor();

    const second = await windowOf('archivist');
    await second.goto(`${server.url}/pages/${pageId}/read`);
    await second.getByRole('button', { name: 'Sign off as proofed' }).click();
    await second.getByRole('button', { name: 'Take the signature back' }).waitFor();
    expect(await cell(second, 'Signed off').textContent()).toContain('Test archivist');

    await second.goto(`${server.url}/manuals/${manualId}`);
    await second.getByRole('link', { name: 'Editions', exact: true }).click();
    await second.getByText('Nothing has been published yet').waitFor();
    await second.getByRole('button', { name: 'Publish an edition' }).click();
    await second.getByText('Nothing speaks against it').waitFor();
    expect(await seriousFindings(second)).toEqual([]);
    await second.getByLabel('Name').fill('Winter issue');
    await second.getByRole('button', { name: 'Publish edition 1 with 1 page' }).press('Enter');
    await second.getByRole('article', { name: 'Edition 1, Winter issue' }).waitFor();

    const reader = await windowOf('reader');
    await reader.goto(`${server.url}/pages/${pageId}/read`);
    await pageText(reader).getByText('Tune the core of L5.').waitFor();
    expect(await cell(reader, 'Edition').textContent()).toContain('1, Winter issue');

    // A later correction: the reader goes on reading the edition, the editor may look at both.
    await write(1, 'Tune the core of L6.', 'Lock the core.');
    await reader.reload();
    await pageText(reader).getByText('Tune the core of L5.').waitFor();
    await first.goto(`${server.url}/pages/${pageId}/read`);
    await pageText(first).getByText('Tune the core of L6.').waitFor();
    await first.getByRole('button', { name: 'Show change bars' }).click();
    await first.getByText('1 change since Edition 1, Winter issue.').waitFor();
    expect(await pageText(first).locator('.change-bar').textContent()).toBe(
      'Changed since Edition 1, Winter issue: Tune the core of L6.',
    );
    expect(await seriousFindings(first)).toEqual([]);
    await keepPicture(first, 'change-bars');
    await keepDarkPhone(first, 'change-bars');
    await first.getByRole('radio', { name: 'The edition' }).click();
    await pageText(first).getByText('Tune the core of L5.').waitFor();

    await second.reload();
    await second.getByRole('button', { name: 'What changed on page 1' }).click();
    await second.locator('del', { hasText: 'L5' }).waitFor();
    await second.getByRole('button', { name: 'Publish an edition' }).click();
    await second.getByText('1 page not proofed').waitFor();
    await keepPicture(second, 'publish');
    await second.getByRole('button', { name: 'Publish edition 2 with 1 page' }).click();
    await second.getByRole('article', { name: 'Edition 2' }).waitFor();
    expect(await seriousFindings(second)).toEqual([]);
    await keepPicture(second, 'editions');
    await keepDarkPhone(second, 'editions');
    await pageText(reader).getByText('Tune the core of L6.').waitFor();
    expect(await cell(reader, 'Edition').textContent()).toContain('2, ');

    // Withdrawn, the reader is back at the one before.
    await second.getByRole('button', { name: 'Withdraw edition 2' }).click();
    await second.getByRole('dialog').getByRole('button', { name: 'Withdraw edition 2' }).click();
    await second.getByText('Say why it is withdrawn.').waitFor();
    await second.getByLabel('Why').fill('The core is L5 after all');
    await second.getByRole('dialog').getByRole('button', { name: 'Withdraw edition 2' }).click();
    await second.getByText('by Test archivist: The core is L5 after all').waitFor();
    await pageText(reader).getByText('Tune the core of L5.').waitFor();
    expect(await seriousFindings(reader)).toEqual([]);
  });
});

describe('the history of a page', () => {
  it('compares cell by cell, says who wrote what, and brings one cell back', async () => {
    const { body: now } = await editor.get(`/api/pages/${pageId}`);
    const document = JSON.parse(JSON.stringify(now.document).replace('22-1470', '22-1740')) as object;
    await editor.put(`/api/pages/${pageId}/document`, { baseRevision: now.revision, document });
    const page = await windowOf('archivist');
    await page.goto(`${server.url}/pages/${pageId}`);
    await page.locator('.page-text').getByText('22-1740').waitFor();
    await page.getByRole('button', { name: 'History' }).click();
    await page.locator('.compared ins', { hasText: '1740' }).waitFor();
    await page.getByRole('button', { name: 'Who wrote what' }).click();
    await page.getByRole('table', { name: 'Who wrote each block' }).getByText('Tune the core of L6.').waitFor();
    expect(await seriousFindings(page)).toEqual([]);
    await page.getByRole('radio', { name: 'Side by side' }).click();
    await page.locator('.compared-sides').waitFor();
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'history');
    await keepDarkPhone(page, 'history');
    await page.getByRole('button', { name: 'Restore this cell to “22-1470”' }).press('Enter');
    await page.getByText('Restored: one cell as in revision 2.').waitFor();
    await page.keyboard.press('Escape');
    await page.locator('.page-text').getByText('22-1470').waitFor();
  });
});
