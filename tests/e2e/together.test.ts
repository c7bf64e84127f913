import type {} from '@tiptap/extension-table';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '#shared/access/roles.ts';
import { block, doc, partsTable, text } from '#shared/document/documents.fixture.ts';
import { keepPicture, openBrowser, seriousFindings, signedIn } from '../helpers/browser.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { ServerProcess, freePort } from '../helpers/server-process.ts';
import { Caller, addressOf, eventually, password } from '../helpers/server.ts';

const worksForMs = 60_000;
const killedAtMs = [15_000, 35_000];
const people: Role[] = ['editor', 'archivist'];

let server: ServerProcess;
let browser: Browser;
let url: string;
let editor: Caller;
let pageId: string;
let quantity: string;

beforeAll(async () => {
  server = new ServerProcess('together', { RECOGNITION_WORKERS: '0', PORT: String(await freePort()) });
  for (const role of people) await server.addPerson(role);
  url = await server.start();
  editor = await Caller.signIn(url, addressOf('editor'), password);
  const archivist = await Caller.signIn(url, addressOf('archivist'), password);
  const manualId = await archivist.newManual();
  await archivist.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(7)) }]);
  pageId = (await archivist.pagesOf(manualId))[0].id as string;
  const lines = Array.from({ length: 8 }, (_, at) =>
    block('paragraph', { id: `p${at}` }, text(`Line ${at} of the page.`)),
  );
  await editor.put(`/api/pages/${pageId}/document`, { baseRevision: 0, document: doc(...lines, partsTable()) });
  const made = await editor.post(`/api/manuals/${manualId}/quantities`, {
    ...{ symbol: 'channel', label: 'Channel', kind: 'input', unit: '', home: 12, printed: { text: '12' } },
  });
  expect(made.status).toBe(201);
  quantity = made.body.id as string;
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  server.remove();
});

/** Opens the page in a window of its own and leaves a hand in it that edits at random, by the editor's own commands. */
async function windowOf(role: Role): Promise<Page> {
  const { page } = await signedIn(browser, url, { email: addressOf(role), password });
  await page.goto(`${url}/pages/${pageId}`);
  await page.locator('.page-text').waitFor();
  return page;
}

/**
 * Does one random thing: types a word of its own, takes out one of its own, adds a row to the table, or puts in a live
 * value. Answers the word that was put in or taken out.
 */
const edit = (page: Page, given: { word: string; out: string | null; quantity: string; roll: number }) =>
  page.evaluate(({ word, out, quantity: id, roll }) => {
    const { editor } = document.querySelector('.page-text') as unknown as {
      editor: import('@tiptap/core').Editor;
    };
    const spots: number[] = [];
    let found: { from: number; to: number } | null = null;
    editor.state.doc.descendants((node, position) => {
      if (node.isTextblock) spots.push(position + 1 + node.content.size);
      const at = out === null ? -1 : (node.text?.indexOf(out) ?? -1);
      if (at >= 0 && out !== null) found = { from: position + at, to: position + at + out.length };
    });
    if (found !== null) {
      editor.commands.deleteRange(found);
      return;
    }
    const spot = spots[Math.floor(roll * spots.length)] ?? 1;
    if (roll < 0.15) {
      const inTable = spots.at(-1) ?? 1;
      editor.chain().setTextSelection(inTable).addRowAfter().run();
      editor.commands.insertContentAt(inTable, ` ${word}`);
    } else if (roll < 0.3) {
      editor.commands.insertContentAt(spot, [
        { type: 'liveValue', attrs: { quantity: id, printed: '12' } },
        { type: 'text', text: ` ${word}` },
      ]);
    } else editor.commands.insertContentAt(spot, ` ${word}`);
  }, given);

const textOf = (page: Page): Promise<string> =>
  page.evaluate(() => {
    const { editor } = document.querySelector('.page-text') as unknown as {
      editor: import('@tiptap/core').Editor;
    };
    return JSON.stringify(editor.getJSON());
  });

/** Edits until the time is up. Answers the words that must be on the page in the end, and those that must not. */
async function work(page: Page, name: string, until: number): Promise<{ kept: string[]; gone: string[] }> {
  const kept: string[] = [];
  const gone: string[] = [];
  for (let count = 0; Date.now() < until; count++) {
    const out = count % 4 === 3 ? (kept.splice(Math.floor(Math.random() * kept.length), 1)[0] ?? null) : null;
    const word = `${name}${count}x`;
    await edit(page, { word, out, quantity, roll: Math.random() });
    if (out === null) kept.push(word);
    else gone.push(out);
    await page.waitForTimeout(60 + Math.random() * 120);
  }
  return { kept, gone };
}

describe('two people on one page, while the server is killed and comes back', () => {
  it('end with the same page, and with every word that was typed', async () => {
    const pages = await Promise.all(people.map(windowOf));
    const begun = Date.now();
    const hands = pages.map((page, index) => work(page, ['ed', 'ar'][index] ?? '', begun + worksForMs));
    for (const at of killedAtMs) {
      await new Promise((resolve) => setTimeout(resolve, begun + at - Date.now()));
      await server.kill('SIGKILL');
      await pages[0]?.getByText('The server cannot be reached.').waitFor();
      await new Promise((resolve) => setTimeout(resolve, 1500));
      await server.start();
    }
    const done = await Promise.all(hands);
    await Promise.all(
      pages.map((page) => page.getByText('The server cannot be reached.').waitFor({ state: 'detached' })),
    );
    const [one = '', other = ''] = await eventually(
      () => Promise.all(pages.map(textOf)),
      ([a, b]) => a === b,
      30_000,
    );
    expect(one).toBe(other);
    for (const { kept, gone } of done) {
      expect(kept.length).toBeGreaterThan(50);
      expect(kept.filter((word) => !one.includes(word))).toEqual([]);
      expect(gone.filter((word) => one.includes(word))).toEqual([]);
    }
    expect(await seriousFindings(pages[0]!)).toEqual([]);
    await keepPicture(pages[0]!, 'together');

    expect(one).toContain('"liveValue"');
    // What the windows show is what the server keeps, and who wrote it.
    await pages[0]!.keyboard.press('Control+s');
    await pages[0]!.getByText('all saved').waitFor();
    const { body } = await editor.get(`/api/pages/${pageId}/revisions`);
    expect(body.items.map(({ author }: { author: string }) => author).join()).toContain('Test archivist');
    const { text: words } = await editor.get(`/api/pages/${pageId}/text`);
    expect(done.flatMap(({ kept }) => kept).filter((word) => !words.includes(word))).toEqual([]);
  });
});

describe('a window that is closed while the server cannot be reached', () => {
  it('has kept what was typed, and puts it in when the page is next opened', async () => {
    const { page, context } = await signedIn(browser, url, { email: addressOf('editor'), password });
    await page.goto(`${url}/pages/${pageId}`);
    await page.locator('.page-text p').first().click();
    await server.kill('SIGKILL');
    await page.getByText('The server cannot be reached.').waitFor();
    await page.keyboard.type('Typed in the dark. ');
    await page.close();
    await server.start();
    const later = await context.newPage();
    await later.goto(`${url}/pages/${pageId}`);
    await later.locator('.page-text').getByText('Typed in the dark.').waitFor();
    await later.getByText('What you had typed without a connection was put in.').waitFor();
    await later.keyboard.press('Control+s');
    await later.getByText('all saved').waitFor();
    expect((await editor.get(`/api/pages/${pageId}/text`)).text).toContain('Typed in the dark.');
    await context.close();
  });
});
