import type { Page } from 'playwright-core';
import { block, doc, text } from '#shared/document/documents.fixture.ts';
import { quantities } from '#server/db/schema/index.ts';
import { openBrowser, signedIn } from '../helpers/browser.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type TestServer, addressOf, password, startTestServer } from '../helpers/server.ts';
import { graphSize, mixedGraph } from './mixed-graph.ts';

const valueCount = 1000;
const typed = '156.65157.4158.025';

/** A manual of a thousand quantities that all hang on one input, each of them live on its one page. */
async function manualOf(server: TestServer): Promise<string> {
  const archivist = await server.as('archivist');
  const manualId = await archivist.newManual('Thousand values');
  await archivist.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(3)) }]);
  const pageId = (await archivist.pagesOf(manualId))[0].id as string;
  const graph = mixedGraph.slice(0, Math.min(valueCount + 2, graphSize));
  server.tools.db.transaction((tx) => {
    for (const definition of graph)
      tx.insert(quantities)
        .values({
          id: `${manualId}-${definition.symbol}`,
          manualId,
          symbol: definition.symbol,
          definition: { ...definition, label: definition.symbol },
          createdAt: new Date(0),
        })
        .run();
  });
  const lines = Array.from({ length: valueCount / 10 }, (_, at) =>
    block(
      'step',
      { id: `s${at}`, marker: `${at + 1}.`, depth: 0 },
      ...graph
        .slice(2 + at * 10, 12 + at * 10)
        .flatMap(({ symbol }) => [
          text(' tune to '),
          { type: 'liveValue', attrs: { quantity: `${manualId}-${symbol}`, printed: '145.900 mc' } },
        ]),
    ),
  );
  const editor = await server.as('editor');
  const reply = await editor.put(`/api/pages/${pageId}/document`, { baseRevision: 0, document: doc(...lines) });
  if (reply.status !== 200) throw new Error(reply.text);
  return pageId;
}

/** Runs in the browser. As text, because what runs this file adds helpers to functions that a browser does not have. */
const watcher = `
  window.seen = { frames: [], long: [] };
  new PerformanceObserver((list) => {
    for (const { duration } of list.getEntries()) seen.long.push(duration);
  }).observe({ entryTypes: ['longtask'] });
  let last = performance.now();
  function frame(now) {
    seen.frames.push(now - last);
    last = now;
    requestAnimationFrame(frame);
  }
  requestAnimationFrame(frame);
`;

/** Types into the setting bar and watches every frame. */
async function watch(page: Page): Promise<{ frames: number[]; long: number[] }> {
  await page.evaluate(watcher);
  const field = page.getByLabel('q0').first();
  await field.click();
  await field.selectText();
  for (const key of typed) await page.keyboard.type(key, { delay: 60 });
  await page.waitForTimeout(300);
  return page.evaluate('seen');
}

/** What typing in the setting bar costs in a browser, on a page with a thousand live values. */
export async function benchFrames(): Promise<string[]> {
  const server = await startTestServer();
  const browser = await openBrowser();
  try {
    const pageId = await manualOf(server);
    const { page } = await signedIn(browser, server.url, { email: addressOf('technician'), password });
    await page.goto(`${server.url}/pages/${pageId}/read`);
    await page
      .locator('.live')
      .nth(valueCount - 1)
      .waitFor();
    const setting = page.getByRole('button', { name: 'Setting', exact: true });
    if ((await setting.getAttribute('aria-expanded')) === 'false') await setting.click();
    const { frames, long } = await watch(page);
    const sorted = frames.slice(2).sort((a, b) => a - b);
    const at = (share: number): string => (sorted[Math.floor((sorted.length - 1) * share)] ?? NaN).toFixed(1);
    const moved = await page.locator('.live-printed').count();
    return [
      `${typed.length} keys on a page of ${valueCount} live values, all moved: frames ${frames.length}, median ${at(0.5)} ms, 95th ${at(0.95)} ms, longest ${at(1)} ms (bar 50)`,
      `tasks over 50 ms: ${long.length}${long.length === 0 ? '' : `, longest ${Math.max(...long).toFixed(0)} ms`}; values that show what was printed beside: ${moved}`,
    ];
  } finally {
    await browser.close();
    await server.stop();
  }
}
