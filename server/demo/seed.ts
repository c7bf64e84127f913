import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { type Role, roles } from '#shared/access/roles.ts';
import { makeLive } from '#shared/document/live-values.ts';
import { type PageDocument, readDocument } from '#shared/document/page-document.ts';
import { projectRoot } from '#server/db/database.ts';
import { type Auth, findUserByEmail, hasUsers } from '#server/features/accounts/index.ts';
import type { Running } from '#server/start.ts';
import { demoManuals } from './content/manuals.ts';
import type { DemoManual, DemoQuantity, ManualPage } from './content/types.ts';
import { correctPage } from './correct-page.ts';
import { DemoCaller } from './demo-caller.ts';

const password = 'benchleaf-demo';
const people: Record<Role, { local: string; name: string }> = {
  reader: { local: 'reader', name: 'Ren Reader' },
  technician: { local: 'technician', name: 'Tove Technician' },
  editor: { local: 'editor', name: 'Edda Editor' },
  archivist: { local: 'archivist', name: 'Arne Archivist' },
  administrator: { local: 'admin', name: 'Asta Administrator' },
};
const addressOf = (role: Role): string => `${people[role].local}@benchleaf.example`;

/**
 * On the first start of a new data folder: makes the demo accounts, and uploads the demo manuals as their archivist would.
 * Answers with lines to print. On later starts, goes on with corrections that a stop cut short.
 */
export async function seedWhenNew(running: Running): Promise<string[]> {
  const { config, db, auth } = running.tools;
  const isNew = !hasUsers(db);
  const isWanted = config.seed === 'demo' || (config.seed === null && !config.production);
  if (isNew && isWanted) await addPeople(auth);
  if (isNew && !isWanted)
    return ['There is nobody yet. Make the first administrator: npm run admin:create -- --email you@your.org'];
  if (findUserByEmail(db, addressOf('editor')) === undefined) return [];
  if (isWanted) {
    bringInManuals(running.url, isNew).catch((error: unknown) =>
      running.tools.log.error({ err: error }, 'the demo could not be completed'),
    );
  }
  return ['Demo accounts (password benchleaf-demo):', ...roles.map((role) => `  ${addressOf(role).padEnd(34)}${role}`)];
}

async function addPeople(auth: Auth): Promise<void> {
  for (const role of roles) {
    await auth.api.createUser({ body: { email: addressOf(role), name: people[role].name, password, role } });
  }
}

/** Everything below goes through the server's own routes, as people's work would. */
async function bringInManuals(url: string, isNew: boolean): Promise<void> {
  const archivist = await DemoCaller.signIn(url, addressOf('archivist'), password);
  const editor = await DemoCaller.signIn(url, addressOf('editor'), password);
  const begun: Work[] = [];
  // The library shows the newest first, and the first of the demo is to stand on top.
  for (const manual of demoManuals.toReversed()) {
    const id = isNew ? await upload(archivist, manual) : await findAgain(archivist, manual);
    if (id !== null) begun.unshift({ manual, id });
  }
  for (const each of begun) await work(editor, each);
}

async function findAgain(caller: DemoCaller, { documentNumber, title }: DemoManual): Promise<string | null> {
  const { items } = await caller.get<{ items: { id: string; documentNumber: string | null; title: string }[] }>(
    '/api/manuals',
  );
  return items.find((item) => item.documentNumber === documentNumber && item.title === title)?.id ?? null;
}

async function upload(
  archivist: DemoCaller,
  { slug, title, equipment, maker, documentNumber, editionDate }: DemoManual,
): Promise<string> {
  const { id } = await archivist.send<{ id: string }>('POST', '/api/manuals', {
    title,
    equipment,
    maker,
    documentNumber,
    editionDate,
  });
  const file = await readFile(path.join(projectRoot, 'server/demo/manuals', `${slug}.pdf`));
  await archivist.upload(`/api/manuals/${id}/sources`, `${slug}.pdf`, file);
  return id;
}

type Work = { manual: DemoManual; id: string };
type PageSummary = { id: string; position: number; label: string; revision: number; state: string };

