import { block, doc, text } from '#shared/document/documents.fixture.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { eventually, startTestServer } from '../helpers/server.ts';
import { Writer } from '../helpers/writer.ts';

const [editorsOnOnePage, connections, seconds] = [30, 200, 15];
/** A quick typist strikes some five keys a second; thirty at once on one page is far more than a workshop has. */
const betweenEditsMs = 400;

/** How long an edit takes from one window to another, with many people on one page and more on others. */
export async function benchCoediting(): Promise<string[]> {
  const server = await startTestServer();
  const archivist = await server.as('archivist');
  const manualId = await archivist.newManual('Together');
  const scans = Array.from({ length: 18 }, (_, at) => ({ name: `${at}.jpg`, bytes: drawSheet(sheet(at + 1)) }));
  await archivist.upload(manualId, scans);
  const pages = await archivist.pagesOf(manualId);
  const lines = Array.from({ length: 60 }, (_, at) =>
    block('paragraph', { id: `p${at}` }, text(`Line ${at} of a page.`)),
  );
  for (const { id } of pages)
    await archivist.put(`/api/pages/${id}/document`, { baseRevision: 0, document: doc(...lines) });
  const writers = Array.from({ length: connections }, (_, at) => {
    const page = at < editorsOnOnePage ? 0 : 1 + (at % (pages.length - 1));
    return new Writer(archivist, pages[page].id as string);
  });
  await eventually(
    () => Promise.resolve(writers.filter(({ provider }) => !provider.isSynced).length),
    (missing) => missing === 0,
  );
  const [crowd, others] = [writers.slice(0, editorsOnOnePage), writers.slice(editorsOnOnePage)];
  const arrivals = await type(crowd, others);
  for (const writer of writers) writer.close();
  await server.stop();
  const sorted = arrivals.sort((a, b) => a - b);
  const at = (share: number): string => (sorted[Math.floor((sorted.length - 1) * share)] ?? NaN).toFixed(0);
  return [
    `${connections} connections, ${editorsOnOnePage} of them writing on one page, an edit every ${betweenEditsMs} ms each, for ${seconds} s; all windows in one process beside the server`,
    `an edit seen by another window: ${arrivals.length} arrivals, median ${at(0.5)} ms, 95th ${at(0.95)} ms, longest ${at(1)} ms`,
  ];
}

/** Every window of the crowd writes, and the last of them notes when each edit arrives; some of the others write too. */
async function type(crowd: readonly Writer[], others: readonly Writer[]): Promise<number[]> {
  const sentAt = new Map<string, number>();
  const arrivals: number[] = [];
  const watcher = crowd.at(-1);
  watcher?.fragment.observeDeep(() => {
    const last = watcher.words;
    for (const [word, at] of sentAt) {
      if (!last.includes(word)) continue;
      arrivals.push(performance.now() - at);
      sentAt.delete(word);
    }
  });
  const until = performance.now() + seconds * 1000;
  const write = async (writer: Writer, name: string, isWatched: boolean): Promise<void> => {
    for (let count = 0; performance.now() < until; count += 1) {
      await new Promise((resolve) => setTimeout(resolve, betweenEditsMs * (0.5 + Math.random())));
      const word = `[${name}${count}]`;
      if (isWatched) sentAt.set(word, performance.now());
      writer.append(Math.floor(Math.random() * 60), word);
    }
  };
  await Promise.all([
    ...crowd.slice(0, -1).map((writer, at) => write(writer, `c${at}-`, true)),
    ...others.filter((_, at) => at % 10 === 0).map((writer, at) => write(writer, `o${at}-`, false)),
  ]);
  await new Promise((resolve) => setTimeout(resolve, 500));
  return arrivals;
}
