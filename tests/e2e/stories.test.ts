import type { Browser, Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { keepPicture, openBrowser, seriousFindings, signedIn } from '../helpers/browser.ts';
import { scanOf } from '../helpers/scans.ts';
import { Caller, demoPerson, eventually, startDemoServer } from '../helpers/server.ts';

// A scan of our own, not the demo's: a page of steps, and a parts list.
const steps = [
  'SECTION 3. ADJUSTMENT',
  '',
  'a. Connect the meter to test point TP9.',
  'b. Tune the core of coil L5 for the greatest reading.',
  'c. The injection must be 121.500 mc at the mixer.',
];
const parts = [
  'REF. DES.   DESCRIPTION              PART NO.   QTY',
  'C1          Mica, silvered           22-1470    1',
  'C2          Paper, tubular           24-4103    2',
  'R1          Carbon composition       41-5470    1',
  'R2          Wire wound               41-6223    4',
];

let server: Awaited<ReturnType<typeof startDemoServer>>;
let browser: Browser;
let manual: string;
beforeAll(async () => {
  server = await startDemoServer();
  await pauseSecondDemoManual();
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await server.stop();
});

/** The stories need only the first of the demo's manuals; the second would keep the one worker from the test's own scan. */
async function pauseSecondDemoManual(): Promise<void> {
  const { email, password } = demoPerson('archivist');
  const archivist = await Caller.signIn(server.url, email, password);
  const { body } = await eventually(
    () => archivist.get('/api/manuals'),
    (reply) => reply.body.items.length === 2,
  );
  await archivist.post(`/api/manuals/${body.items[1].id}/reading-queue`, { do: 'pause' });
}

const windowOf = (name: Parameters<typeof demoPerson>[0]) => signedIn(browser, server.url, demoPerson(name));
const pageText = (page: Page): Locator => page.getByLabel('Page text').first();

/** Sets the caret's selection on some words of the page, as a drag of the mouse would. */
async function select(page: Page, words: string): Promise<void> {
  await pageText(page).evaluate((root, wanted) => {
    const walker = document.createTreeWalker(root, NodeFilter.SHOW_TEXT);
    const pieces: { node: Text; from: number }[] = [];
    let all = '';
    for (let node = walker.nextNode(); node !== null; node = walker.nextNode()) {
      pieces.push({ node: node as Text, from: all.length });
      all += node.textContent;
    }
    const start = all.replaceAll('\u00a0', ' ').indexOf(wanted);
    if (start < 0) throw new Error(`"${wanted}" is not on the page: ${all}`);
    const spot = (at: number): [Text, number] => {
      const piece = pieces.filter(({ from }) => from < at || at === 0).at(-1);
      if (piece === undefined) throw new Error('no text');
      return [piece.node, at - piece.from];
    };
    (root as HTMLElement).focus();
    const [first, from] = spot(start + 1);
    const [last, to] = spot(start + wanted.length);
    document.getSelection()?.setBaseAndExtent(first, from - 1, last, to);
  }, words);
  await page.waitForTimeout(150);
}

const save = async (page: Page): Promise<void> => {
  await page.keyboard.press('Control+s');
  await page.getByText('all saved').waitFor();
};

describe('the four stories', () => {
  it('the archivist uploads a scan and watches its pages being read', async () => {
    const { page, context } = await windowOf('archivist');
    await page.getByRole('button', { name: 'Add a manual' }).first().click();
    const dialog = page.getByRole('dialog', { name: 'Add a manual' });
    await dialog.getByLabel('Title').fill('WX-3 Wavemeter');
    await dialog.getByLabel('Document number').fill('TW 300-1');
    const bytes = Buffer.from(await scanOf([steps, parts]));
    await dialog
      .locator('input[type=file]')
      .setInputFiles({ name: 'wavemeter.pdf', mimeType: 'application/pdf', buffer: bytes });
    await dialog.getByRole('button', { name: /^Add/ }).last().click();
    await page.waitForURL(/\/manuals\//);
    manual = new URL(page.url()).pathname;

    const strip = page.getByRole('listitem').filter({ has: page.getByRole('link', { name: /^(Correct|Read): page/ }) });
    await expect.poll(() => strip.count(), { timeout: 30_000 }).toBe(2);
    // Without a reload: the strip follows by itself.
    const said = () => strip.allTextContents();
    const seen = new Set<string>();
    await expect
      .poll(
        async () => {
          for (const text of await said())
            for (const word of ['waiting', 'being read']) if (text.includes(word)) seen.add(word);
          return (await said()).filter((text) => /(?<!being )read/.test(text)).length;
        },
        { timeout: 200_000, interval: 250 },
      )
      .toBe(2);
    expect([...seen]).toContain('being read');
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'archivist');
    await context.close();
  });

  it('the editor corrects a word, tags a row of the parts list, and makes a value live', async () => {
    const { page, context } = await windowOf('editor');
    await page.goto(server.url + manual);
    await page.getByRole('link', { name: 'Correct: page 1' }).click();
    await pageText(page).getByText('greatest').first().waitFor();
    await select(page, 'greatest');
    await page.keyboard.type('uttermost');
    await save(page);

    await select(page, '121.500 mc');
    await page.getByRole('button', { name: 'Make live' }).click();
    const panel = page.getByRole('region', { name: 'Make live' });
    await panel.getByRole('button', { name: 'New quantity' }).click();
    await panel.getByLabel('Label').fill('Injection at the mixer');
    await panel.getByLabel('Symbol').fill('mixerInjection');
    await panel.getByLabel('It is').selectOption('input');
    await panel.getByRole('button', { name: 'Make it live' }).click();
    await pageText(page).locator('.live', { hasText: '121.500 mc' }).waitFor();
    await save(page);
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'editor');

    await page.goto(server.url + manual);
    await page.getByRole('link', { name: 'Correct: page 2' }).click();
    await pageText(page).getByText('tubular').first().click();
    const row = page.getByRole('region', { name: 'This row' });
    await row.getByText('24-4103').waitFor();
    await row.getByLabel('The row is a').selectOption('section');
    await save(page);
    await page.goto(`${server.url}${manual}?view=parts`);
    await page.getByText('Wire wound').waitFor();
    expect(await page.getByText('Paper, tubular').count()).toBe(0);
    await keepPicture(page, 'parts');
    await context.close();
  });

  it('the technician sets another channel, and every value on every page follows', async () => {
    const { page, context } = await windowOf('technician');
    await page.getByRole('link', { name: /HB-12/ }).first().click();
    for (const label of ['5-1', '5-2']) {
      await page.getByRole('link', { name: `Read: page ${label}` }).waitFor();
      await expect
        .poll(
          () =>
            page
              .getByRole('listitem')
              .filter({ has: page.getByRole('link', { name: `Read: page ${label}` }) })
              .textContent(),
          { timeout: 200_000 },
        )
        .toContain('corrected');
    }
    await page.getByRole('link', { name: 'Read: page 5-1' }).click();
    const printed = page.locator('.live-number');
    await expect.poll(() => printed.allTextContents()).toContain('145.900 mc');
    await page.getByLabel('Channel', { exact: true }).fill('16');
    // ITU Radio Regulations, Appendix 18: channel 16 is 156.800 MHz; less 10.7, by 9.
    const shown = () => page.locator('.live .live-number').allTextContents();
    await expect.poll(shown).toContain('146.100 mc');
    expect(await shown()).toEqual(expect.arrayContaining(['16.233333 mc', '146.100 mc', '48.700 mc']));
    expect(await page.locator('.live-printed').allTextContents()).toEqual(
      expect.arrayContaining(['16.211111 mc', '145.900 mc', '48.633 mc']),
    );
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'technician');

    await page
      .getByRole('link', { name: 'Next page' })
      .or(page.getByRole('button', { name: 'Next page' }))
      .first()
      .click();
    await expect.poll(() => page.getByLabel('Channel', { exact: true }).inputValue()).toBe('16');
    await expect.poll(shown).toContain('156.800 mc');
    await context.close();
  });

  it('the reader finds the corrected word, with its box on the scan', async () => {
    const { page, context } = await windowOf('reader');
    // The key is heard once the bar that it leads to is there.
    await page.getByLabel('Search all manuals').first().waitFor();
    await page.keyboard.press('/');
    await expect
      .poll(() =>
        page
          .getByLabel('Search all manuals')
          .first()
          .evaluate((field) => field === document.activeElement),
      )
      .toBe(true);
    await page.keyboard.type('uttermost');
    await page.keyboard.press('Enter');
    const hit = page.getByRole('link', { name: /uttermost/ }).first();
    await expect.poll(() => hit.locator('mark').first().textContent()).toBe('uttermost');
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'search');
    await hit.click();
    await page.waitForURL(/\/read\?.*boxes=/);
    await expect
      .poll(() => page.locator('svg.scan-overlay rect[data-kind=hit]').count(), { timeout: 30_000 })
      .toBeGreaterThan(0);
    await page.locator('mark', { hasText: 'uttermost' }).first().waitFor();
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'reader');
    await context.close();
  });

  it('the technician takes along what a change of channel changes, and learns what a crystal at hand is', async () => {
    const { page, context } = await windowOf('technician');
    await page.getByRole('link', { name: /HB-12/ }).first().click();
    await page.getByRole('link', { name: 'Calculations' }).click();
    await page.getByRole('button', { name: 'Setting', exact: true }).click();
    await page.getByLabel('Channel', { exact: true }).fill('16');
    await page.getByRole('tab', { name: 'Change sheet' }).click();
    const crystal = page.getByRole('row').filter({ hasText: 'Channel crystal Y1' }).first();
    await expect.poll(() => crystal.textContent()).toContain('16.233333 mc');
    expect(await crystal.textContent()).toContain('16.211111 mc');
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'change-sheet');

    await page.getByRole('tab', { name: 'Crystals' }).click();
    await page.getByLabel('Marked frequency').fill('16.2333');
    await page.getByText(/nearest to channel/).waitFor();
    expect(await page.getByText(/nearest to channel/).textContent()).toContain('16');
    expect(await seriousFindings(page)).toEqual([]);
    await context.close();
  });

  it('the editor adds a stage to the frequency plan, is told what it lacks, and saves it', async () => {
    const { page, context } = await windowOf('editor');
    await page.getByRole('link', { name: /HB-12/ }).first().click();
    await page.getByRole('link', { name: 'Calculations' }).click();
    await page.getByRole('tab', { name: 'Frequency plan' }).click();
    await page.getByRole('button', { name: /^Oscillator V4, Y1/ }).click();
    await page.getByLabel('Kind of stage').selectOption('multiplier');
    await page.getByRole('button', { name: 'Add it behind Oscillator V4, Y1' }).click();
    const stage = page.getByRole('region', { name: 'This stage' });
    await expect.poll(() => stage.textContent()).toContain('Has no factor');
    await stage.getByLabel('Name').fill('Test point doubler');
    await stage.getByLabel('Times').fill('2');
    // The crystal for channel 12, 16.211111 mc, twice.
    const made = page.getByRole('button', { name: /^Test point doubler/ });
    await expect.poll(() => made.textContent()).toContain('32.42222');
    expect(await seriousFindings(page)).toEqual([]);
    await page.getByRole('button', { name: 'Save the plan' }).click();
    await page.getByText('The plan is saved.').waitFor();
    await page.reload();
    await made.waitFor();
    await keepPicture(page, 'frequency-plan');
    await context.close();
  });

  it('the editor has a block read again and is shown both readings', async () => {
    const { page, context } = await windowOf('editor');
    await page.getByRole('link', { name: /HB-12/ }).first().click();
    await page.getByRole('link', { name: 'Correct: page 5-1' }).click();
    await pageText(page).locator('p[data-zone], [data-zone]').nth(4).click();
    await page.getByRole('button', { name: 'Read again', exact: true }).click();
    const panel = page.getByRole('region', { name: 'Read again' });
    await panel.getByRole('button', { name: 'Read it' }).click();
    await panel
      .getByText(/It reads the same|Reads now|Nothing can be made out/)
      .first()
      .waitFor({ timeout: 60_000 });
    expect(await seriousFindings(page)).toEqual([]);
    await context.close();
  });
});
