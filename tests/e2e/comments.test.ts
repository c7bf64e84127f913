import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { eq } from 'drizzle-orm';
import type { Browser, Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '#shared/access/roles.ts';
import { pages } from '#server/db/schema/index.ts';
import { block, doc, text, word } from '#shared/document/documents.fixture.ts';
import { keepPicture, openBrowser, seriousFindings, signedIn } from '../helpers/browser.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type Caller, type TestServer, addressOf, password, startTestServer } from '../helpers/server.ts';

let server: TestServer;
let browser: Browser;
let editor: Caller;
let manualId: string;
let pageId: string;

beforeAll(async () => {
  server = await startTestServer();
  editor = await server.as('editor');
  const archivist = await server.as('archivist');
  manualId = await archivist.newManual();
  await archivist.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(7)) }]);
  pageId = (await archivist.pagesOf(manualId))[0].id as string;
  const document = doc(
    block('heading', { id: 'h', level: 1, zone: [150, 220, 420, 24] }, word('SECTION 7.', [150, 220, 160, 24])),
    block(
      'step',
      { id: 'c', marker: 'c.', zone: [150, 384, 760, 28] },
      text('The injection must be '),
      word('145.900', [525, 388, 108, 24]),
      text(' '),
      word('mc', [648, 388, 30, 24]),
      text(' on sheet 7.'),
    ),
  );
  await editor.put(`/api/pages/${pageId}/document`, { baseRevision: 0, document });
  // As if it had been drawn: nothing is read here.
  const picture = path.join(server.dataDir, 'sheet.jpg');
  writeFileSync(picture, drawSheet(sheet(7)));
  await server.tools.files.put('sheet.jpg', picture);
  const drawn = { imageKey: 'sheet.jpg', width: 1275, height: 1650 };
  server.tools.db.update(pages).set(drawn).where(eq(pages.id, pageId)).run();
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await server.stop();
});

const windowOf = async (role: Role, at: string): Promise<Page> => {
  const { page } = await signedIn(browser, server.url, { email: addressOf(role), password });
  await page.goto(server.url + at);
  await page.locator('.page-text').waitFor();
  return page;
};
const panel = (page: Page): Locator => page.getByRole('region', { name: 'Comments' });
const marked = (page: Page, name: string): Promise<string[]> =>
  page.evaluate((of) => [...(CSS.highlights.get(of) ?? [])].map((range) => (range as Range).toString()), name);

describe('a question about a value', () => {
  it('is asked by @, answered from the reading view, and resolved', async () => {
    const asking = await windowOf('editor', `/pages/${pageId}`);
    await asking.locator('.w', { hasText: '145.900' }).dblclick();
    await asking.getByRole('toolbar', { name: 'Page tools' }).getByRole('button', { name: 'Comment' }).click();
    expect(await marked(asking, 'note-lit')).toEqual(['145.900']);
    await asking.keyboard.type('Is this what the crystal gives, @tech');
    expect(await seriousFindings(asking)).toEqual([]);
    await asking.keyboard.press('Enter');
    await asking.keyboard.type('?');
    await keepPicture(asking, 'comment-asking');
    await asking.keyboard.press('Control+Enter');
    const thread = panel(asking).getByRole('listitem', { name: /Question by Test editor/ });
    await thread.waitFor();
    expect(await thread.evaluate((element) => element === document.activeElement)).toBe(true);
    expect(await marked(asking, 'note')).toEqual(['145.900']);
    await asking.getByRole('button', { name: 'Question: Is this what' }).waitFor();

    const administrator = await server.as('administrator');
    const [mail] = (await administrator.get('/api/outbox?limit=1')).body.items;
    expect(mail).toMatchObject({ to: addressOf('technician') });
    const link = String(mail.text.match(/http\S+/)?.[0]);

    const answering = await windowOf('technician', link.replace(server.url, ''));
    await panel(answering).getByText('Is this what the crystal gives').waitFor();
    expect(await marked(answering, 'note')).toEqual(['145.900']);
    await panel(answering).getByRole('button', { name: 'Reply' }).click();
    await answering.keyboard.type('It is: 15.0222 times nine, and 10.7 more.');
    await panel(answering).getByRole('button', { name: 'Reply', exact: true }).click();
    await panel(answering).getByRole('list', { name: 'Replies' }).waitFor();
    expect(await seriousFindings(answering)).toEqual([]);
    await keepPicture(answering, 'comment-answered');

    // The words are rewritten by hand while the thread is open: it stays, and says so.
    await thread.getByText('15.0222 times nine').waitFor();
    await asking.locator('.w', { hasText: '145.900' }).dblclick();
    await asking.keyboard.type('145.090');
    await thread.getByText('The text here has changed since.').waitFor();
    await asking.keyboard.press('Control+z');
    await thread.getByText('The text here has changed since.').waitFor({ state: 'detached' });

    await asking.goto(`${server.url}/manuals/${manualId}`);
    await asking.getByRole('tab', { name: '1 open question' }).click();
    expect(await seriousFindings(asking)).toEqual([]);
    await keepPicture(asking, 'comment-list');
    await asking.getByRole('link', { name: /145\.900/ }).click();
    await panel(asking).getByRole('button', { name: 'Resolve' }).click();
    await panel(asking).getByText('1 resolved').waitFor();
    await asking.waitForFunction(() => document.activeElement?.textContent?.startsWith('Comments') === true);
    await panel(answering).getByText('1 resolved').waitFor();
  });

  it('can be asked by the keys alone, about a place of the scan', async () => {
    const page = await windowOf('technician', `/pages/${pageId}/read`);
    await page.getByRole('button', { name: 'Comment on a place' }).press('Enter');
    await page.keyboard.press('+');
    await page.keyboard.press('Enter');
    await page.getByLabel('Your question').waitFor();
    await page.keyboard.press('Escape');
    await page.getByLabel('Your question').waitFor({ state: 'detached' });
    await page.getByRole('button', { name: 'Comment on a place' }).press('Enter');
    await page.keyboard.press('Enter');
    await page.keyboard.type('What is this stain?');
    await page.keyboard.press('Control+Enter');
    await panel(page)
      .getByRole('listitem', { name: /a place on the scan/ })
      .waitFor();
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'comment-place');
  });
});