/** The editor's work: quantities, page labels, and for pages that show live values the corrected text with them in it. */
async function work(editor: DemoCaller, { manual, id }: Work): Promise<void> {
  const { items: pages } = await editor.get<{ items: PageSummary[] }>(`/api/manuals/${id}/pages`);
  const pageOf = new Map(manual.pages.map(({ label }, index) => [label, pages[index]]));
  const quantities = await addQuantities(editor, { manual, id }, pageOf);
  await addPlan(editor, { manual, id });
  for (const [index, page] of manual.pages.entries()) {
    const row = pages[index];
    if (row !== undefined && row.label !== page.label)
      await editor.send('PATCH', `/api/pages/${row.id}`, { label: page.label });
  }
  const live = manual.pages.filter(({ label }) => manual.livePlaces.some((place) => place.pageLabel === label));
  // Pages with the most to change go first, so that a newcomer sees values move at once.
  const placesOn = (page: ManualPage): number =>
    manual.livePlaces.filter(({ pageLabel }) => pageLabel === page.label).length;
  live.sort((a, b) => placesOn(b) - placesOn(a));
  for (const page of [...live].reverse()) {
    const row = pageOf.get(page.label);
    if (row !== undefined && row.revision === 0) await editor.send('POST', `/api/pages/${row.id}/attention`, {});
  }
  for (const page of live) {
    const row = pageOf.get(page.label);
    if (row !== undefined) await correct(editor, row, { manual, page, quantities });
  }
}

async function addQuantities(
  editor: DemoCaller,
  { manual, id }: Work,
  pageOf: Map<string, PageSummary | undefined>,
): Promise<Map<string, string>> {
  const { items } = await editor.get<{ items: { id: string; symbol: string }[] }>(`/api/manuals/${id}/quantities`);
  const known = new Map(items.map((item) => [item.symbol, item.id]));
  for (const quantity of manual.quantities) {
    if (known.has(quantity.symbol)) continue;
    const body = { ...definitionOf(quantity), pageId: pageOf.get(quantity.printed.pageLabel)?.id ?? null };
    const made = await editor.send<{ id: string }>('POST', `/api/manuals/${id}/quantities`, body);
    known.set(quantity.symbol, made.id);
  }
  return known;
}

async function addPlan(editor: DemoCaller, { manual, id }: Work): Promise<void> {
  const { number } = await editor.get<{ number: number }>(`/api/manuals/${id}/frequency-plan`);
  if (manual.plan === undefined || number > 0) return;
  await editor.send('PUT', `/api/manuals/${id}/frequency-plan`, { baseNumber: 0, plan: manual.plan });
}

const definitionOf = ({ symbol, label, kind, unit, expression, home, integer, printed }: DemoQuantity) => ({
  ...{ symbol, label, kind, unit, printed: { text: printed.text } },
  ...(expression === undefined ? {} : { expression }),
  ...(home === undefined ? {} : { home }),
  ...(integer === true && kind === 'input' ? { integer: true } : {}),
});

type Correction = { manual: DemoManual; page: ManualPage; quantities: Map<string, string> };

async function correct(editor: DemoCaller, row: PageSummary, { manual, page, quantities }: Correction): Promise<void> {
  const read = await editor.waitFor<{ revision: number; state: string; document: unknown }>(
    `/api/pages/${row.id}`,
    ({ revision, state }) => revision > 0 || state === 'failed',
  );
  const document = readDocument(read.document);
  if (read.revision !== 1 || !document.ok) return;
  const places = manual.livePlaces.filter(({ pageLabel }) => pageLabel === page.label);
  const corrected = places.reduce<PageDocument>(
    (done, { text, context, symbol }) => {
      const live = makeLive(done, { text, before: context, quantity: quantities.get(symbol) ?? symbol });
      return live.ok ? live.value : done;
    },
    correctPage(document.value, page),
  );
  await editor.send('PUT', `/api/pages/${row.id}/document`, {
    baseRevision: read.revision,
    document: corrected,
    note: 'Corrected against the scan; values made live',
  });
}
