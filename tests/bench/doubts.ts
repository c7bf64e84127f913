import type { Page } from 'playwright-core';
import type { DocNode } from '#shared/document/define-block.ts';
import { block, doc, text } from '#shared/document/documents.fixture.ts';
import { openBrowser, signedIn } from '../helpers/browser.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type TestServer, addressOf, password, startTestServer } from '../helpers/server.ts';

const [pageCount, doubtCount, betweenKeysMs] = [60, 50, 400];

/** A page of sixty lines as a reading leaves it, every word with its place, and a doubt in most lines. */
function page(): DocNode {
  const lines = Array.from({ length: doubtCount + 10 }, (_, at) => {
    const word = (words: string, x: number): DocNode => ({
      type: 'text',
      text: words,
      marks: [{ type: 'word', attrs: { zone: [x, 40 + at * 30, 60, 20], confidence: 95 } }],
    });
    const doubtful: DocNode = {
      ...word(`injec${at}ion`, 200),
      marks: [
        { type: 'word', attrs: { zone: [200, 40 + at * 30, 60, 20], confidence: 30 } },
        { type: 'doubt', attrs: { reason: 'low-confidence', proposals: ['injection'] } },
      ],
    };
    const zone = [60, 40 + at * 30, 900, 20];
    return block(
      'paragraph',
      { id: `p${at}`, zone },
      word('Set', 60),
      text(' '),
      ...(at < doubtCount ? [doubtful] : []),
      text(' '),
      word('twice', 300),
    );
  });
  return doc(...lines);
}

async function manualOf(server: TestServer): Promise<string> {
  const archivist = await server.as('archivist');
  const manualId = await archivist.newManual('Doubts');
  const scans = Array.from({ length: pageCount }, (_, at) => ({ name: `${at}.jpg`, bytes: drawSheet(sheet(at + 1)) }));
  for (let at = 0; at < pageCount; at += 20) await archivist.upload(manualId, scans.slice(at, at + 20));
  const pages = await archivist.pagesOf(manualId);
  for (const { id } of pages) await archivist.put(`/api/pages/${id}/document`, { baseRevision: 0, document: page() });
  return pages[0].id as string;
}

/** Runs in the browser, as text: notes how long each Alt Enter takes until the next doubt is chosen and drawn. */
const watcher = `
  window.taken = [];
  const { editor } = document.querySelector('.page-text');
  let chosen = editor.state.selection.from;
  addEventListener('keydown', (event) => {
    if (!event.altKey || event.key !== 'Enter') return;
    const from = performance.now();
    function look() {
      const now = editor.state.selection.from;
      const at = editor.view.domAtPos(now + 1).node.parentElement.getBoundingClientRect();
      if (now === chosen || at.top < 0 || at.bottom > innerHeight) return requestAnimationFrame(look);
      chosen = now;
      taken.push(performance.now() - from);
    }
    requestAnimationFrame(look);
  }, { capture: true });
`;

async function settleAll(window: Page): Promise<number[]> {
  await window.locator('.page-text').waitFor();
  await window.keyboard.press('Alt+n');
  await window.waitForTimeout(betweenKeysMs);
  await window.evaluate(watcher);
  for (let count = 1; count < doubtCount; count += 1) {
    await window.keyboard.press('Alt+Enter');
    await window.waitForTimeout(betweenKeysMs);
  }
  return window.evaluate('taken');
}

/** How long an editor waits for the next doubt, settling fifty of them by keyboard alone at a steady pace. */
export async function benchDoubts(): Promise<string[]> {
  const server = await startTestServer();
  const browser = await openBrowser();
  try {
    const pageId = await manualOf(server);
    const { page: window } = await signedIn(browser, server.url, { email: addressOf('editor'), password });
    await window.goto(`${server.url}/pages/${pageId}`);
    const taken = (await settleAll(window)).sort((a, b) => a - b);
    const left = await window.locator('.page-text .doubt').count();
    const at = (share: number): string => (taken[Math.floor((taken.length - 1) * share)] ?? NaN).toFixed(0);
    return [
      `${taken.length} doubts settled with Alt Enter, one every ${betweenKeysMs} ms, on a manual of ${pageCount} pages; ${left} left`,
      `from the key to the next doubt in view and drawn: median ${at(0.5)} ms, 95th ${at(0.95)} ms, longest ${at(1)} ms (bar 100)`,
    ];
  } finally {
    await browser.close();
    await server.stop();
  }
}
